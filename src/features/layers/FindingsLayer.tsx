import { memo } from 'react';
import { ApexGap } from './ApexGap.tsx';
import { BADGE, type Badge } from './badges.ts';
import { HaloText } from './Halo.tsx';
import type { LayerProps } from './layerProps.ts';

interface FindingsLayerProps extends LayerProps {
  badges: readonly Badge[];
  chosen: string | null;
  onChoose: (findingId: string) => void;
}

/** What is off, in red pencil: a numbered badge for each finding, and how much in a few words. */
export const FindingsLayer = memo(function FindingsLayer(props: FindingsLayerProps) {
  const { objects, findings, unit, badges, chosen, onChoose } = props;
  return (
    <g data-layer="findings">
      {findings.map((finding) => {
        if (finding.kind !== 'apex-off-centre') return null;
        const flight = objects.flatMap((object) => object.flights).find((one) => one.id === finding.flight);
        return flight ? <ApexGap key={finding.id} flight={flight} unit={unit} /> : null;
      })}
      {badges.map(({ finding, words, ...place }) => {
        const baseline = place.top + place.height / 2 + 4.6 * unit;
        return (
          <g key={place.key} data-choose className="cursor-pointer" onClick={() => onChoose(finding.id)}>
            <title>{finding.title}</title>
            <rect
              x={place.left}
              y={place.top}
              width={BADGE * unit}
              height={BADGE * unit}
              rx={5 * unit}
              strokeWidth={chosen === finding.id ? 2.4 : 1.4}
              vectorEffect="non-scaling-stroke"
              className={`fill-pencil-red ${chosen === finding.id ? 'stroke-pencil-ink' : 'stroke-pencil-paper'}`}
            />
            <text
              x={place.left + (BADGE / 2) * unit}
              y={baseline}
              fontSize={13 * unit}
              fontWeight={700}
              textAnchor="middle"
              className="fill-pencil-paper font-mono"
            >
              {finding.number}
            </text>
            {words && (
              <HaloText
                x={place.left + (BADGE + 6) * unit}
                y={baseline}
                size={13}
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
