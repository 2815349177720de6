import clsx from 'clsx';
import type { ReactNode } from 'react';

/** What happened, that nothing was lost, and what to do. In ink: red is for findings. */
export function ErrorNote({
  children,
  action,
  className,
}: {
  children: ReactNode;
  action?: ReactNode;
  className?: string;
}) {
  return (
    <div
      role="alert"
      className={clsx(
        'flex flex-wrap items-center gap-x-3 gap-y-2 rounded-control border border-ink bg-sheet px-3 py-2 text-sm text-ink',
        className,
      )}
    >
      <svg viewBox="0 0 20 20" className="pencil size-4.5 shrink-0" aria-hidden="true">
        <path d="M10 3v8.5M10 16v.2" />
      </svg>
      <div className="min-w-0 flex-1">{children}</div>
      {action}
    </div>
  );
}
