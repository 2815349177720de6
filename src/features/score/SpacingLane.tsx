import { memo } from 'react';
import { shownFrame } from '../../../shared/reading/document.ts';
import { shownNumber } from '../../lib/honestDigits.ts';
import { type Playhead, useLitFrame } from '../../lib/playhead.ts';
import type { Columns, FrameRange } from './columns.ts';
import { Lane } from './Lane.tsx';
import { laneScale, type LaneScale, laneY, type Spacing, trueLines } from './spacing.ts';

interface SpacingLaneProps {
  name: string;
  spacing: readonly Spacing[];
  height: number;
  columns: Columns;
  range: FrameRange;
  firstFrame: number;
  playhead: Playhead;
}

interface DrawingProps {
  spacing: readonly Spacing[];
  scale: LaneScale;
  height: number;
  columns: Columns;
  from: number;
  to: number;
}

const Bars = memo(function Bars({ spacing, scale, height, columns, from, to }: DrawingProps) {
  const inset = Math.min(9, columns.width * 0.18);
  return spacing
    .filter((bar) => bar.until >= from && bar.frame <= to)
    .map((bar) => {
      const top = laneY(scale, Math.max(0, bar.drawn), height);
      const bottom = laneY(scale, Math.min(0, bar.drawn), height);
      const look = bar.off ? 'fill-redline' : bar.flight === null ? 'fill-none stroke-graphite/45' : 'fill-bar';
      return (
        <rect
          key={bar.frame}
          x={(bar.frame - 1) * columns.width + inset}
          y={top}
          width={(bar.until - bar.frame + 1) * columns.width - 2 * inset}
          height={Math.max(1, bottom - top)}
          rx={2}
          className={look}
        />
      );
    });
});

const BlueLines = memo(function BlueLines({ spacing, scale, height, columns, from, to }: DrawingProps) {
  return trueLines(spacing).map(({ flight, points }) => {
    const seen = points.filter((point, index) => {
      const next = points[index + 1] ?? point;
      const before = points[index - 1] ?? point;
      return next.frame >= from && before.frame <= to;
    });
    const first = seen[0];
    const last = seen.at(-1);
    if (!first || !last) return null;
    const at = (frame: number, value: number) => `${(frame - 0.5) * columns.width} ${laneY(scale, value, height)}`;
    // A line through one drawing only still has to be seen.
    const ends =
      seen.length === 1
        ? [
            { ...first, frame: first.frame - 0.4 },
            { ...first, frame: first.frame + 0.4 },
          ]
        : seen;
    return (
      <path
        key={flight}
        d={`M${ends.map((point) => at(point.frame, point.value)).join('L')}`}
        fill="none"
        strokeWidth={2}
        strokeDasharray="7 5"
        className="stroke-blueline"
      />
    );
  });
});

/** The lit drawing's step in figures, beside the step it should be. */
function LitValue({ spacing, playhead }: Pick<SpacingLaneProps, 'spacing' | 'playhead'>) {
  const frame = useLitFrame(playhead);
  const bar = spacing.find((one) => one.frame <= frame && frame <= one.until);
  if (!bar) return 'px a frame';
  return (
    <>
      <span className="whitespace-nowrap">
        <b className={`font-mono ${bar.off ? 'text-red' : 'text-ink'}`}>{shownNumber(bar.drawn, 1)}</b>
        <span className="max-md:hidden"> px a frame</span>
        <span className="md:hidden"> px/f</span>
      </span>
      {bar.true !== null && (
        <span className="block font-mono whitespace-nowrap text-blue">
          <span className="sr-only">where it should be </span>
          <span aria-hidden="true">○ </span>
          {shownNumber(bar.true, 1)}
        </span>
      )}
    </>
  );
}

function inWords(name: string, spacing: readonly Spacing[], firstFrame: number): string {
  if (spacing.length === 0) return `${name}: nothing was measured.`;
  const values = spacing.map((bar) => bar.drawn);
  const off = spacing.filter((bar) => bar.off).map((bar) => shownFrame(bar.frame, firstFrame));
  const most = `${shownNumber(Math.min(...values), 0)} to ${shownNumber(Math.max(...values), 0)} px a frame`;
  return off.length === 0
    ? `${name}: ${most}, no bar leaves the blue line.`
    : `${name}: ${most}, the bars of frames ${off.join(', ')} leave the blue line.`;
}

/** A lane of bars, px a frame for each drawing, and the blue line where they should end. */
export function SpacingLane({ name, spacing, height, columns, range, firstFrame, playhead }: SpacingLaneProps) {
  const scale = laneScale(spacing, height);
  const shared = { spacing, scale, height, columns, from: range.from, to: range.to };
  return (
    <Lane name={name} sub={<LitValue spacing={spacing} playhead={playhead} />} height={height} width={columns.total}>
      <svg
        width={columns.total}
        height={height}
        role="img"
        aria-label={inWords(name, spacing, firstFrame)}
        className="absolute inset-0 block"
      >
        <path d={`M0 ${scale.zero}H${columns.total}`} className="stroke-rule" />
        <Bars {...shared} />
        <BlueLines {...shared} />
      </svg>
    </Lane>
  );
}
