import { useSyncExternalStore } from 'react';

const QUERY = '(prefers-reduced-motion: reduce)';

/** Whether the person at the screen asked for no movement. Follows the setting while the page is open. */
export function useReducedMotion(): boolean {
  return useMediaQuery(QUERY);
}

/** Whether a media query holds now. */
export function useMediaQuery(query: string): boolean {
  return useSyncExternalStore(
    (listener) => {
      const list = window.matchMedia(query);
      list.addEventListener('change', listener);
      return () => list.removeEventListener('change', listener);
    },
    () => window.matchMedia(query).matches,
  );
}
