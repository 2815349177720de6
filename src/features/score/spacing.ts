import type { Finding, Flight, ReadObject, Source } from '../../../shared/reading/document.ts';
import type { FindingKind } from '../../../shared/reading/kinds.ts';
import { arcAt } from '../../lib/arcAt.ts';
import { drawingsOf } from '../../lib/drawings.ts';

export type Direction = 'across' | 'up';

/** The step that leads to one drawing, px a frame, beside the step it should be. */
export interface Spacing {
  frame: number;
  until: number;
  /** Across: along the flight's own direction, whichever side it flies to. Up: positive when the thing rises. */
  drawn: number;
  /** Where the true arc puts it; null outside a flight. */
  true: number | null;
  flight: string | null;
  /** A finding speaks of this drawing and its bar leaves the blue line. */
  off: boolean;
}

/** Which lane shows a kind of finding: in which direction its drawings leave the blue line. */
const SHOWN_IN: Record<FindingKind, readonly Direction[]> = {
  'apex-off-centre': ['up'],
  'too-straight': ['up'],
  hang: ['up'],
  'across-uneven': ['across'],
  'spacing-off-path': ['across', 'up'],
  'gravity-changes': ['up'],
  'gravity-off-scale': ['up'],
  pop: ['across', 'up'],
  'held-frame': ['across', 'up'],
  'bounce-gains': ['up'],
};

/** A bar leaves its line when the gap is more than this share of the flight's usual step, and more than its scatter. */
const LEAVES_BY = 0.1;

/**
 * Contacts lie between frames. A step that runs further than this past one is partly flight and partly not, so no blue
 * line can be drawn for it.
 */
const CONTACT_SLACK = 0.15;

function flightOver(flights: readonly Flight[], from: number, to: number): Flight | undefined {
  return flights.find(
    (flight) =>
      from >= (flight.takeOff ?? Number.NEGATIVE_INFINITY) - CONTACT_SLACK &&
      to <= (flight.landing ?? Number.POSITIVE_INFINITY) + CONTACT_SLACK,
  );
}

function usualStep(flight: Flight): number {
  const first = flight.trueArc[0];
  const last = flight.trueArc.at(-1);
  if (!first || !last || last.frame === first.frame) return 0;
  let length = 0;
  for (let index = 1; index < flight.trueArc.length; index++) {
    const before = flight.trueArc[index - 1]!;
    const here = flight.trueArc[index]!;
    length += Math.hypot(here.x - before.x, here.y - before.y);
  }
  return length / (last.frame - first.frame);
}

/**
 * The bars of one spacing lane and the blue line they should follow, px a frame, one for each drawing but the first.
 * @param findings those of this object
 */
export function spacingOf(
  object: Pick<ReadObject, 'marks' | 'flights'>,
  source: Pick<Source, 'exposure' | 'frames'>,
  findings: readonly Pick<Finding, 'kind' | 'fromFrame' | 'toFrame' | 'flight'>[],
  direction: Direction,
): Spacing[] {
  const drawings = drawingsOf(object, source);
  return drawings.slice(1).map((drawing, index) => {
    const before = drawings[index]!;
    const frames = drawing.frame - before.frame;
    const flight = flightOver(object.flights, before.frame, drawing.frame);
    const sign = direction === 'up' ? -1 : flight && flight.across.value < 0 ? -1 : 1;
    const along = (from: { x: number; y: number }, to: { x: number; y: number }) =>
      (sign * (direction === 'up' ? to.y - from.y : to.x - from.x)) / frames;
    const trueBefore = flight && arcAt(flight.trueArc, before.frame);
    const trueHere = flight && arcAt(flight.trueArc, drawing.frame);
    const drawn = along(before, drawing);
    const should = trueBefore && trueHere ? along(trueBefore, trueHere) : null;
    const spokenOf = findings.some(
      (finding) =>
        SHOWN_IN[finding.kind].includes(direction) &&
        finding.fromFrame <= drawing.until &&
        drawing.frame <= finding.toFrame &&
        (finding.flight === null || finding.flight === flight?.id),
    );
    const room = flight ? Math.max(LEAVES_BY * usualStep(flight), (2 * flight.residual) / frames) : 0;
    return {
      frame: drawing.frame,
      until: drawing.until,
      drawn,
      true: should,
      flight: flight?.id ?? null,
      off: spokenOf && should !== null && Math.abs(drawn - should) > room,
    };
  });
}

/** A vertical scale of a lane: px of the screen for each px a frame, and where zero lies. */
export interface LaneScale {
  zero: number;
  perUnit: number;
}

/**
 * Fits bars and blue line into a lane of `height` px with `pad` px above and below; zero lies where both fit. What is
 * outside flights does not set the scale while there is a flight: a cut in the motion would flatten all the rest.
 */
export function laneScale(spacing: readonly Spacing[], height: number, pad = 5): LaneScale {
  const inFlight = spacing.filter((bar) => bar.flight !== null);
  const counted = inFlight.length > 0 ? inFlight : spacing;
  const values = counted.flatMap((bar) => (bar.true === null ? [bar.drawn] : [bar.drawn, bar.true]));
  const top = Math.max(0, ...values);
  const bottom = Math.min(0, ...values);
  const span = top - bottom;
  if (span === 0) return { zero: height - pad, perUnit: 0 };
  const perUnit = (height - 2 * pad) / span;
  return { zero: pad + top * perUnit, perUnit };
}

/** Y of a value in the lane, held inside it. */
export function laneY(scale: LaneScale, value: number, height: number): number {
  return Math.min(height, Math.max(0, scale.zero - value * scale.perUnit));
}

/** The blue lines of a lane: for each flight the frame (column middle of the drawing) and the step it should be. */
export function trueLines(
  spacing: readonly Spacing[],
): { flight: string; points: { frame: number; value: number }[] }[] {
  const lines = new Map<string, { frame: number; value: number }[]>();
  for (const bar of spacing) {
    if (bar.flight === null || bar.true === null) continue;
    const points = lines.get(bar.flight) ?? [];
    points.push({ frame: (bar.frame + bar.until) / 2, value: bar.true });
    lines.set(bar.flight, points);
  }
  return [...lines].map(([flight, points]) => ({ flight, points }));
}
