import clsx from 'clsx';
import type { NumberedFinding } from '../../lib/numberedFindings.ts';
import { shownFrame } from '../../../shared/reading/document.ts';
import type { Columns, FrameRange } from './columns.ts';
import { Lane } from './Lane.tsx';
import { labelWidth, packRows } from './rows.ts';

interface FindingsLaneProps {
  findings: readonly NumberedFinding[];
  columns: Columns;
  range: FrameRange;
  firstFrame: number;
  chosen: string | null;
  onChoose: (findingId: string) => void;
  /** What stands here while there are none: "Reads true". */
  none: string;
}

const ROW = 24;

/** Which frames each finding speaks of. */
export function FindingsLane({ findings, columns, range, firstFrame, chosen, onChoose, none }: FindingsLaneProps) {
  const extents = findings.map((finding) => {
    const left = (finding.fromFrame - 1) * columns.width;
    const right = finding.toFrame * columns.width;
    return { left, right: Math.max(right, left + labelWidth(`${finding.number}  ${finding.title}`) + 18) };
  });
  const rows = packRows(extents, 4);
  const height = Math.max(1, ...rows.map((row) => row + 1)) * ROW + 5;
  return (
    <Lane name="Findings" height={height} width={columns.total}>
      {findings.length === 0 && (
        <p className="sticky left-(--names) inline-block px-3 py-1.5 text-xs text-graphite">{none}</p>
      )}
      {findings.map((finding, index) => {
        if (finding.toFrame < range.from || finding.fromFrame > range.to) return null;
        const left = (finding.fromFrame - 1) * columns.width;
        const width = Math.max(1, finding.toFrame - finding.fromFrame + 1) * columns.width;
        const from = shownFrame(finding.fromFrame, firstFrame);
        const to = shownFrame(finding.toFrame, firstFrame);
        return (
          <button
            key={finding.id}
            type="button"
            aria-pressed={chosen === finding.id}
            onClick={() => onChoose(finding.id)}
            className="absolute h-[20px] text-left text-xs font-semibold whitespace-nowrap text-red touch:before:absolute touch:before:-inset-y-3 touch:before:inset-x-0"
            style={{ left: left + 1, top: rows[index]! * ROW + 4, minWidth: width - 2 }}
          >
            <span
              className={clsx(
                'absolute inset-y-0 left-0 rounded-mark border bg-redwash',
                chosen === finding.id ? 'border-2 border-red' : 'border-redline',
              )}
              style={{ width: width - 2 }}
            />
            <span className="sticky left-(--names) pl-2">
              <span className="relative rounded-mark bg-redwash/85 pr-1 font-mono">
                <span className="sr-only">Finding </span>
                {finding.number}
              </span>{' '}
              <span className="relative rounded-mark bg-redwash/85 px-0.5">{finding.title}</span>
              <span className="sr-only">, {from === to ? `frame ${from}` : `frames ${from} to ${to}`}</span>
            </span>
          </button>
        );
      })}
    </Lane>
  );
}
