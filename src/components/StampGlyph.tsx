import clsx from 'clsx';
import type { StampKind } from '../../shared/api/stamps.ts';

/** What each stamp says. */
export const STAMP_WORDS: Record<StampKind, string> = {
  agree: 'Agree',
  'on-it': 'On it',
  lovely: 'Lovely',
  'good-weight': 'Good weight',
  unsure: 'Unsure',
};

const MARKS: Record<StampKind, string> = {
  agree: 'M3 11c2 1 3 3 4 5C9 10 12 6 17 3M3 6c1 .6 2 1.6 2.6 2.6',
  'on-it': 'M4 16l1-4L14 3l3 3-9 9zM12.5 4.5l3 3M4 16l2-.5',
  lovely:
    'M6.6 10a3.4 3.4 0 1 0 6.8 0a3.4 3.4 0 1 0-6.8 0M10 2v2.4M10 15.6V18M2 10h2.4M15.6 10H18M4.4 4.4L6 6M14 14l1.6 1.6M15.6 4.4L14 6M6 14l-1.6 1.6',
  'good-weight': 'M10 2v5M6 7h8l-1.2 7L10 18l-2.8-4z',
  unsure: 'M5 7c0-5 10-5 9 .5-.6 3-4 3-4 5.5M10 17v.2',
};

/** One of the five stamps, drawn in ink. With `label` it says its word to screen readers. */
export function StampGlyph({
  kind,
  label = false,
  className,
}: {
  kind: StampKind;
  label?: boolean;
  className?: string;
}) {
  return (
    <svg
      viewBox="0 0 20 20"
      className={clsx('pencil size-4.5 shrink-0', className)}
      role={label ? 'img' : undefined}
      aria-label={label ? STAMP_WORDS[kind] : undefined}
      aria-hidden={label ? undefined : true}
    >
      <path d={MARKS[kind]} />
    </svg>
  );
}
