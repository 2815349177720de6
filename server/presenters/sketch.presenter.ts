import type { Sketch } from '../../shared/api/takes.ts';
import type { Outcome, Reading } from '../../shared/reading/document.ts';

/** What a card draws of a reading. Picture px to a tenth, which no card can show finer. */
export function presentSketch(reading: Reading): Sketch {
  const { objects, source } = reading;
  return {
    width: source.width,
    height: source.height,
    outcome: outcomeOf(reading),
    marks: objects.flatMap(({ id, marks }) =>
      marks.map(({ frame, x, y }) => ({ object: id, frame, x: tenth(x), y: tenth(y) })),
    ),
    arcs: objects.flatMap(({ id, flights }) =>
      flights.map((flight) => ({
        object: id,
        flight: flight.id,
        points: flight.trueArc.map(({ frame, x, y }) => ({ frame, x: tenth(x), y: tenth(y) })),
      })),
    ),
    findings: reading.findings.map(({ id, kind, severity, title, flight, fromFrame, toFrame }) => ({
      id,
      kind,
      severity,
      title,
      flight,
      fromFrame,
      toFrame,
    })),
    caution: reading.cautions[0] ?? null,
  };
}

/** One word for the whole take: read when anything in it was. */
function outcomeOf({ objects }: Reading): Outcome {
  const outcomes = objects.map(({ outcome }) => outcome);
  return outcomes.find((outcome) => outcome === 'read') ?? outcomes[0] ?? 'no-motion';
}

function tenth(px: number): number {
  return Math.round(px * 10) / 10;
}
