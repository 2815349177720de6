import type { Take } from '../../../shared/api/takes.ts';
import { type Actor, can } from '../../../shared/policy/can.ts';
import { Button } from '../../components/Button.tsx';
import { ReviewActions, whyNot } from '../../features/review/ReviewActions.tsx';

interface TakeActionsProps {
  slug: string;
  take: Take;
  actor: Actor;
  /** Whether the shot has no later take. */
  newest: boolean;
  onWrite: () => void;
}

/** What is done with a take, at the right end of its head. */
export function TakeActions({ slug, take, actor, newest, onWrite }: TakeActionsProps) {
  const why = newest ? whyNot(actor, take) : null;
  return (
    <>
      {why && <span className="-order-1 text-sm text-graphite">{why}</span>}
      {can(actor, 'note:write') && (
        <Button title="N" onClick={onWrite}>
          Write a note
        </Button>
      )}
      <ReviewActions slug={slug} take={take} actor={actor} newest={newest} />
    </>
  );
}

/** The same under the thumb of a phone. */
export function ThumbBar({ slug, take, actor, newest, onWrite }: TakeActionsProps) {
  const why = newest ? whyNot(actor, take) : null;
  return (
    <div className="fixed inset-x-0 bottom-0 z-30 flex gap-2 border-t border-rule bg-sheet px-3.5 py-2.5">
      {can(actor, 'note:write') && (
        <Button className="flex-1 px-2" aria-label="Write a note" onClick={onWrite}>
          Note
        </Button>
      )}
      <ReviewActions slug={slug} take={take} actor={actor} newest={newest} thumb />
      {why && <span className="flex-2 self-center text-xs text-graphite">{why}</span>}
    </div>
  );
}
