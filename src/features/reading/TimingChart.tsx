import { type Finding, shownFrame } from '../../../shared/reading/document.ts';

interface TimingChartProps {
  chart: Finding['chart'][number];
  firstFrame: number;
}

const WIDTH = 240;
const INSET = 14;

/** A timing chart: the two extremes at its ends, a tick where each drawing between them should stand. */
export function TimingChart({ chart, firstFrame }: TimingChartProps) {
  const at = (share: number) => INSET + (WIDTH - 2 * INSET) * Math.min(1, Math.max(0, share));
  const from = shownFrame(chart.from, firstFrame);
  const to = shownFrame(chart.to, firstFrame);
  const shares = chart.ticks.map((tick) => `${Math.round(tick * 100)} %`).join(', ');
  return (
    <svg
      viewBox={`0 0 ${WIDTH} 44`}
      className="block w-full max-w-72 text-blue"
      role="img"
      aria-label={`Timing chart from ${from} to ${to}: drawings at ${shares} of the way`}
    >
      <path d={`M${INSET} 20H${WIDTH - INSET}`} stroke="currentColor" strokeWidth="1.4" />
      {chart.ticks.map((tick) => (
        <path key={tick} d={`M${at(tick)} 13v14`} stroke="currentColor" strokeWidth="1.5" />
      ))}
      {[
        { x: INSET, frame: from, anchor: 'start' as const, edge: 0 },
        { x: WIDTH - INSET, frame: to, anchor: 'end' as const, edge: WIDTH },
      ].map(({ x, frame, anchor, edge }) => (
        <g key={frame}>
          <circle cx={x} cy={20} r={5} strokeWidth="1.6" className="fill-sheet stroke-current" />
          <text x={edge} y={41} fontSize="11" textAnchor={anchor} className="fill-ink font-mono">
            {frame}
          </text>
        </g>
      ))}
    </svg>
  );
}
