import { useState } from 'react';
import type { Take } from '../../../shared/api/takes.ts';
import type { Actor } from '../../../shared/policy/can.ts';
import { can } from '../../../shared/policy/can.ts';
import { Button } from '../../components/Button.tsx';
import { sentenceOf } from '../../lib/ApiProblem.ts';
import { DecisionDialog } from './DecisionDialog.tsx';
import { useDecide } from './useReview.ts';

interface ReviewActionsProps {
  slug: string;
  take: Take;
  actor: Actor;
  /** Whether the shot has no later take: only that one is decided on. */
  newest: boolean;
  /** Under the thumb of a phone: wide buttons with short words; waiving is seldom and stands in the take's menu. */
  thumb?: boolean;
}

/** Why someone who reviews may not decide on this take; null when they may, or when reviewing is not theirs at all. */
export function whyNot(actor: Actor, take: Take): string | null {
  const reviews = can(actor, 'take:decide');
  if (!reviews || can(actor, 'take:decide', { postedById: take.postedBy.id })) return null;
  return 'Your own take: someone else clears it.';
}

/** Clear, another pass, waive: for those who may, and never for their own take. */
export function ReviewActions({ slug, take, actor, newest, thumb = false }: ReviewActionsProps) {
  const decide = useDecide(slug, take.id);
  const [asked, setAsked] = useState<'another-pass' | 'waived' | null>(null);
  if (!newest || !can(actor, 'take:decide', { postedById: take.postedBy.id })) return null;
  const close = () => {
    setAsked(null);
    decide.reset();
  };
  const width = thumb ? 'flex-1 px-2' : '';
  return (
    <>
      <Button className={width} onClick={() => setAsked('another-pass')}>
        Another pass…
      </Button>
      {!thumb && <Button onClick={() => setAsked('waived')}>Waive…</Button>}
      <Button
        kind="primary"
        className={width}
        disabled={take.review === 'cleared'}
        busy={decide.isPending && asked === null && 'Clearing…'}
        onClick={() => decide.mutate({ state: 'cleared', remark: '' })}
      >
        {take.review === 'cleared' ? 'Cleared' : thumb ? 'Clear' : 'Clear this shot'}
      </Button>
      {decide.error && asked === null && (
        <p role="alert" className="w-full text-sm font-semibold">
          {sentenceOf(decide.error)}
        </p>
      )}
      <DecisionDialog
        key={asked === null ? 'closed' : take.id}
        asked={asked}
        busy={decide.isPending}
        error={decide.error}
        onClose={close}
        onDecide={(state, remark) => decide.mutate({ state, remark }, { onSuccess: close })}
      />
    </>
  );
}
