import { useEffect, useId, useState } from 'react';
import { useNavigate } from 'react-router';
import { Dialog } from '../components/Dialog.tsx';
import { type KeyBinding, useKeyGroups, useKeys, useKeysOn } from '../lib/keys.ts';
import { paths } from '../lib/paths.ts';
import { onOpenKeyList } from './openKeyList.ts';

const NAMES: Record<string, string> = {
  ArrowLeft: '←',
  ArrowRight: '→',
  ArrowUp: '↑',
  ArrowDown: '↓',
  ' ': 'Space',
  Escape: 'Esc',
};

const shownKey = (binding: KeyBinding) =>
  binding.shown ??
  NAMES[binding.key] ??
  `${binding.shift ? 'Shift ' : ''}${binding.key.length === 1 ? binding.key.toUpperCase() : binding.key}`;

/** The list of keys of the screen as it is now; `?` opens it from anywhere. */
export function KeyList({ slug }: { slug: string }) {
  const [open, setOpen] = useState(false);
  const [on, setOn] = useKeysOn();
  const groups = useKeyGroups();
  const switchId = useId();
  const navigate = useNavigate();
  useKeys('Everywhere', [
    { key: '?', says: 'Show this list', run: () => setOpen(true) },
    { key: 'f', says: 'Feed', run: () => void navigate(paths.feed(slug)) },
    { key: 's', says: 'Shot sheet', run: () => void navigate(paths.sheet(slug)) },
    { key: 'p', says: 'Post a strip', run: () => void navigate(paths.post(slug)) },
  ]);
  useEffect(() => onOpenKeyList(() => setOpen(true)), []);

  return (
    <Dialog open={open} onClose={() => setOpen(false)} title="Keys on this screen">
      {groups.map((group) => (
        <section key={group.name} className="mb-4">
          <h3 className="mb-1 text-sm text-graphite">{group.name}</h3>
          <dl className="grid grid-cols-[6rem_1fr] gap-y-1">
            {group.bindings.map((binding) => (
              <div key={`${binding.key}${binding.says}`} className="contents">
                <dt>
                  <kbd className="rounded-mark border border-rule bg-paper px-1.5 py-0.5 font-mono text-xs font-semibold">
                    {shownKey(binding)}
                  </kbd>
                </dt>
                <dd>{binding.says}</dd>
              </div>
            ))}
          </dl>
        </section>
      ))}
      <p className="border-t border-rule pt-3 text-sm text-graphite">
        Tab moves through everything on the page, Enter presses it, Esc closes what is open. Ctrl and Enter sends what
        is written.
      </p>
      <div className="mt-3 flex min-h-9 items-center gap-2 touch:min-h-11">
        <input
          id={switchId}
          type="checkbox"
          checked={on}
          onChange={(event) => setOn(event.target.checked)}
          className="size-4.5 accent-ink"
        />
        <label htmlFor={switchId}>Single keys work on this browser</label>
      </div>
    </Dialog>
  );
}
