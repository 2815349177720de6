import clsx from 'clsx';
import type { Person } from '../../../shared/api/people.ts';
import type { StampBoard } from '../../../shared/api/stamps.ts';
import { STAMP_WORDS, StampGlyph } from '../../components/StampGlyph.tsx';
import { sentenceOf } from '../../lib/ApiProblem.ts';
import { hasStamped, kindsInOrder } from './stampBoards.ts';
import { useStamps } from './useStamps.ts';

export interface StampRowProps {
  slug: string;
  takeId: string;
  /** Null: the stamps of the take itself. */
  noteId: string | null;
  board: StampBoard;
  me: Person;
  /** What is stamped, for screen readers: "Tomasz's note". */
  what: string;
  className?: string;
}

/** The five stamps with the names of who stamped. A click sets your own, another takes it off. */
export function StampRow({ slug, takeId, noteId, board, me, what, className }: StampRowProps) {
  const { shown, set, error } = useStamps({ slug, takeId, noteId }, me, board);
  return (
    <div className={className}>
      <fieldset aria-label={`Stamps on ${what}`} className="-ml-1.5 flex flex-wrap items-center gap-x-1">
        {kindsInOrder(shown).map((kind) => {
          const people = shown.stamps.find((stamp) => stamp.kind === kind)?.people ?? [];
          const mine = hasStamped(shown, kind, me.id);
          const names = people.map((person) => person.name).join(', ');
          return (
            <button
              key={kind}
              type="button"
              aria-pressed={mine}
              title={[STAMP_WORDS[kind], names, mine ? 'click to take yours off' : ''].filter(Boolean).join(' · ')}
              onClick={() => set(kind, !mine)}
              className={clsx(
                'inline-flex min-h-7 items-center gap-1 rounded-control px-1.5 text-xs hover:bg-well hover:text-ink touch:min-h-11 touch:min-w-11 touch:justify-center',
                people.length > 0 ? 'text-graphite' : 'text-graphite/75',
                mine && 'font-semibold text-ink!',
              )}
            >
              <StampGlyph kind={kind} className={people.length > 0 ? 'size-4.5' : 'size-4 [stroke-width:1.4]'} />
              <span className="sr-only">{[STAMP_WORDS[kind], names].filter(Boolean).join(': ')}</span>
              {people.length > 0 && (
                <span aria-hidden="true">{people.map((person) => person.name.split(' ')[0]).join(', ')}</span>
              )}
            </button>
          );
        })}
      </fieldset>
      {error && (
        <p role="alert" className="text-xs font-semibold">
          {sentenceOf(error)}
        </p>
      )}
    </div>
  );
}
