import clsx from 'clsx';
import { shownFrame } from '../../../shared/reading/document.ts';
import { type Columns, columnMiddle, type FrameRange } from './columns.ts';
import { Lane } from './Lane.tsx';
import { labelWidth, packRows } from './rows.ts';

/** A thread as a pin on its frame. */
export interface Pin {
  key: string;
  frame: number;
  /** Who wrote first, and how many answered: "Tomasz +1". */
  words: string;
}

interface NotesLaneProps {
  pins: readonly Pin[];
  open: string | null;
  onOpen: (key: string) => void;
  columns: Columns;
  range: FrameRange;
  firstFrame: number;
}

const ROW = 26;

/** The notes, each pinned to the frame it speaks about. */
export function NotesLane({ pins, open, onOpen, columns, range, firstFrame }: NotesLaneProps) {
  const places = pins.map((pin) => {
    const middle = columnMiddle(columns, pin.frame);
    const width = labelWidth(pin.words) + 24;
    // A label that would leave the axis at its end stands left of its pin.
    const before = middle + width > columns.total;
    return {
      middle,
      before,
      left: before ? middle - width : middle - 10,
      right: before ? middle + 10 : middle + width,
    };
  });
  const rows = packRows(places, 4);
  const height = Math.max(1, ...rows.map((row) => row + 1)) * ROW + 2;
  return (
    <Lane name="Notes" height={height} width={columns.total}>
      {pins.map((pin, index) => {
        const place = places[index]!;
        if (pin.frame < range.from - 8 || pin.frame > range.to + 8) return null;
        const isOpen = pin.key === open;
        return (
          <button
            key={pin.key}
            type="button"
            aria-expanded={isOpen}
            aria-label={`Note on frame ${shownFrame(pin.frame, firstFrame)}: ${pin.words}`}
            onClick={() => onOpen(pin.key)}
            className={clsx(
              'absolute z-10 flex h-[22px] animate-settle items-center gap-1.5 text-xs whitespace-nowrap touch:before:absolute touch:before:-inset-y-3 touch:before:inset-x-0',
              place.before && 'flex-row-reverse',
              isOpen ? 'font-semibold text-ink' : 'text-graphite hover:text-ink',
            )}
            style={{ left: place.left, width: place.right - place.left, top: rows[index]! * ROW + 3 }}
          >
            <svg viewBox="0 0 20 20" className="size-5 shrink-0" aria-hidden="true">
              <circle
                cx="10"
                cy="10"
                r={isOpen ? 6 : 5}
                strokeWidth="1.6"
                className={clsx('stroke-current', isOpen ? 'fill-current' : 'fill-none')}
              />
            </svg>
            <span className="-ml-0.5">{pin.words}</span>
          </button>
        );
      })}
    </Lane>
  );
}
