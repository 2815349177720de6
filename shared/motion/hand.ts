import type { Span } from './path.ts';
import type { HandWork } from './types.ts';

/** Hand work in local time, ready for the search. */
export interface Honoured {
  pins: { time: number; before: Span['kind']; after: Span['kind'] }[];
  barred: number[];
  notFree: { from: number; to: number }[];
}

export const NO_HAND: Honoured = { pins: [], barred: [], notFree: [] };

/** Hand work moved to local time; `origin` is the document frame of local time 0. */
export function honoured(hand: HandWork | undefined, origin: number): Honoured {
  if (!hand) return NO_HAND;
  const local = (frames: number[] | undefined) => (frames ?? []).filter(Number.isFinite).map((frame) => frame - origin);
  return {
    pins: [
      ...local(hand.contacts).map((time) => ({ time, before: 'flight' as const, after: 'flight' as const })),
      ...local(hand.takeOffs).map((time) => ({ time, before: 'rest' as const, after: 'flight' as const })),
      ...local(hand.landings).map((time) => ({ time, before: 'flight' as const, after: 'rest' as const })),
    ].sort((a, b) => a.time - b.time),
    barred: local(hand.removed),
    notFree: (hand.notFree ?? []).map((span) => ({ from: span.from - origin, to: span.to - origin })),
  };
}

/** Whether a knot's time was set by hand. */
export function isPinned(hand: Honoured, time: number): boolean {
  return hand.pins.some((pin) => Math.abs(pin.time - time) < 1e-6);
}
