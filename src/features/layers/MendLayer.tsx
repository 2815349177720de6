import { memo } from 'react';
import { drawingOn } from '../../lib/drawings.ts';
import { useLitFrame } from '../../lib/playhead.ts';
import { HaloLine, HaloText } from './Halo.tsx';
import type { LayerProps } from './layerProps.ts';
import { arrowHead, type MendArrow, mendArrows } from './lines.ts';

function Arrow({ arrow, unit, strong }: { arrow: MendArrow; unit: number; strong: boolean }) {
  const { shaftEnd, head } = arrowHead(arrow.from, arrow.to, (strong ? 11 : 7) * unit);
  return (
    <g opacity={strong ? 1 : 0.55}>
      <HaloLine
        d={`M${arrow.from.x} ${arrow.from.y}L${shaftEnd.x} ${shaftEnd.y}`}
        width={strong ? 2.2 : 1.2}
        className="stroke-pencil-blue"
        halo={strong ? 0.8 : 0.4}
      />
      <path d={head} className="fill-pencil-blue" />
    </g>
  );
}

const EveryArrow = memo(function EveryArrow({ arrows, unit }: { arrows: readonly MendArrow[]; unit: number }) {
  return arrows.map((arrow) => <Arrow key={arrow.frame} arrow={arrow} unit={unit} strong={false} />);
});

/** Where the drawings of a finding should move: an arrow for each, the lit one with its words, and an open ring where it lands. */
export function MendLayer({ objects, findings, unit, playhead, finding: id }: LayerProps & { finding: string }) {
  const frame = useLitFrame(playhead);
  const finding = findings.find((one) => one.id === id);
  const object = objects.find((one) => one.id === finding?.object);
  if (!finding || !object) return null;
  const arrows = mendArrows(finding.mend, object.drawings);
  const lit = drawingOn(object.drawings, frame);
  const own = lit && arrows.find((arrow) => arrow.frame === lit.frame);
  return (
    <g data-layer="mend" pointerEvents="none">
      <EveryArrow arrows={arrows} unit={unit} />
      {own && lit && (
        <g>
          <circle
            cx={own.to.x}
            cy={own.to.y}
            r={Math.max(lit.radius ?? 0, 7 * unit)}
            fill="none"
            strokeWidth={1.8}
            strokeDasharray="4 3"
            vectorEffect="non-scaling-stroke"
            className="stroke-pencil-blue"
          />
          <Arrow arrow={own} unit={unit} strong />
          <HaloText
            x={Math.max(own.from.x, own.to.x) + Math.max((lit.radius ?? 0) + 3 * unit, 9 * unit) + 7 * unit}
            y={(own.from.y + own.to.y) / 2 + 5 * unit}
            size={14}
            unit={unit}
            className="fill-pencil-blue font-mono"
            weight={600}
          >
            {`${own.words} px`}
          </HaloText>
        </g>
      )}
    </g>
  );
}
