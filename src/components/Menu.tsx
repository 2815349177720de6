import clsx from 'clsx';
import { type KeyboardEvent, type ReactNode, useEffect, useId, useRef, useState } from 'react';

export interface MenuItem {
  label: string;
  run: () => void;
  /** A choice among others: shows whether it is the one. */
  checked?: boolean;
  /** A heading above this item. */
  under?: string;
}

export interface MenuProps {
  /** What the button says. */
  children: ReactNode;
  /** For screen readers, where the button's content alone would not do. */
  label: string;
  items: MenuItem[];
  className?: string;
  /** Which edge of the button the list keeps to. */
  align?: 'start' | 'end';
}

/** A button that opens a short list of things to do. Arrow keys move, Escape closes and gives the focus back. */
export function Menu({ children, label, items, className, align = 'start' }: MenuProps) {
  const [open, setOpen] = useState(false);
  const frame = useRef<HTMLDivElement>(null);
  const button = useRef<HTMLButtonElement>(null);
  const list = useRef<HTMLDivElement>(null);
  const listId = useId();

  useEffect(() => {
    if (!open) return;
    list.current?.querySelector<HTMLElement>('[aria-checked="true"], [role^="menuitem"]')?.focus();
    const handlePress = (event: PointerEvent) => {
      if (!frame.current?.contains(event.target as Node)) setOpen(false);
    };
    document.addEventListener('pointerdown', handlePress);
    return () => document.removeEventListener('pointerdown', handlePress);
  }, [open]);

  const close = () => {
    setOpen(false);
    button.current?.focus();
  };

  const handleKeys = (event: KeyboardEvent) => {
    const all = [...(list.current?.querySelectorAll<HTMLElement>('[role^="menuitem"]') ?? [])];
    const at = all.indexOf(document.activeElement as HTMLElement);
    const step = { ArrowDown: at + 1, ArrowUp: at - 1, Home: 0, End: all.length - 1 }[event.key];
    if (event.key === 'Escape') close();
    else if (event.key === 'Tab') setOpen(false);
    else if (step !== undefined) all[(step + all.length) % all.length]?.focus();
    else return;
    if (event.key !== 'Tab') event.preventDefault();
  };

  return (
    <div ref={frame} className="relative">
      <button
        ref={button}
        type="button"
        aria-haspopup="menu"
        aria-expanded={open}
        aria-controls={open ? listId : undefined}
        aria-label={label}
        onClick={() => setOpen(!open)}
        className={className}
      >
        {children}
      </button>
      {open && (
        <div
          ref={list}
          id={listId}
          role="menu"
          tabIndex={-1}
          aria-label={label}
          onKeyDown={handleKeys}
          className={clsx(
            'absolute top-full z-30 mt-1 min-w-48 rounded-control border border-rule bg-sheet py-1 shadow-lg',
            align === 'end' ? 'right-0' : 'left-0',
          )}
        >
          {items.map((item) => (
            <div key={item.label} role="none">
              {item.under && <p className="px-3 pt-2 pb-1 text-xs text-graphite">{item.under}</p>}
              <button
                type="button"
                role={item.checked === undefined ? 'menuitem' : 'menuitemradio'}
                aria-checked={item.checked}
                onClick={() => {
                  close();
                  item.run();
                }}
                className="flex min-h-9 w-full items-center gap-2 px-3 text-left text-sm hover:bg-well focus-visible:bg-well focus-visible:outline-offset-[-2px] touch:min-h-11"
              >
                {item.checked !== undefined && (
                  <span
                    aria-hidden="true"
                    className={clsx('size-1.5 rounded-full', item.checked ? 'bg-ink' : 'bg-transparent')}
                  />
                )}
                {item.label}
              </button>
            </div>
          ))}
        </div>
      )}
    </div>
  );
}
