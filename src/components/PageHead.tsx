import type { ReactNode } from 'react';

/** The top of a page: its title, a word beside it, and what one can do at the right. Sets the document's title. */
export function PageHead({ title, children, actions }: { title: string; children?: ReactNode; actions?: ReactNode }) {
  return (
    <div className="mb-3 flex flex-wrap items-center gap-x-3.5 gap-y-2">
      <title>{`${title} · Spandrel`}</title>
      <h1 className="text-2xl">{title}</h1>
      {children}
      {actions && <div className="ml-auto flex flex-wrap gap-2">{actions}</div>}
    </div>
  );
}
