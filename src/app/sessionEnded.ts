import { useSyncExternalStore } from 'react';

let ended = false;
const listeners = new Set<() => void>();

/** Says that the session ended under an open page, or that it is back. */
export function setSessionEnded(next: boolean): void {
  ended = next;
  listeners.forEach((listener) => listener());
}

/** Whether the session is over; redraws the caller when that changes. */
export function useSessionEnded(): boolean {
  return useSyncExternalStore(
    (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    () => ended,
  );
}
