import { useCallback, useEffect } from 'react';
import type { FrameRate } from '../../../shared/reading/document.ts';
import { type Playhead, usePlaying } from '../../lib/playhead.ts';
import { frameDue } from './playback.ts';

/** Moves the playhead at the strip's own rate while it plays. Never starts by itself; a hidden page stops. */
export function usePlay(playhead: Playhead, fps: FrameRate): { playing: boolean; play: () => void; stop: () => void } {
  const playing = usePlaying(playhead);
  const { num, den } = fps;
  useEffect(() => {
    if (!playing) return;
    const from = playhead.frame();
    let started: number | null = null;
    let shown = from;
    let request = requestAnimationFrame(function turn(now: number) {
      started ??= now;
      // Someone stepped or chose a frame meanwhile: playing ends where they are.
      if (playhead.frame() !== shown) return playhead.setPlaying(false);
      shown = frameDue(from, now - started, { num, den }, playhead.frames);
      playhead.choose(shown);
      request = requestAnimationFrame(turn);
    });
    const handleHidden = () => document.hidden && playhead.setPlaying(false);
    document.addEventListener('visibilitychange', handleHidden);
    return () => {
      cancelAnimationFrame(request);
      document.removeEventListener('visibilitychange', handleHidden);
    };
  }, [playing, playhead, num, den]);
  const play = useCallback(() => playhead.setPlaying(true), [playhead]);
  const stop = useCallback(() => playhead.setPlaying(false), [playhead]);
  return { playing, play, stop };
}
