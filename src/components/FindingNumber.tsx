import clsx from 'clsx';

/** The number that ties a finding in the margin to its place on the picture and in the score. */
export function FindingNumber({ number, className }: { number: number; className?: string }) {
  return (
    <span
      className={clsx(
        'inline-grid size-4.5 shrink-0 place-items-center rounded-mark bg-red font-mono text-2xs font-bold text-sheet',
        className,
      )}
    >
      {number}
    </span>
  );
}
