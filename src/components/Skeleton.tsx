import clsx from 'clsx';

/** The shape of what comes. Size it with classes; wrap a group of them in `Loading`. */
export function Skeleton({ className }: { className?: string }) {
  return <span className={clsx('block rounded-mark bg-well', className)} aria-hidden="true" />;
}
