import type { DraftPicture } from '../../../shared/api/drafts.ts';
import type { Grid } from '../../../shared/finding/grid.ts';
import { cellsOf } from './gridEdit.ts';

/** More would only slow the page down; the cut shows in the first ones. */
const SHOWN = 96;

export interface CutFramesProps {
  grid: Grid;
  picture: DraftPicture;
  address: string;
}

/** The frames as they will be, side by side: a wrong cut shows at once. */
export function CutFrames({ grid, picture, address }: CutFramesProps) {
  const used = cellsOf(grid).filter((cell) => cell.used);
  return (
    <>
      <ol
        className="mt-3 grid max-h-72 grid-cols-[repeat(auto-fill,minmax(5.5rem,1fr))] gap-2 overflow-y-auto p-0.5"
        aria-label="The frames as they are cut"
      >
        {used.slice(0, SHOWN).map((cell) => (
          <li key={cell.index}>
            <svg
              viewBox={`${cell.x} ${cell.y} ${grid.cellWidth} ${grid.cellHeight}`}
              className="block w-full rounded-mark border border-rule bg-surround"
              aria-hidden="true"
            >
              <image href={address} width={picture.width} height={picture.height} />
            </svg>
            <p className="text-center font-mono text-2xs text-graphite">{cell.index + 1}</p>
          </li>
        ))}
      </ol>
      {used.length > SHOWN && <p className="text-sm text-graphite">and {used.length - SHOWN} more</p>}
    </>
  );
}
