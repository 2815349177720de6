import type { Outcome, Reading } from '../../../shared/reading/document.ts';
import { Card } from '../../components/Card.tsx';
import { OUTCOME_SENTENCES } from './outcomes.ts';

/** The outcome a reading as a whole has: read as soon as one thing is. */
export function outcomeOf(reading: Pick<Reading, 'objects'>): Outcome {
  const outcomes = reading.objects.map((object) => object.outcome);
  return outcomes.includes('read') ? 'read' : (outcomes[0] ?? 'no-motion');
}

interface OutcomeCardProps {
  outcome: Exclude<Outcome, 'read'>;
  /** What the reading itself says about it; it knows more than the general sentence. */
  cautions: readonly string[];
}

/** Why a reading judges nothing, and the next step. */
export function OutcomeCard({ outcome, cautions }: OutcomeCardProps) {
  const { title, says, next } = OUTCOME_SENTENCES[outcome];
  return (
    <Card className="space-y-1 px-4 py-3 text-sm">
      <h2 className="text-md">{title}</h2>
      {(cautions.length > 0 ? cautions : [says]).map((sentence) => (
        <p key={sentence}>{sentence}</p>
      ))}
      <p className="text-graphite">{next}</p>
    </Card>
  );
}
