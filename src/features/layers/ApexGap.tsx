import type { Flight } from '../../../shared/reading/document.ts';
import { apexLevel } from './badges.ts';
import { HaloLine } from './Halo.tsx';
import { arrowHead, trueApex } from './lines.ts';

/** How far the drawn apex lies from where it should be: a blue plumb line, a red one, and the way between them. */
export function ApexGap({ flight, unit }: { flight: Flight; unit: number }) {
  const should = trueApex(flight.trueArc);
  const drawn = flight.apex;
  if (!should || !drawn) return null;
  const level = apexLevel(flight, unit) ?? should.y;
  const top = level - 8 * unit;
  const foot = Math.max(...flight.trueArc.map((point) => point.y));
  const from = { x: should.x, y: level };
  const to = { x: drawn.x, y: level };
  const arrow = arrowHead(from, to, 9 * unit);
  return (
    <g pointerEvents="none">
      <HaloLine d={`M${should.x} ${top}V${foot}`} width={1.4} dash="2 5" className="stroke-pencil-blue" halo={0.35} />
      <HaloLine
        d={`M${drawn.x} ${top}V${drawn.y + 20 * unit}`}
        width={1.4}
        className="stroke-pencil-redline"
        halo={0.5}
      />
      <HaloLine
        d={`M${from.x} ${level}H${arrow.shaftEnd.x}`}
        width={1.5}
        className="stroke-pencil-redline"
        halo={0.5}
      />
      <path d={arrow.head} className="fill-pencil-redline" />
    </g>
  );
}
