import { useSyncExternalStore } from 'react';

/**
 * The one frame that is chosen, the one that is pointed at, and whether the strip plays. It lives outside React state so
 * that a strip at 24 frames a second redraws only what shows the frame. Frames count from 1, as in the document.
 */
export interface Playhead {
  readonly frames: number;
  frame: () => number;
  /** The frame pointed at, or the chosen one. */
  lit: () => number;
  playing: () => boolean;
  /** Chooses a frame; outside the strip it stays at the end. */
  choose: (frame: number) => void;
  step: (by: number) => void;
  /** Points at a frame without choosing it; null lets go. */
  point: (frame: number | null) => void;
  setPlaying: (playing: boolean) => void;
  subscribe: (listener: () => void) => () => void;
}

/** A playhead over `frames` frames (at least 1). */
export function createPlayhead(frames: number, start = 1): Playhead {
  const clamp = (frame: number) => Math.min(Math.max(1, Math.round(frame)), Math.max(1, frames));
  const listeners = new Set<() => void>();
  let chosen = clamp(start);
  let pointed: number | null = null;
  let isPlaying = false;
  const tell = () => {
    for (const listener of listeners) listener();
  };
  const playhead: Playhead = {
    frames,
    frame: () => chosen,
    lit: () => pointed ?? chosen,
    playing: () => isPlaying,
    choose: (frame) => {
      const next = clamp(frame);
      if (next === chosen && pointed === null) return;
      chosen = next;
      pointed = null;
      tell();
    },
    step: (by) => playhead.choose(chosen + by),
    point: (frame) => {
      const next = frame === null ? null : clamp(frame);
      if (next === pointed) return;
      pointed = next;
      tell();
    },
    setPlaying: (playing) => {
      if (playing === isPlaying) return;
      isPlaying = playing;
      pointed = null;
      tell();
    },
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
  return playhead;
}

/** The chosen frame; redraws the caller when it changes. */
export function useFrame(playhead: Playhead): number {
  return useSyncExternalStore(playhead.subscribe, playhead.frame);
}

/** The frame pointed at, or the chosen one; redraws the caller when it changes. */
export function useLitFrame(playhead: Playhead): number {
  return useSyncExternalStore(playhead.subscribe, playhead.lit);
}

/** Whether the strip plays; redraws the caller when it changes. */
export function usePlaying(playhead: Playhead): boolean {
  return useSyncExternalStore(playhead.subscribe, playhead.playing);
}
