import clsx from 'clsx';
import type { ComponentProps } from 'react';

/** A short word in a round field. Its colours are the caller's. */
export function Chip({ className, ...rest }: ComponentProps<'span'>) {
  return (
    <span
      {...rest}
      className={clsx(
        'inline-flex items-center gap-1.5 rounded-full px-2.5 py-0.5 text-xs font-semibold whitespace-nowrap',
        className,
      )}
    />
  );
}
