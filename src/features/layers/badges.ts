import type { Flight } from '../../../shared/reading/document.ts';
import type { NumberedFinding } from '../../lib/numberedFindings.ts';
import { calloutOf } from './callout.ts';
import { around, type Box, type PlacedLabel, placeLabels } from './labels.ts';
import type { DrawnObject } from './layerProps.ts';
import { drawingsUnder, trueApex } from './lines.ts';

/** Side of a badge, px of the screen. */
export const BADGE = 22;
const CALLOUT_CHARACTER = 8;

export interface Badge extends PlacedLabel {
  finding: NumberedFinding;
  /** The measure beside it; null where the title says it all. */
  words: string | null;
}

/** Where the drawn apex and the one it should be are measured against each other: above both. px. */
export function apexLevel(flight: Flight, unit: number): number | null {
  const should = trueApex(flight.trueArc);
  return should && flight.apex ? Math.min(should.y, flight.apex.y) - 24 * unit : null;
}

/** Where a badge of a width wants to stand: at the outer side of an apex gap, else at the drawing that is off most. */
function wishOf(finding: NumberedFinding, object: DrawnObject, width: number, unit: number, bounds: Box) {
  const flight = object.flights.find((one) => one.id === finding.flight);
  const should = flight && trueApex(flight.trueArc);
  const level = flight ? apexLevel(flight, unit) : null;
  if (finding.kind === 'apex-off-centre' && flight?.apex && should && level !== null) {
    const away = 8 * unit;
    const left = Math.min(flight.apex.x, should.x);
    const right = Math.max(flight.apex.x, should.x);
    const goesRight = flight.apex.x > should.x;
    const fits = goesRight ? right + away + width <= bounds.left + bounds.width : left - away - width >= bounds.left;
    const prefer = goesRight === fits ? ('right' as const) : ('left' as const);
    return { x: prefer === 'right' ? right : left, y: level, away, prefer };
  }
  const under = drawingsUnder(finding, object.drawings);
  const longest = finding.mend.toSorted((a, b) => Math.hypot(b.dx, b.dy) - Math.hypot(a.dx, a.dy))[0];
  const at = under.find((drawing) => drawing.frame === longest?.frame) ?? under[Math.floor(under.length / 2)];
  return at ? { x: at.x, y: at.y, away: 12 * unit } : null;
}

/** Everything on the picture that a label should not cover: drawings, and where they should be. */
export function dotsOf(objects: readonly DrawnObject[], radius: number): Box[] {
  return objects.flatMap((object) => [
    ...object.drawings.map((drawing) => around(drawing, radius)),
    ...object.flights.flatMap((flight) => flight.trueArc.map((point) => around(point, radius))),
  ]);
}

/** A place for the badge and the measure of each finding. A finding without a drawing has none. */
export function placeBadges(
  objects: readonly DrawnObject[],
  findings: readonly NumberedFinding[],
  unit: number,
  bounds: Box,
): Badge[] {
  const wanted = findings.flatMap((finding) => {
    const object = objects.find((one) => one.id === finding.object);
    if (!object) return [];
    const words = calloutOf(
      finding,
      object.flights.find((one) => one.id === finding.flight),
    );
    const width = (BADGE + (words ? words.length * CALLOUT_CHARACTER + 8 : 0)) * unit;
    const wish = wishOf(finding, object, width, unit, bounds);
    if (!wish) return [];
    return [{ finding, words, request: { key: finding.id, ...wish, width, height: BADGE * unit, must: true } }];
  });
  const places = placeLabels(
    wanted.map((one) => one.request),
    dotsOf(objects, 6 * unit),
    bounds,
  );
  return places.flatMap((place) => {
    const one = wanted.find(({ finding }) => finding.id === place.key);
    return one ? [{ ...place, finding: one.finding, words: one.words }] : [];
  });
}
