import type { Outcome, Reading } from '../../../shared/reading/document.ts';
import { Card } from '../../components/Card.tsx';
import { OUTCOME_SENTENCES } from './outcomes.ts';

/** The outcome a reading as a whole has: read as soon as one thing is. */
export function outcomeOf(reading: Pick<Reading, 'objects'>): Outcome {
  const outcomes = reading.objects.map((object) => object.outcome);
  return outcomes.includes('read') ? 'read' : (outcomes[0] ?? 'no-motion');
}

/** Why a reading judges nothing, and the next step. */
export function OutcomeCard({ outcome }: { outcome: Exclude<Outcome, 'read'> }) {
  const { title, says, next } = OUTCOME_SENTENCES[outcome];
  return (
    <Card className="px-4 py-3">
      <h2 className="text-md">{title}</h2>
      <p className="mt-1 text-sm">{says}</p>
      <p className="mt-1 text-sm text-graphite">{next}</p>
    </Card>
  );
}
