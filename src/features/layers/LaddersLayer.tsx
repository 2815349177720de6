import { memo } from 'react';
import { arcAt } from '../../lib/arcAt.ts';
import { drawingOn } from '../../lib/drawings.ts';
import { useLitFrame } from '../../lib/playhead.ts';
import { HaloLine } from './Halo.tsx';
import type { LayerProps } from './layerProps.ts';

/** The two rails of the ladders, px of the picture's plane: one under what is seen, one right of it. */
export interface Rails {
  y: number;
  x: number;
}

interface LaddersProps extends LayerProps {
  rails: Rails;
  /** Blue ticks where the true arc puts each drawing. */
  withTrue: boolean;
}

const TICK = 11;
const TRUE_TICK = 6;

/** Ticks of the drawings in flight; of all drawings when none is. */
function ticksOf({ objects }: Pick<LayerProps, 'objects'>) {
  return objects.flatMap((object) => {
    const inFlight = object.drawings.flatMap((drawing) => {
      const flight = object.flights.find(
        (one) => (one.takeOff ?? -1) - 0.5 <= drawing.frame && drawing.frame <= (one.landing ?? Number.MAX_VALUE) + 0.5,
      );
      return flight ? [{ drawing, should: arcAt(flight.trueArc, drawing.frame) }] : [];
    });
    return inFlight.length > 0 ? inFlight : object.drawings.map((drawing) => ({ drawing, should: null }));
  });
}

/** Tick marks under and beside the picture that show spacing: ink for what was drawn, blue for where it should be. */
export const LaddersLayer = memo(function LaddersLayer({ rails, withTrue, unit, ...rest }: LaddersProps) {
  const ticks = ticksOf(rest);
  if (ticks.length === 0) return null;
  const xs = ticks.map(({ drawing }) => drawing.x);
  const ys = ticks.map(({ drawing }) => drawing.y);
  const drawn = ticks.map(
    ({ drawing }) => `M${drawing.x} ${rails.y}v${-TICK * unit}M${rails.x} ${drawing.y}h${-TICK * unit}`,
  );
  const should = ticks.flatMap(({ should: point }) =>
    point ? [`M${point.x} ${rails.y}v${TRUE_TICK * unit}M${rails.x} ${point.y}h${TRUE_TICK * unit}`] : [],
  );
  const rail = `M${Math.min(...xs)} ${rails.y}H${Math.max(...xs)}M${rails.x} ${Math.min(...ys)}V${Math.max(...ys)}`;
  return (
    <g data-layer="ladders" pointerEvents="none">
      <HaloLine d={rail + drawn.join('')} width={1.1} className="stroke-pencil-ink" halo={0.5} />
      {withTrue && <HaloLine d={should.join('')} width={1.4} className="stroke-pencil-blue" halo={0.6} />}
    </g>
  );
});

/** The ticks of the lit drawing, longer than the rest. */
export function LitTicks({ objects, rails, unit, playhead }: LayerProps & { rails: Rails }) {
  const frame = useLitFrame(playhead);
  return (
    <g pointerEvents="none">
      {objects.map((object) => {
        const drawing = drawingOn(object.drawings, frame);
        if (!drawing) return null;
        const d = `M${drawing.x} ${rails.y}v${-(TICK + 7) * unit}M${rails.x} ${drawing.y}h${-(TICK + 7) * unit}`;
        return <HaloLine key={object.id} d={d} width={2.4} className="stroke-pencil-ink" halo={0.8} />;
      })}
    </g>
  );
}
