import clsx from 'clsx';
import type { ComponentProps } from 'react';

export type ButtonKind = 'plain' | 'primary' | 'quiet';
export type ButtonSize = 'regular' | 'small';

const KINDS: Record<ButtonKind, string> = {
  plain: 'border-rule bg-sheet text-ink hover:border-graphite',
  primary: 'border-ink bg-ink text-sheet hover:opacity-90',
  quiet: 'border-transparent bg-transparent text-graphite hover:text-ink hover:bg-well',
};
const SIZES: Record<ButtonSize, string> = {
  regular: 'min-h-9 px-3.5 text-sm touch:min-h-11',
  small: 'min-h-6.5 px-2.5 text-xs touch:min-h-11',
};

/** The classes of a button, for a link that looks like one. */
export function buttonClass(kind: ButtonKind = 'plain', size: ButtonSize = 'regular'): string {
  return clsx(
    'inline-flex items-center justify-center gap-1.5 rounded-control border font-semibold whitespace-nowrap no-underline',
    'disabled:opacity-55 aria-disabled:opacity-55',
    KINDS[kind],
    SIZES[size],
  );
}

export interface ButtonProps extends ComponentProps<'button'> {
  kind?: ButtonKind;
  size?: ButtonSize;
  /** What is happening while it works: "Posting…". The button holds still and says it. */
  busy?: string | false;
}

/** A button that submits nothing unless it says so. */
export function Button({ kind, size, busy, className, children, disabled, ...rest }: ButtonProps) {
  return (
    <button
      type="button"
      {...rest}
      disabled={disabled || Boolean(busy)}
      aria-busy={busy ? true : undefined}
      className={clsx(buttonClass(kind, size), className)}
    >
      {busy || children}
    </button>
  );
}
