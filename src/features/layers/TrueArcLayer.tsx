import { memo } from 'react';
import { arcAt } from '../../lib/arcAt.ts';
import { HaloLine } from './Halo.tsx';
import type { DrawnObject, LayerProps } from './layerProps.ts';
import { arcLine, pathThrough } from './lines.ts';

/** Where the drawings of a flight should be: the true arc at each drawing's frame, or at its own points without any. */
function openDots(object: DrawnObject, flight: DrawnObject['flights'][number]) {
  const first = flight.trueArc[0]?.frame ?? 0;
  const last = flight.trueArc.at(-1)?.frame ?? 0;
  const drawings = object.drawings.filter((drawing) => drawing.frame >= first - 1e-6 && drawing.frame <= last + 1e-6);
  return drawings.flatMap((drawing) => {
    const point = arcAt(flight.trueArc, drawing.frame);
    return point ? [{ ...point, frame: drawing.frame }] : [];
  });
}

/** The true arc in blue pencil: dashed, with an open dot where each drawing should be. */
export const TrueArcLayer = memo(function TrueArcLayer({ objects, unit }: LayerProps) {
  return (
    <g data-layer="arc" className="animate-[draw-across_180ms_ease-out]" pointerEvents="none">
      {objects.flatMap((object) =>
        object.flights.map((flight) => (
          <g key={flight.id}>
            <HaloLine
              d={pathThrough(arcLine(flight.trueArc))}
              width={2}
              dash="7 5"
              className="stroke-pencil-blueline"
              halo={0.5}
            />
            {openDots(object, flight).map((dot) => (
              <circle
                key={dot.frame}
                cx={dot.x}
                cy={dot.y}
                r={4.6 * unit}
                strokeWidth={1.6}
                vectorEffect="non-scaling-stroke"
                className="fill-pencil-bluewash stroke-pencil-blue"
              />
            ))}
          </g>
        )),
      )}
    </g>
  );
});
