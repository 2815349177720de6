import type { ReactNode } from 'react';

/** Wraps skeletons and says once, to screen readers, what is on its way. */
export function Loading({ what, children, className }: { what: string; children: ReactNode; className?: string }) {
  return (
    <div className={className}>
      <output className="sr-only">{what}</output>
      <div aria-busy="true">{children}</div>
    </div>
  );
}
