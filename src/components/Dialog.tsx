import clsx from 'clsx';
import { type ReactNode, useEffect, useId, useRef } from 'react';
import { CrossGlyph } from './CrossGlyph.tsx';
import { IconButton } from './IconButton.tsx';

export interface DialogProps {
  open: boolean;
  /** Called for Escape, the cross and a press beside the dialog. */
  onClose: () => void;
  title: string;
  children: ReactNode;
  /** Buttons, from the quiet one to the one that acts. */
  actions?: ReactNode;
  className?: string;
}

const WRITING = 'textarea, select, input:not([type=checkbox], [type=radio])';

/** A native modal dialog: the browser keeps the focus inside; it goes back to where it was when the dialog closes. */
export function Dialog({ open, onClose, title, children, actions, className }: DialogProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const titleId = useId();

  useEffect(() => {
    const element = dialog.current;
    if (!open || !element) return;
    const before = document.activeElement;
    if (!element.open) element.showModal();
    // Where something is written, that comes first; else the browser's own choice stands.
    element.querySelector<HTMLElement>(WRITING)?.focus();
    return () => {
      element.close();
      if (before instanceof HTMLElement && before.isConnected) before.focus();
    };
  }, [open]);

  if (!open) return null;
  return (
    <dialog
      ref={dialog}
      aria-labelledby={titleId}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      onPointerDown={(event) => event.target === dialog.current && onClose()}
      className={clsx(
        'm-auto w-[min(34rem,calc(100vw-2rem))] rounded-card border border-rule bg-sheet p-0 text-ink',
        className,
      )}
    >
      <div className="flex max-h-[calc(100dvh-4rem)] flex-col">
        <div className="flex items-center justify-between gap-4 px-5 pt-3 pb-1">
          <h2 id={titleId} className="text-lg">
            {title}
          </h2>
          <IconButton label="Close" onClick={onClose} className="-mr-2">
            <CrossGlyph />
          </IconButton>
        </div>
        <div className="overflow-y-auto px-5 pb-5">{children}</div>
        {actions && <div className="flex flex-wrap justify-end gap-2 border-t border-rule px-5 py-3">{actions}</div>}
      </div>
    </dialog>
  );
}
