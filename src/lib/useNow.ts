import { useSyncExternalStore } from 'react';

const MINUTE_MS = 60_000;
let now = Date.now();
let timer: ReturnType<typeof setInterval> | undefined;
const listeners = new Set<() => void>();

function subscribe(listener: () => void) {
  listeners.add(listener);
  if (!timer) {
    now = Date.now();
    timer = setInterval(() => {
      now = Date.now();
      listeners.forEach((one) => one());
    }, MINUTE_MS);
  }
  return () => {
    listeners.delete(listener);
    if (listeners.size === 0) {
      clearInterval(timer);
      timer = undefined;
    }
  };
}

/** The time in milliseconds, renewed every minute; one clock for the whole page. */
export function useNow(): number {
  return useSyncExternalStore(subscribe, () => now);
}
