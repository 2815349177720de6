import { useEffect, useRef, useSyncExternalStore } from 'react';
import { remember, remembered } from './theme.ts';

export interface KeyBinding {
  /** `KeyboardEvent.key`: `ArrowLeft`, `n`, `?`, ` `. Letters match in either case. */
  key: string;
  /** What it does, for the list: "Step back one frame". */
  says: string;
  run: (event: KeyboardEvent) => void;
  /** How the key is written in the list, when its name would not do: `←`. */
  shown?: string;
  shift?: boolean;
}

export interface KeyGroup {
  /** Heading in the list: "Picture". */
  name: string;
  bindings: KeyBinding[];
}

const STORED = 'spandrel.keys';
let groups: KeyGroup[] = [];
let on = remembered(STORED) !== 'off';
const listeners = new Set<() => void>();

const changed = () => listeners.forEach((listener) => listener());
const subscribe = (listener: () => void) => {
  listeners.add(listener);
  return () => listeners.delete(listener);
};

/** Whether a key pressed here belongs to what is being written or operated, not to the screen. */
function isTaken(event: KeyboardEvent): boolean {
  const target = event.target as Element | null;
  if (!target?.closest) return false;
  if (target.closest('dialog[open]') || target.closest('[role="menu"]')) return true;
  if (target.closest('input:not([type="range"]), textarea, select, [contenteditable="true"]')) return true;
  return (event.key === ' ' || event.key === 'Enter') && target.closest('button, a, summary, [role="button"]') !== null;
}

function handleKeydown(event: KeyboardEvent) {
  if (!on || event.defaultPrevented || event.ctrlKey || event.metaKey || event.altKey || isTaken(event)) return;
  const pressed = event.key.length === 1 ? event.key.toLowerCase() : event.key;
  // The last group to register stands nearest to the reader: a page before its frame.
  for (const group of groups.toReversed()) {
    const binding = group.bindings.find(
      (one) =>
        one.key.toLowerCase() === pressed.toLowerCase() && (one.shift === undefined || one.shift === event.shiftKey),
    );
    if (!binding) continue;
    event.preventDefault();
    binding.run(event);
    return;
  }
}

/**
 * Gives a screen its keys while it is mounted, and puts them on the list that `?` opens. Keys are silent while someone
 * writes, in dialogs and menus, and when single keys are switched off (WCAG 2.1.4).
 */
export function useKeys(name: string, bindings: KeyBinding[]): void {
  const latest = useRef(bindings);
  useEffect(() => {
    latest.current = bindings;
  });
  const described = bindings.map((one) => `${one.key}|${one.says}|${one.shown ?? ''}|${one.shift ?? ''}`).join('\n');
  useEffect(() => {
    const group: KeyGroup = {
      name,
      bindings: latest.current.map((one, index) => ({
        ...one,
        run: (event) => latest.current[index]?.run(event),
      })),
    };
    if (groups.length === 0) document.addEventListener('keydown', handleKeydown);
    groups = [...groups, group];
    changed();
    return () => {
      groups = groups.filter((other) => other !== group);
      if (groups.length === 0) document.removeEventListener('keydown', handleKeydown);
      changed();
    };
  }, [name, described]);
}

/** Every key of the screen as it is now, for the list. */
export function useKeyGroups(): KeyGroup[] {
  return useSyncExternalStore(subscribe, () => groups);
}

/** Whether single keys work; remembered in this browser. */
export function useKeysOn(): [boolean, (next: boolean) => void] {
  const value = useSyncExternalStore(subscribe, () => on);
  return [
    value,
    (next) => {
      on = next;
      remember(STORED, next ? null : 'off');
      changed();
    },
  ];
}
