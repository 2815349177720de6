import type { ReactNode } from 'react';

/** A page that holds one thing to say and what to do next. Whoever shows it stands in a `main`. */
export function PlainPage({ title, children, action }: { title: string; children: ReactNode; action?: ReactNode }) {
  return (
    <div className="mx-auto max-w-xl px-3.5 py-16 sm:px-7">
      <title>{`${title} · Spandrel`}</title>
      <h1 className="text-3xl">{title}</h1>
      <p className="mt-3 text-md text-graphite">{children}</p>
      {action && <div className="mt-5 flex flex-wrap gap-2">{action}</div>}
    </div>
  );
}
