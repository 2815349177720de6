import { memo } from 'react';
import { thumbnailUrl } from '../../../shared/api/takes.ts';
import { shownFrame } from '../../../shared/reading/document.ts';
import { type Playhead, useFrame } from '../../lib/playhead.ts';
import type { Columns, FrameRange } from './columns.ts';
import { Lane } from './Lane.tsx';
import { thumbShift } from './thumbShift.ts';

interface StripLaneProps {
  takeId: string;
  firstFrame: number;
  columns: Columns;
  range: FrameRange;
  playhead: Playhead;
  /** Production numbers that are missing between the posted files. */
  missing: readonly number[];
  /** Width of the picture over its height. */
  aspect: number;
  /** Where the thing is across the picture on a frame, 0 to 1; null where it is not seen. */
  thingAt: (frame: number) => number | null;
}

const THUMB = 34;
const LANE = 54;
/** Width of a digit of a frame number with its share of space, px. */
const DIGIT = 7.6;

const Thumbs = memo(function Thumbs({
  takeId,
  firstFrame,
  columns,
  from,
  to,
  aspect,
  thingAt,
}: Omit<StripLaneProps, 'range' | 'playhead' | 'missing'> & FrameRange) {
  const digits = String(shownFrame(columns.frames, firstFrame)).length;
  const every = Math.ceil((digits * DIGIT) / columns.width);
  const width = Math.min(columns.width - 4, THUMB * aspect);
  return Array.from({ length: to - from + 1 }, (_, index) => from + index).map((frame) => (
    <div
      key={frame}
      className="absolute top-0 flex flex-col items-center"
      style={{ left: (frame - 1) * columns.width, width: columns.width }}
    >
      <img
        src={thumbnailUrl(takeId, frame)}
        alt=""
        loading="lazy"
        decoding="async"
        draggable={false}
        className="mt-1 rounded-[3px] bg-well object-cover outline outline-rule select-none"
        style={{
          width,
          height: THUMB,
          objectPosition: `${100 * thumbShift(thingAt(frame) ?? 0.5, THUMB * aspect, width)}% 50%`,
        }}
      />
      {shownFrame(frame, firstFrame) % every === 0 && (
        <span className="mt-px font-mono text-2xs leading-tight text-graphite">{shownFrame(frame, firstFrame)}</span>
      )}
    </div>
  ));
});

/** The frame of the playhead on the strip: a slider for keys and screen readers. */
function Cursor({ firstFrame, columns, playhead }: Pick<StripLaneProps, 'firstFrame' | 'columns' | 'playhead'>) {
  const frame = useFrame(playhead);
  return (
    <div
      className="absolute top-0.5 z-10 flex flex-col items-center rounded-mark has-focus-visible:outline-2 has-focus-visible:outline-offset-1"
      style={{ width: columns.width, height: LANE - 3, transform: `translateX(${(frame - 1) * columns.width}px)` }}
    >
      <input
        type="range"
        className="sr-only"
        aria-label="Frame"
        min={shownFrame(1, firstFrame)}
        max={shownFrame(columns.frames, firstFrame)}
        value={shownFrame(frame, firstFrame)}
        onChange={(event) => playhead.choose(Number(event.target.value) - firstFrame + 1)}
      />
      <span className="rounded-[4px] border-2 border-ink" style={{ width: columns.width, height: THUMB + 4 }} />
      <span className="font-mono text-2xs leading-tight font-bold text-ink">
        <span className="rounded-mark bg-sheet px-1">{shownFrame(frame, firstFrame)}</span>
      </span>
    </div>
  );
}

/** The posted frames in small, under the numbers the production gives them. */
export function StripLane({ takeId, firstFrame, columns, range, playhead, missing, aspect, thingAt }: StripLaneProps) {
  const gap = missing.length > 0 ? `, ${missing.length} missing` : '';
  return (
    <Lane name="Strip" sub={`${columns.frames} frames${gap}`} height={LANE} width={columns.total} first>
      <Thumbs
        takeId={takeId}
        firstFrame={firstFrame}
        columns={columns}
        from={range.from}
        to={range.to}
        aspect={aspect}
        thingAt={thingAt}
      />
      <Cursor firstFrame={firstFrame} columns={columns} playhead={playhead} />
    </Lane>
  );
}
