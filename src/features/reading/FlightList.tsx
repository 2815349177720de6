import type { Reading } from '../../../shared/reading/document.ts';
import { Card } from '../../components/Card.tsx';
import type { NumberedFinding } from '../../lib/numberedFindings.ts';
import { FlightCard } from './FlightCard.tsx';
import { FoldMark } from './FoldMark.tsx';

/** With more flights than this, those that read true stand folded under one line. */
const MOST_UNFOLDED = 6;

/** A card for each flight of a reading. In a long shot those with a finding come first, and the others fold together. */
export function FlightList({ reading, findings }: { reading: Reading; findings: readonly NumberedFinding[] }) {
  const flights = reading.objects.flatMap((object) =>
    object.flights.map((flight) => ({
      object,
      flight,
      own: findings.filter((finding) => finding.flight === flight.id),
    })),
  );
  const card = ({ object, flight, own }: (typeof flights)[number]) => (
    <FlightCard
      key={flight.id}
      flight={flight}
      object={object}
      reading={reading}
      findings={own}
      open={flights.length === 1 || own.length > 0}
    />
  );
  if (flights.length <= MOST_UNFOLDED) return flights.map(card);
  const off = flights.filter(({ own }) => own.length > 0);
  const rest = flights.filter(({ own }) => own.length === 0);
  return (
    <>
      {off.map(card)}
      {rest.length > 0 && (
        <Card className="px-4 py-3">
          <details>
            <summary className="relative list-none pr-6 touch:min-h-11 [&::-webkit-details-marker]:hidden">
              <h2 className="inline text-md">
                {rest.length} {off.length > 0 ? 'other flights' : 'flights'}
              </h2>{' '}
              <span className="text-sm text-graphite">with nothing off</span>
              <FoldMark />
            </summary>
            <div className="mt-3 space-y-3">{rest.map(card)}</div>
          </details>
        </Card>
      )}
    </>
  );
}
