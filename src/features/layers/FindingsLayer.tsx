import { memo } from 'react';
import type { NumberedFinding } from '../../lib/numberedFindings.ts';
import { ApexGap } from './ApexGap.tsx';
import { calloutOf } from './callout.ts';
import { HaloText } from './Halo.tsx';
import { around, placeLabels } from './labels.ts';
import type { DrawnObject, LayerProps } from './layerProps.ts';
import { drawingsUnder, pathThrough } from './lines.ts';

const BADGE = 22;
const CALLOUT = 13;

interface FindingsLayerProps extends LayerProps {
  chosen: string | null;
  onChoose: (findingId: string) => void;
}

/** Where a finding's badge wants to stand: at the drawn apex for an apex, else at the middle of what it speaks of. */
function anchorOf(finding: NumberedFinding, object: DrawnObject) {
  const flight = object.flights.find((one) => one.id === finding.flight);
  if (finding.kind === 'apex-off-centre' && flight?.apex) return { x: flight.apex.x, y: flight.apex.y };
  const under = drawingsUnder(finding, object.drawings);
  const { mend } = finding;
  const most = mend.toSorted((a, b) => Math.hypot(b.dx, b.dy) - Math.hypot(a.dx, a.dy))[0];
  return under.find((drawing) => drawing.frame === most?.frame) ?? under[Math.floor(under.length / 2)] ?? null;
}

/** What is off, in red pencil: a wash along the drawings, a numbered badge, and how much in a few words. */
export const FindingsLayer = memo(function FindingsLayer(props: FindingsLayerProps) {
  const { objects, findings, unit, bounds, chosen, onChoose } = props;
  const drawn = findings.flatMap((finding) => {
    const object = objects.find((one) => one.id === finding.object);
    const anchor = object && anchorOf(finding, object);
    if (!object || !anchor) return [];
    const flight = object.flights.find((one) => one.id === finding.flight);
    return [{ finding, object, flight, anchor, words: calloutOf(finding, flight) }];
  });
  const dots = objects.flatMap((object) => [
    ...object.drawings.map((drawing) => around(drawing, 6 * unit)),
    ...object.flights.flatMap((flight) => flight.trueArc.map((point) => around(point, 6 * unit))),
  ]);
  const places = placeLabels(
    drawn.map(({ finding, anchor, words }) => ({
      key: finding.id,
      x: anchor.x,
      y: anchor.y,
      width: (BADGE + (words ? words.length * 8 + 10 : 0)) * unit,
      height: BADGE * unit,
      away: 12 * unit,
      must: true,
    })),
    dots,
    bounds,
  );
  return (
    <g data-layer="findings">
      {drawn.map(({ finding, object }) => {
        const under = drawingsUnder(finding, object.drawings);
        const strong = chosen === null || chosen === finding.id;
        const wash = { opacity: strong ? 0.26 : 0.1, pointerEvents: 'none' as const };
        return under.length === 1 ? (
          <circle
            key={finding.id}
            cx={under[0]!.x}
            cy={under[0]!.y}
            r={14 * unit}
            className="fill-pencil-redline"
            {...wash}
          />
        ) : (
          <path
            key={finding.id}
            d={pathThrough(under)}
            fill="none"
            strokeWidth={15}
            strokeLinecap="round"
            strokeLinejoin="round"
            vectorEffect="non-scaling-stroke"
            className="stroke-pencil-redline"
            {...wash}
          />
        );
      })}
      {drawn.map(({ finding, flight }) =>
        finding.kind === 'apex-off-centre' && flight ? <ApexGap key={finding.id} flight={flight} unit={unit} /> : null,
      )}
      {places.map((place) => {
        const { finding, words } = drawn.find((one) => one.finding.id === place.key)!;
        const middle = place.top + place.height / 2;
        return (
          <g key={place.key} className="cursor-pointer" onClick={() => onChoose(finding.id)}>
            <title>{finding.title}</title>
            <rect
              x={place.left}
              y={place.top}
              width={BADGE * unit}
              height={BADGE * unit}
              rx={5 * unit}
              strokeWidth={chosen === finding.id ? 2.4 : 1.4}
              vectorEffect="non-scaling-stroke"
              className={
                chosen === finding.id ? 'fill-pencil-red stroke-pencil-ink' : 'fill-pencil-red stroke-pencil-paper'
              }
            />
            <text
              x={place.left + (BADGE / 2) * unit}
              y={middle + 4.6 * unit}
              fontSize={13 * unit}
              fontWeight={700}
              textAnchor="middle"
              className="fill-pencil-paper font-mono"
            >
              {finding.number}
            </text>
            {words && (
              <HaloText
                x={place.left + (BADGE + 7) * unit}
                y={middle + 4.6 * unit}
                size={CALLOUT}
                unit={unit}
                className="fill-pencil-red font-mono"
                weight={600}
              >
                {words}
              </HaloText>
            )}
          </g>
        );
      })}
    </g>
  );
});
