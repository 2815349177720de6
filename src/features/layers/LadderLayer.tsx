import { memo } from 'react';
import type { Flight, Point } from '../../../shared/reading/document.ts';
import { arcAt } from '../../lib/arcAt.ts';
import { type Drawing, drawingOn } from '../../lib/drawings.ts';
import { useLitFrame } from '../../lib/playhead.ts';
import { HaloLine } from './Halo.tsx';
import type { LayerProps } from './layerProps.ts';

/** The two rails of the ladders, px of the picture's plane: one under what is seen, one right of it. */
export interface Rails {
  x: number;
  y: number;
  /** They stand on the surround, not on the picture. */
  clear: boolean;
}

interface LadderProps extends LayerProps {
  rails: Rails;
  /** Which ladder: the one under the picture, or the one beside it. */
  along: 'across' | 'up';
}

/** Lengths of the ticks, px of the screen. On the picture they are short: they lie over the drawing. */
const ON_SURROUND = { tick: 10, gap: 2.5, should: 6.5, lit: 16 };
const ON_PICTURE = { tick: 6, gap: 2, should: 4, lit: 10 };

interface Tick {
  drawing: Drawing;
  should: Point | null;
  /** It comes after the apex: its tick stands on the other side of the upright rail. */
  falls: boolean;
}

/** Half a frame to both sides: the drawings at the contacts belong to a flight's ladder. */
function isIn(flight: Flight, frame: number): boolean {
  return (flight.takeOff ?? -1) - 0.5 <= frame && frame <= (flight.landing ?? Number.POSITIVE_INFINITY) + 0.5;
}

/** Ticks of the drawings in flight; of all drawings when none is. */
function ticksOf(objects: LayerProps['objects']): Tick[] {
  return objects.flatMap((object) => {
    const aloft = object.drawings.flatMap((drawing): Tick[] => {
      const flight = object.flights.find((one) => isIn(one, drawing.frame));
      if (!flight) return [];
      const should = arcAt(flight.trueArc, drawing.frame);
      return [{ drawing, should, falls: drawing.frame > (flight.apex?.frame ?? 0) }];
    });
    return aloft.length > 0 ? aloft : object.drawings.map((drawing) => ({ drawing, should: null, falls: false }));
  });
}

/** On the surround a ladder is a plain line; on the picture it is pencil with a paper edge. */
function Ticks({ d, width, clear, blue = false }: { d: string; width: number; clear: boolean; blue?: boolean }) {
  if (!clear) {
    return <HaloLine d={d} width={width} className={blue ? 'stroke-pencil-blue' : 'stroke-pencil-ink'} halo={0.6} />;
  }
  return (
    <path
      d={d}
      fill="none"
      strokeWidth={width}
      vectorEffect="non-scaling-stroke"
      className={blue ? 'stroke-surround-blue' : 'stroke-surround-ink'}
    />
  );
}

/**
 * A ladder: tick marks under or beside the picture that show spacing, ink for what was drawn, blue for where it should be.
 * Beside the picture the rise stands left of the rail and the fall right.
 */
export const LadderLayer = memo(function LadderLayer(props: LadderProps & { withTrue: boolean }) {
  const { rails, along, withTrue, unit, objects } = props;
  const ticks = ticksOf(objects);
  if (ticks.length === 0) return null;
  const size = rails.clear ? ON_SURROUND : ON_PICTURE;
  const places = ticks.map(({ drawing }) => (along === 'across' ? drawing.x : drawing.y));
  const side = (tick: Tick) => (tick.falls ? unit : -unit);
  const rail =
    along === 'across'
      ? `M${Math.min(...places)} ${rails.y}H${Math.max(...places)}`
      : `M${rails.x} ${Math.min(...places)}V${Math.max(...places)}`;
  const drawn = ticks.map((tick) =>
    along === 'across'
      ? `M${tick.drawing.x} ${rails.y}v${-size.tick * unit}`
      : `M${rails.x} ${tick.drawing.y}h${size.tick * side(tick)}`,
  );
  const should = ticks.flatMap((tick) => {
    if (!tick.should) return [];
    return along === 'across'
      ? `M${tick.should.x} ${rails.y + size.gap * unit}v${size.should * unit}`
      : `M${rails.x + (size.tick + size.gap) * side(tick)} ${tick.should.y}h${size.should * side(tick)}`;
  });
  return (
    <g data-layer="ladders" pointerEvents="none">
      <Ticks d={rail + drawn.join('')} width={1.2} clear={rails.clear} />
      {withTrue && <Ticks d={should.join('')} width={1.6} clear={rails.clear} blue />}
    </g>
  );
});

/** The tick of the lit drawing, stronger than the rest. */
export function LitTick({ objects, rails, along, unit, playhead }: LadderProps) {
  const frame = useLitFrame(playhead);
  const object = objects.find((one) => drawingOn(one.drawings, frame));
  const drawing = object && drawingOn(object.drawings, frame);
  if (!drawing) return null;
  const flight = object.flights.find((one) => isIn(one, drawing.frame));
  const falls = flight !== undefined && drawing.frame > (flight.apex?.frame ?? 0);
  const reach = (rails.clear ? ON_SURROUND : ON_PICTURE).lit * unit;
  const d =
    along === 'across' ? `M${drawing.x} ${rails.y}v${-reach}` : `M${rails.x} ${drawing.y}h${falls ? reach : -reach}`;
  return (
    <g pointerEvents="none">
      <Ticks d={d} width={3} clear={rails.clear} />
    </g>
  );
}
