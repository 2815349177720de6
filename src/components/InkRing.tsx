import clsx from 'clsx';
import type { Person } from '../../shared/api/people.ts';

export interface InkRingProps {
  person: Pick<Person, 'name' | 'initials'>;
  size?: 'regular' | 'small';
  /** The name stands beside it already, so screen readers skip the ring. */
  named?: boolean;
  className?: string;
}

/** Initials in a ring of ink. No coloured avatars: colour is spoken for. */
export function InkRing({ person, size = 'regular', named = false, className }: InkRingProps) {
  return (
    <span
      title={person.name}
      role={named ? undefined : 'img'}
      aria-label={named ? undefined : person.name}
      aria-hidden={named || undefined}
      className={clsx(
        'ink-ring inline-grid shrink-0 place-items-center bg-sheet px-1 font-mono font-semibold text-ink',
        size === 'small' ? 'h-4.5 min-w-5.5 text-[0.5625rem]' : 'h-5.5 min-w-6.5 text-[0.625rem]',
        className,
      )}
    >
      {person.initials}
    </span>
  );
}
