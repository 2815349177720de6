import type { ReactNode } from 'react';

export interface EmptyStateProps {
  /** What the screen is for. */
  title: string;
  children: ReactNode;
  /** The next step: a button or a link. */
  action?: ReactNode;
}

/** Says what a screen is for while it holds nothing, and offers the next step. */
export function EmptyState({ title, children, action }: EmptyStateProps) {
  return (
    <div className="flex flex-col items-start gap-3 rounded-card border border-dashed border-rule bg-sheet px-6 py-8 sm:flex-row sm:items-center sm:gap-7">
      <svg viewBox="0 0 120 64" className="pencil w-28 shrink-0 text-graphite" aria-hidden="true">
        <path d="M6 58h108" opacity=".5" />
        <path d="M14 58C34 -8 84 -8 106 58" strokeDasharray="5 6" />
        <circle cx="14" cy="54" r="4.5" className="fill-ink" stroke="none" />
      </svg>
      <div className="max-w-prose">
        <h2 className="text-lg">{title}</h2>
        <p className="mt-1 text-graphite">{children}</p>
        {action && <div className="mt-3 flex flex-wrap gap-2">{action}</div>}
      </div>
    </div>
  );
}
