import type { SVGProps } from 'react';

/** A line with a paper edge, legible over any picture. Widths are px of the screen. */
export function HaloLine({
  d,
  width,
  className,
  dash,
  halo = 0.75,
}: {
  d: string;
  width: number;
  className: string;
  dash?: string;
  /** How much of the paper edge shows, 0 to 1. */
  halo?: number;
}) {
  const shared: SVGProps<SVGPathElement> = {
    d,
    fill: 'none',
    vectorEffect: 'non-scaling-stroke',
    strokeLinecap: dash ? 'butt' : 'round',
    strokeLinejoin: 'round',
  };
  return (
    <>
      <path {...shared} strokeWidth={width + 2.4} className="stroke-pencil-paper" opacity={halo} />
      <path {...shared} strokeWidth={width} strokeDasharray={dash} className={className} />
    </>
  );
}

/** Words on the picture with a paper edge. `size` is px of the screen, `unit` picture px for one of them. */
export function HaloText({
  x,
  y,
  size,
  unit,
  anchor = 'start',
  className = 'fill-pencil-ink font-mono',
  weight = 500,
  children,
}: {
  x: number;
  y: number;
  size: number;
  unit: number;
  anchor?: 'start' | 'middle' | 'end';
  className?: string;
  weight?: number;
  children: string;
}) {
  return (
    <text
      x={x}
      y={y}
      fontSize={size * unit}
      fontWeight={weight}
      textAnchor={anchor}
      paintOrder="stroke"
      strokeWidth={3.2 * unit}
      strokeLinejoin="round"
      className={`stroke-pencil-paper ${className}`}
    >
      {children}
    </text>
  );
}
