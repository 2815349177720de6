import { memo } from 'react';
import { shownFrame } from '../../../shared/reading/document.ts';
import { useLitFrame } from '../../lib/playhead.ts';
import { drawingOn } from '../../lib/drawings.ts';
import { HaloText } from './Halo.tsx';
import { around, placeLabels } from './labels.ts';
import type { DrawnObject, LayerProps } from './layerProps.ts';

const SIZE = 12;

/** Which drawings get their number first: ends of flights and the apex, then every fifth, then the rest while there is room. */
export function numberedFirst(object: Pick<DrawnObject, 'drawings' | 'flights'>): number[] {
  const inOrder = object.drawings.map((drawing) => drawing.frame);
  const nearest = (frame: number) => inOrder.toSorted((a, b) => Math.abs(a - frame) - Math.abs(b - frame)).slice(0, 1);
  const told = object.flights.flatMap((flight) =>
    [flight.takeOff, flight.landing, flight.apex?.frame ?? null].flatMap((frame) =>
      frame === null ? [] : nearest(frame),
    ),
  );
  const fifths = inOrder.filter((_, index) => index % 5 === 0);
  return [...new Set([...told, ...inOrder.slice(0, 1), ...inOrder.slice(-1), ...fifths])];
}

/** The production's frame numbers beside the drawings, as many as stand clear of everything else. */
export const NumbersLayer = memo(function NumbersLayer({ objects, unit, firstFrame, bounds }: LayerProps) {
  const dots = objects.flatMap((object) => [
    ...object.drawings.map((drawing) => around(drawing, 5 * unit)),
    ...object.flights.flatMap((flight) => flight.trueArc.map((point) => around(point, 5 * unit))),
  ]);
  const requests = objects.flatMap((object) =>
    numberedFirst(object).flatMap((frame) => {
      const drawing = object.drawings.find((one) => one.frame === frame)!;
      const text = String(shownFrame(frame, firstFrame));
      const size = { width: text.length * SIZE * 0.62 * unit, height: SIZE * unit };
      return [{ key: `${object.id} ${text}`, x: drawing.x, y: drawing.y, away: 7 * unit, ...size }];
    }),
  );
  return (
    <g data-layer="numbers" pointerEvents="none">
      {placeLabels(requests, dots, bounds).map((label) => (
        <HaloText key={label.key} x={label.left} y={label.top + label.height * 0.85} size={SIZE} unit={unit}>
          {label.key.split(' ')[1]!}
        </HaloText>
      ))}
    </g>
  );
});

/** The number of the lit frame, always told, above or below its ring. */
export function LitNumber({ objects, unit, firstFrame, playhead, bounds }: LayerProps) {
  const frame = useLitFrame(playhead);
  const drawing = objects.map((object) => drawingOn(object.drawings, frame)).find((one) => one !== undefined);
  if (!drawing) return null;
  const away = Math.max((drawing.radius ?? 0) + 3 * unit, 9 * unit) + 6 * unit;
  const fitsBelow = drawing.y + away + 16 * unit < bounds.top + bounds.height;
  return (
    <HaloText
      x={drawing.x}
      y={fitsBelow ? drawing.y + away + 10 * unit : drawing.y - away}
      size={14}
      unit={unit}
      anchor="middle"
      weight={700}
    >
      {String(shownFrame(frame, firstFrame))}
    </HaloText>
  );
}
