import { useSyncExternalStore } from 'react';
import type { LineState } from './liveProduction.ts';

let state: LineState = 'connecting';
const listeners = new Set<() => void>();

/** Says how the live line is; told by whoever holds it. */
export function setLineState(next: LineState): void {
  if (next === state) return;
  state = next;
  listeners.forEach((listener) => listener());
}

/** How the live line is now. */
export function useLineState(): LineState {
  return useSyncExternalStore(
    (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    () => state,
  );
}
