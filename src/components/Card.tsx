import clsx from 'clsx';
import type { ComponentProps } from 'react';

/** A sheet of paper on the desk: one hairline, no shadow. */
export function Card({ className, ...rest }: ComponentProps<'section'>) {
  return <section {...rest} className={clsx('rounded-card border border-rule bg-sheet', className)} />;
}
