import { useRef, useState } from 'react';
import { type FrameRate, shownFrame } from '../../../shared/reading/document.ts';
import { Button } from '../../components/Button.tsx';
import { Dialog } from '../../components/Dialog.tsx';
import { useKeys } from '../../lib/keys.ts';
import { type Playhead, useFrame } from '../../lib/playhead.ts';
import { flashesInASecond, MOST_FLASHES } from './flicker.ts';
import { stripLuminances } from './stripLuminances.ts';
import { usePlay } from './usePlay.ts';

interface PlayControlProps {
  takeId: string;
  fps: FrameRate;
  playhead: Playhead;
}

/** The chosen frame's number, as the production counts. */
export function FrameNumber({ playhead, firstFrame }: { playhead: Playhead; firstFrame: number }) {
  const frame = useFrame(playhead);
  return (
    <output aria-label="Chosen frame" className="min-w-[4ch] text-right font-mono text-md font-semibold">
      {shownFrame(frame, firstFrame)}
    </output>
  );
}

/** Play and the keys that move the playhead. A strip that flickers warns first and leaves the choice (WCAG 2.2, 2.3.1). */
export function PlayControl({ takeId, fps, playhead }: PlayControlProps) {
  const { playing, play, stop } = usePlay(playhead, fps);
  const flashes = useRef<number | null>(null);
  const [looking, setLooking] = useState(false);
  const [warning, setWarning] = useState<{ flashes: number | null } | null>(null);

  const start = async () => {
    if (playing) return stop();
    if (looking) return;
    if (flashes.current === null) {
      setLooking(true);
      try {
        flashes.current = flashesInASecond(await stripLuminances(takeId, playhead.frames), fps.num / fps.den);
      } catch {
        return setWarning({ flashes: null });
      } finally {
        setLooking(false);
      }
    }
    if (flashes.current > MOST_FLASHES) setWarning({ flashes: flashes.current });
    else play();
  };

  useKeys('Playhead', [
    { key: 'ArrowLeft', says: 'One frame back', shown: '←', run: () => playhead.step(-1) },
    { key: 'ArrowRight', says: 'One frame on', shown: '→', run: () => playhead.step(1) },
    { key: 'Home', says: 'First frame', run: () => playhead.choose(1) },
    { key: 'End', says: 'Last frame', run: () => playhead.choose(playhead.frames) },
    { key: ' ', says: 'Play or stop', shown: 'Space', run: () => void start() },
  ]);

  return (
    <>
      <Button
        size="small"
        aria-pressed={playing}
        title="Play the strip at its own rate (Space)"
        className="min-w-16"
        onClick={() => void start()}
      >
        <svg viewBox="0 0 12 12" className="size-3 fill-current" aria-hidden="true">
          {playing ? <path d="M2 1.5h3v9H2zM7 1.5h3v9H7z" /> : <path d="M2.5 1l8 5-8 5z" />}
        </svg>
        {looking ? 'Looking…' : playing ? 'Stop' : 'Play'}
      </Button>
      <Dialog
        open={warning !== null}
        onClose={() => setWarning(null)}
        title={warning?.flashes === null ? 'Nobody knows yet whether this strip flickers' : 'This strip flickers'}
        actions={
          <>
            <Button
              onClick={() => {
                setWarning(null);
                play();
              }}
            >
              Play it all the same
            </Button>
            <Button kind="primary" onClick={() => setWarning(null)}>
              Step through it instead
            </Button>
          </>
        }
      >
        <p>
          {warning?.flashes === null
            ? 'Its small pictures did not arrive, so the light of its frames could not be compared.'
            : `Played at its rate it flashes ${warning?.flashes ?? 0} times within a second.`}{' '}
          Flashes can harm people with photosensitive epilepsy. The arrow keys step one frame at a time, which is safe.
        </p>
      </Dialog>
    </>
  );
}
