import clsx from 'clsx';
import type { ReactNode } from 'react';

/** A frame's number as the production counts it, or another short figure of a take. */
export function FrameTag({ children, className }: { children: ReactNode; className?: string }) {
  return (
    <span className={clsx('rounded-mark bg-well px-1.5 py-px font-mono text-2xs font-semibold text-ink', className)}>
      {children}
    </span>
  );
}
