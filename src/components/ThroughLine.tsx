import clsx from 'clsx';

export interface ThroughLineProps {
  /** How many were through after each decision, first to last. */
  steps: { at: string; through: number }[];
  total: number;
  className?: string;
}

const WIDTH = 264;
const HEIGHT = 64;
const PAD = 6;

/** How a sheet fills: one step up for each shot that came through, over the time it took. The sentence beside it says the same. */
export function ThroughLine({ steps, total, className }: ThroughLineProps) {
  const first = steps[0];
  const last = steps.at(-1);
  if (!first || !last || total === 0) return null;
  const from = Date.parse(first.at);
  const span = Math.max(1, Date.parse(last.at) - from);
  // The last step stands at four fifths: what is still to come has room to its right.
  const x = (at: string) =>
    PAD + ((Date.parse(at) - from) / span) * (WIDTH - 2 * PAD) * (last.through < total ? 0.8 : 1);
  const y = (through: number) => HEIGHT - PAD - (through / total) * (HEIGHT - 2 * PAD);
  const path = steps.map((step) => `H${x(step.at).toFixed(1)}V${y(step.through).toFixed(1)}`).join('');

  return (
    <svg viewBox={`0 0 ${WIDTH} ${HEIGHT}`} className={clsx('block', className)} aria-hidden="true">
      <path d={`M0 ${y(total)}H${WIDTH}`} className="stroke-graphite" strokeDasharray="2 4" />
      <path d={`M0 ${HEIGHT - PAD}H${WIDTH}`} className="stroke-rule" />
      <path d={`M${PAD} ${y(0)}${path}`} className="pencil text-ink" strokeWidth="2" />
      <text x={WIDTH} y={y(total) + 12} textAnchor="end" className="fill-graphite font-mono text-[11px]">
        {total}
      </text>
      {last.through < total && (
        <text x={x(last.at) + 8} y={y(last.through) + 4} className="fill-ink font-mono text-[11px] font-semibold">
          {last.through}
        </text>
      )}
      <circle cx={x(last.at)} cy={y(last.through)} r="3.5" className="fill-ink" />
    </svg>
  );
}
