import type { DraftPicture } from '../../../shared/api/drafts.ts';
import type { Grid } from '../../../shared/finding/grid.ts';
import { cellsOf } from './gridEdit.ts';

/** Above this many cells their numbers would only hide the picture. */
const MOST_NUMBERS = 120;

/** The cells of a grid over its picture, numbered in reading order; empty ones are washed over. */
export function GridDrawing({ grid, picture }: { grid: Grid; picture: DraftPicture }) {
  const cells = cellsOf(grid);
  const size = Math.min(grid.cellHeight * 0.2, grid.cellWidth * 0.25);
  return (
    <svg
      viewBox={`0 0 ${picture.width} ${picture.height}`}
      className="absolute inset-0 size-full"
      role="img"
      aria-label={`The cut: ${grid.count} frames, ${grid.columns} across and ${grid.rows} down`}
    >
      {cells.map((cell) => (
        <g key={cell.index}>
          <rect
            x={cell.x}
            y={cell.y}
            width={grid.cellWidth}
            height={grid.cellHeight}
            className={`stroke-pencil-ink ${cell.used ? 'fill-none' : 'fill-surround/80'}`}
            strokeWidth="1.5"
            vectorEffect="non-scaling-stroke"
          />
          <rect
            x={cell.x}
            y={cell.y}
            width={grid.cellWidth}
            height={grid.cellHeight}
            className="fill-none stroke-pencil-paper"
            strokeWidth="1.5"
            strokeDasharray="4 4"
            vectorEffect="non-scaling-stroke"
          />
          {cell.used && cells.length <= MOST_NUMBERS && (
            <text
              x={cell.x + size * 0.4}
              y={cell.y + size * 1.15}
              fontSize={size}
              className="fill-pencil-ink stroke-pencil-paper font-mono font-semibold [paint-order:stroke]"
              strokeWidth={size * 0.25}
            >
              {cell.index + 1}
            </text>
          )}
        </g>
      ))}
    </svg>
  );
}
