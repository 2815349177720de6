import { useCallback, useState } from 'react';

function stored(key: string): string {
  try {
    return sessionStorage.getItem(key) ?? '';
  } catch {
    // A browser that keeps nothing still lets people write.
    return '';
  }
}

function store(key: string, text: string) {
  try {
    if (text) sessionStorage.setItem(key, text);
    else sessionStorage.removeItem(key);
  } catch {
    // As above.
  }
}

const keyOf = (name: string) => `spandrel.draft.${name}`;

export interface Draft {
  text: string;
  write: (text: string) => void;
  /** Empties the box; what was in it stays stored until `settleDraft`, in case it does not arrive. */
  hand: () => string;
}

/** Text that is being written, kept through a reload and a failed send. `name` says what it is for, such as a take's id. */
export function useDraft(name: string): Draft {
  const key = keyOf(name);
  const [text, setText] = useState(() => stored(key));
  const write = useCallback(
    (next: string) => {
      setText(next);
      store(key, next);
    },
    [key],
  );
  const hand = useCallback(() => {
    setText('');
    return text;
  }, [text]);
  return { text, write, hand };
}

/** Forgets what was stored of a draft once it has arrived; words that were written since are kept. */
export function settleDraft(name: string, arrived: string) {
  const key = keyOf(name);
  if (stored(key).trim() === arrived) store(key, '');
}
