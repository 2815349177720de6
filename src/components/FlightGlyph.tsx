import clsx from 'clsx';
import type { ReviewState } from '../../shared/api/takes.ts';

const FLIGHTS: Record<ReviewState, string> = {
  waiting: '',
  'another-pass': 'M2 11C4 4 7 2.4 9.6 4.6',
  cleared: 'M2 11C4.5 .6 11.5 .6 14 11',
  waived: 'M2 11C3 3 5 3 6.4 6S10 9 11 4s2-1 3 7',
};

/** What became of a take, as a small flight: not yet thrown, falls short, lands, goes its own way. Decorative beside its word. */
export function FlightGlyph({ state, className }: { state: ReviewState; className?: string }) {
  return (
    <svg viewBox="0 0 16 13" className={clsx('pencil h-[0.8125rem] w-4 shrink-0', className)} aria-hidden="true">
      <path d="M1 11h14" opacity={state === 'waiting' ? 1 : 0.45} />
      {state === 'waiting' ? (
        <circle cx="4" cy="9" r="1.6" className="fill-current" stroke="none" />
      ) : (
        <path d={FLIGHTS[state]} />
      )}
    </svg>
  );
}
