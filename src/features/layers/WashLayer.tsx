import { memo } from 'react';
import type { LayerProps } from './layerProps.ts';
import { drawingsUnder, pathThrough } from './lines.ts';

/** A red wash along the drawings that each finding speaks of; the chosen one stands out. */
export const WashLayer = memo(function WashLayer(props: LayerProps & { chosen: string | null }) {
  const { objects, findings, unit, chosen } = props;
  return findings.map((finding) => {
    const object = objects.find((one) => one.id === finding.object);
    const under = object ? drawingsUnder(finding, object.drawings) : [];
    const opacity = chosen === null || chosen === finding.id ? 0.24 : 0.1;
    const only = under.length === 1 ? under[0] : undefined;
    if (only) {
      const radius = Math.max((only.radius ?? 0) + 4 * unit, 15 * unit);
      return (
        <circle
          key={finding.id}
          cx={only.x}
          cy={only.y}
          r={radius}
          opacity={opacity * 1.6}
          className="fill-pencil-redline"
        />
      );
    }
    return (
      <path
        key={finding.id}
        d={pathThrough(under)}
        fill="none"
        strokeWidth={15}
        strokeLinecap="round"
        strokeLinejoin="round"
        vectorEffect="non-scaling-stroke"
        opacity={opacity}
        className="stroke-pencil-redline"
      />
    );
  });
});
