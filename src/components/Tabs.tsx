import clsx from 'clsx';
import { Link } from 'react-router';

export interface TabLink {
  to: string;
  label: string;
  current: boolean;
}

/** A row of views of the same screen. Each is an address of its own, so these are links. */
export function Tabs({ label, tabs, className }: { label: string; tabs: TabLink[]; className?: string }) {
  return (
    <nav aria-label={label} className={clsx('flex gap-1 overflow-x-auto', className)}>
      {tabs.map((tab) => (
        <Link
          key={tab.to}
          to={tab.to}
          aria-current={tab.current ? 'page' : undefined}
          className={clsx(
            'inline-flex min-h-8 items-center rounded-control px-2.5 font-semibold max-sm:px-2 max-sm:text-sm whitespace-nowrap no-underline touch:min-h-11',
            tab.current ? 'bg-well text-ink' : 'text-graphite hover:text-ink',
          )}
        >
          {tab.label}
        </Link>
      ))}
    </nav>
  );
}
