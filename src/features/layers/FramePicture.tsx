import { useEffect, useRef, useState } from 'react';
import { pictureUrl } from '../../../shared/api/takes.ts';
import { shownFrame } from '../../../shared/reading/document.ts';
import { Button } from '../../components/Button.tsx';
import { ErrorNote } from '../../components/ErrorNote.tsx';
import { type Playhead, useFrame, usePlaying } from '../../lib/playhead.ts';
import type { View } from './view.ts';

interface FramePictureProps {
  takeId: string;
  firstFrame: number;
  width: number;
  height: number;
  view: View;
  playhead: Playhead;
  /** Frames before and after whose pictures lie faintly over this one; none: off. */
  under: (frame: number) => number[];
}

/** Keeps the pictures around the playhead ready, so that a step shows at once. */
function usePicturesReady(takeId: string, playhead: Playhead, frame: number) {
  const ready = useRef(new Map<number, HTMLImageElement>());
  const playing = usePlaying(playhead);
  useEffect(() => {
    const ahead = playing ? 16 : 3;
    const keep = new Set<number>();
    for (let offset = -2; offset <= ahead; offset++) {
      const raw = frame + offset;
      // A playing strip goes round, so its end wants its beginning.
      const wanted = playing ? ((raw - 1 + playhead.frames) % playhead.frames) + 1 : raw;
      if (wanted < 1 || wanted > playhead.frames) continue;
      keep.add(wanted);
      if (ready.current.has(wanted)) continue;
      const image = new Image();
      image.src = pictureUrl(takeId, wanted);
      ready.current.set(wanted, image);
    }
    for (const known of ready.current.keys())
      if (!keep.has(known) && ready.current.size > 40) ready.current.delete(known);
  }, [takeId, playhead, frame, playing]);
}

/** The picture of the chosen frame as it was posted, and faintly its neighbours when they are asked for. */
export function FramePicture({ takeId, firstFrame, width, height, view, playhead, under }: FramePictureProps) {
  const frame = useFrame(playhead);
  const [failed, setFailed] = useState<{ frame: number; tries: number } | null>(null);
  usePicturesReady(takeId, playhead, frame);
  const place = {
    left: -view.x * view.scale,
    top: -view.y * view.scale,
    width: width * view.scale,
    height: height * view.scale,
  };
  const tries = failed?.tries ?? 0;
  return (
    <>
      <img
        src={pictureUrl(takeId, frame) + (tries > 0 ? `?try=${tries}` : '')}
        alt={`Frame ${shownFrame(frame, firstFrame)}`}
        draggable={false}
        className="absolute max-w-none select-none"
        style={place}
        onError={() => setFailed({ frame, tries })}
        onLoad={() => failed && setFailed(null)}
      />
      {under(frame).map((neighbour) => (
        <img
          key={neighbour}
          src={pictureUrl(takeId, neighbour)}
          alt=""
          draggable={false}
          className="pointer-events-none absolute max-w-none opacity-30 select-none"
          style={place}
        />
      ))}
      {failed?.frame === frame && (
        <ErrorNote
          className="absolute top-3 left-1/2 z-10 max-w-[90%] -translate-x-1/2"
          action={
            <Button size="small" onClick={() => setFailed({ frame: 0, tries: tries + 1 })}>
              Try again
            </Button>
          }
        >
          The picture of frame {shownFrame(frame, firstFrame)} did not arrive. It is safe on the server.
        </ErrorNote>
      )}
    </>
  );
}
