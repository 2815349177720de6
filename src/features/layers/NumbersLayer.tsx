import { memo } from 'react';
import { type Finding, shownFrame } from '../../../shared/reading/document.ts';
import { useLitFrame } from '../../lib/playhead.ts';
import { drawingOn } from '../../lib/drawings.ts';
import { dotsOf } from './badges.ts';
import { HaloText } from './Halo.tsx';
import { type Box, type PlacedLabel, placeLabels } from './labels.ts';
import type { DrawnObject, LayerProps } from './layerProps.ts';

const SIZE = 12;
const LIT_SIZE = 14;

/**
 * Which drawings get a number: those at the ends of flights and at the apex, then every fifth by the production's count.
 * Of drawings closer than `apart` (picture px) only the first is told.
 */
export function numberedFirst(
  object: Pick<DrawnObject, 'drawings' | 'flights'>,
  firstFrame: number,
  apart: number,
): number[] {
  const nearest = (frame: number) =>
    object.drawings.toSorted((a, b) => Math.abs(a.frame - frame) - Math.abs(b.frame - frame)).slice(0, 1);
  const told = object.flights.flatMap((flight) =>
    [flight.takeOff, flight.landing, flight.apex?.frame ?? null].flatMap((frame) =>
      frame === null ? [] : nearest(frame),
    ),
  );
  const fifths = object.drawings.filter((drawing) => shownFrame(drawing.frame, firstFrame) % 5 === 0);
  const kept: DrawnObject['drawings'] = [];
  for (const drawing of [...told, ...fifths]) {
    if (kept.every((other) => Math.hypot(other.x - drawing.x, other.y - drawing.y) >= apart)) kept.push(drawing);
  }
  return kept.map((drawing) => drawing.frame);
}

export interface PlacedNumber extends PlacedLabel {
  frame: number;
}

/** Places for the production's frame numbers beside the drawings, as many as stand clear of everything else. */
export function placeNumbers(
  { objects, firstFrame, unit, bounds }: Pick<LayerProps, 'objects' | 'firstFrame' | 'unit' | 'bounds'>,
  taken: readonly Box[],
): PlacedNumber[] {
  const requests = objects.flatMap((object) =>
    numberedFirst(object, firstFrame, 12 * unit).flatMap((frame) => {
      const drawing = object.drawings.find((one) => one.frame === frame);
      if (!drawing) return [];
      const width = String(shownFrame(frame, firstFrame)).length * SIZE * 0.62 * unit;
      return [
        { key: `${object.id} ${frame}`, frame, x: drawing.x, y: drawing.y, away: 7 * unit, width, height: SIZE * unit },
      ];
    }),
  );
  return placeLabels(requests, [...dotsOf(objects, 5 * unit), ...taken], bounds).flatMap((label) => {
    const request = requests.find((one) => one.key === label.key);
    return request ? [{ ...label, frame: request.frame }] : [];
  });
}

interface NumbersLayerProps extends LayerProps {
  numbers: readonly PlacedNumber[];
}

function PlainNumber({
  place,
  text,
  unit,
  strong = false,
}: {
  place: PlacedNumber;
  text: string;
  unit: number;
  strong?: boolean;
}) {
  return (
    <HaloText x={place.left} y={place.top + place.height * 0.85} size={SIZE} unit={unit} weight={strong ? 700 : 500}>
      {text}
    </HaloText>
  );
}

/** The production's frame numbers beside the drawings. */
export const NumbersLayer = memo(function NumbersLayer({ numbers, firstFrame, unit }: NumbersLayerProps) {
  return (
    <g data-layer="numbers" pointerEvents="none">
      {numbers.map((place) => (
        <PlainNumber key={place.key} place={place} text={String(shownFrame(place.frame, firstFrame))} unit={unit} />
      ))}
    </g>
  );
});

interface LitNumberProps extends NumbersLayerProps {
  mend: Finding['mend'];
  /** What it may not cover. */
  taken: readonly Box[];
}

/** The number of the lit frame, always told: where it stands already, else below its ring, or above when its drawing moves down. */
export function LitNumber({ objects, unit, firstFrame, playhead, bounds, numbers, mend, taken }: LitNumberProps) {
  const frame = useLitFrame(playhead);
  const drawing = objects.map((object) => drawingOn(object.drawings, frame)).find((one) => one !== undefined);
  if (!drawing) return null;
  const text = String(shownFrame(frame, firstFrame));
  const known = numbers.find((one) => one.frame === frame);
  if (known) return <PlainNumber place={known} text={text} unit={unit} strong />;
  const movesDown = mend.some((one) => one.frame === drawing.frame && one.dy > 0);
  const request = {
    key: text,
    x: drawing.x,
    y: drawing.y,
    width: text.length * LIT_SIZE * 0.62 * unit,
    height: LIT_SIZE * unit,
    away: Math.max((drawing.radius ?? 0) + 3 * unit, 9 * unit) + 5 * unit,
    prefer: movesDown ? ('above' as const) : ('below' as const),
    must: true,
  };
  return placeLabels([request], taken, bounds).map((place) => (
    <HaloText key={text} x={place.left} y={place.top + place.height * 0.82} size={LIT_SIZE} unit={unit} weight={700}>
      {text}
    </HaloText>
  ));
}
