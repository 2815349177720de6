import clsx from 'clsx';
import type { ComponentProps } from 'react';

export interface IconButtonProps extends ComponentProps<'button'> {
  /** What it does, for screen readers and as the tooltip. */
  label: string;
}

/** A button that holds a drawing only. */
export function IconButton({ label, className, children, ...rest }: IconButtonProps) {
  return (
    <button
      type="button"
      title={label}
      aria-label={label}
      {...rest}
      className={clsx(
        'inline-grid size-9 place-items-center rounded-control border border-transparent text-graphite hover:bg-well hover:text-ink touch:size-11',
        className,
      )}
    >
      {children}
    </button>
  );
}
