import { memo } from 'react';
import { drawingOn } from '../../lib/drawings.ts';
import { useLitFrame } from '../../lib/playhead.ts';
import { HaloLine, HaloText } from './Halo.tsx';
import type { LayerProps } from './layerProps.ts';
import { pathThrough } from './lines.ts';

const DOT = 3.6;

/** What was drawn: a filled dot for each drawing and the path of action through them, in ink. */
export const MarksLayer = memo(function MarksLayer({ objects, unit, playhead }: LayerProps) {
  return (
    <g data-layer="marks">
      {objects.map((object) => (
        <g key={object.id}>
          <HaloLine d={pathThrough(object.drawings)} width={1.2} className="stroke-pencil-ink opacity-65" halo={0.45} />
          {object.drawings.map((drawing) => (
            <circle
              key={drawing.frame}
              cx={drawing.x}
              cy={drawing.y}
              r={DOT * unit}
              strokeWidth={1.3}
              vectorEffect="non-scaling-stroke"
              data-choose
              className="cursor-pointer fill-pencil-ink stroke-pencil-paper"
              onClick={() => playhead.choose(drawing.frame)}
              onPointerEnter={(event) => event.pointerType === 'mouse' && playhead.point(drawing.frame)}
              onPointerLeave={() => playhead.point(null)}
            />
          ))}
          {objects.length > 1 && object.drawings[0] && (
            <HaloText
              x={object.drawings[0].x}
              y={object.drawings[0].y + 20 * unit}
              size={13}
              unit={unit}
              anchor="middle"
              weight={700}
            >
              {object.id}
            </HaloText>
          )}
        </g>
      ))}
    </g>
  );
});

/** The lit drawing, ringed by the size that was measured. */
export function LitMark({ objects, unit, playhead }: LayerProps) {
  const frame = useLitFrame(playhead);
  return (
    <g pointerEvents="none" data-layer="lit">
      {objects.map((object) => {
        const drawing = drawingOn(object.drawings, frame);
        if (!drawing) return null;
        const radius = Math.max((drawing.radius ?? 0) + 3 * unit, 9 * unit);
        return (
          <g key={object.id} fill="none">
            <circle
              cx={drawing.x}
              cy={drawing.y}
              r={radius}
              strokeWidth={4.4}
              vectorEffect="non-scaling-stroke"
              className="stroke-pencil-paper"
              opacity={0.8}
            />
            <circle
              cx={drawing.x}
              cy={drawing.y}
              r={radius}
              strokeWidth={1.8}
              vectorEffect="non-scaling-stroke"
              className="stroke-pencil-ink"
            />
            <circle
              cx={drawing.x}
              cy={drawing.y}
              r={(DOT + 0.8) * unit}
              strokeWidth={1.3}
              vectorEffect="non-scaling-stroke"
              className="fill-pencil-ink stroke-pencil-paper"
            />
          </g>
        );
      })}
    </g>
  );
}
