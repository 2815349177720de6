import { memo } from 'react';
import { HaloLine, HaloText } from './Halo.tsx';
import type { LayerProps } from './layerProps.ts';
import { quarterDrop } from './lines.ts';

/** Halfway in time from the apex to the end of a side, a quarter of the drop: drawn over each true arc in blue pencil. */
export const QuarterDropLayer = memo(function QuarterDropLayer({ objects, unit }: LayerProps) {
  return (
    <g data-layer="quarter" pointerEvents="none">
      {objects.flatMap((object) =>
        object.flights.flatMap((flight) => {
          const quarter = quarterDrop(flight.trueArc);
          if (!quarter) return [];
          const xs = [quarter.apex.x, ...quarter.sides.flatMap((side) => [side.half.x, side.end.x])];
          const left = Math.min(...xs) - 14 * unit;
          const right = Math.max(...xs) + 14 * unit;
          const level = (y: number) => `M${left} ${y}H${right}`;
          const lowest = Math.max(...quarter.sides.map((side) => side.end.y));
          return [
            <g key={flight.id}>
              <HaloLine d={level(quarter.apex.y)} width={1.2} dash="2 4" className="stroke-pencil-blue" halo={0.4} />
              <HaloLine d={level(quarter.quarterY)} width={1.4} dash="2 4" className="stroke-pencil-blue" halo={0.4} />
              {quarter.sides.map((side) => (
                <HaloLine
                  key={side.end.x}
                  d={`M${side.half.x} ${quarter.apex.y}V${lowest}`}
                  width={1.2}
                  dash="2 4"
                  className="stroke-pencil-blue"
                  halo={0.4}
                />
              ))}
              <HaloText
                x={right + 4 * unit}
                y={quarter.quarterY + 4 * unit}
                size={12}
                unit={unit}
                className="fill-pencil-blue font-mono"
                weight={600}
              >
                quarter
              </HaloText>
            </g>,
          ];
        }),
      )}
    </g>
  );
});
