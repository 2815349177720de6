import type { Flight, ReadObject, Reading } from '../../../shared/reading/document.ts';
import { Card } from '../../components/Card.tsx';
import type { NumberedFinding } from '../../lib/numberedFindings.ts';
import { flightSentence, flightSpan } from './flightWords.ts';
import { FoldMark } from './FoldMark.tsx';
import { GaugeLine } from './GaugeLine.tsx';
import { HowRead } from './HowRead.tsx';
import { gaugeRows } from './measureWords.ts';

interface FlightCardProps {
  flight: Flight;
  object: ReadObject;
  reading: Reading;
  /** Those of this flight. */
  findings: readonly NumberedFinding[];
  /** Its gauges stand open; others show their sentence and open at a click. */
  open: boolean;
}

/** One flight: a sentence first, then its gauges, and the statistics one click further down. */
export function FlightCard({ flight, object, reading, findings, open }: FlightCardProps) {
  const span = flightSpan(flight, reading.source.firstFrame);
  return (
    <Card className="px-4 py-3" aria-label={`Flight ${flight.id}`}>
      <details open={open}>
        <summary className="relative list-none pr-6 touch:min-h-11 [&::-webkit-details-marker]:hidden">
          <h2 className="flex items-baseline gap-2 text-md">
            Flight {flight.id} <span className="font-mono text-xs font-normal text-graphite">{span}</span>
          </h2>
          <FoldMark />
          <p className="mt-0.5 text-sm text-ink">{flightSentence(flight, findings)}</p>
        </summary>
        <dl className="mt-2">
          {gaugeRows(flight.measures).map((row) => (
            <GaugeLine
              key={row.words}
              {...row}
              called={findings.some((finding) => finding.kind === row.measure.kind)}
            />
          ))}
        </dl>
        <HowRead flight={flight} object={object} reading={reading} />
      </details>
    </Card>
  );
}
