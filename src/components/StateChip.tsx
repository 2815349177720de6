import clsx from 'clsx';
import type { ReviewState } from '../../shared/api/takes.ts';
import { Chip } from './Chip.tsx';
import { FlightGlyph } from './FlightGlyph.tsx';

/** What each state of review is called. */
export const STATE_WORDS: Record<ReviewState, string> = {
  waiting: 'Waiting',
  'another-pass': 'Another pass',
  cleared: 'Cleared',
  waived: 'Waived',
};

const LOOK: Record<ReviewState, string> = {
  waiting: 'bg-well text-graphite',
  'another-pass': 'bg-amberwash text-amber',
  cleared: 'bg-greenwash text-green',
  waived: 'text-ink inset-ring inset-ring-rule',
};

/** The ink a state is drawn in where it stands without its chip. */
export const STATE_INK: Record<ReviewState, string> = {
  waiting: 'text-graphite',
  'another-pass': 'text-amber',
  cleared: 'text-green',
  waived: 'text-ink',
};

/** A review state: a glyph of its own as well as a colour and a word. */
export function StateChip({ state, className }: { state: ReviewState; className?: string }) {
  return (
    <Chip className={clsx(LOOK[state], className)}>
      <FlightGlyph state={state} /> {STATE_WORDS[state]}
    </Chip>
  );
}
