import { useState } from 'react';
import type { DraftPicture } from '../../../shared/api/drafts.ts';
import type { Grid } from '../../../shared/finding/grid.ts';
import { Button } from '../../components/Button.tsx';
import { Card } from '../../components/Card.tsx';
import { ErrorNote } from '../../components/ErrorNote.tsx';
import { TextField } from '../../components/TextField.tsx';
import { cellsOf, firstCut, type GridField, gridProblem, withField } from './gridEdit.ts';

const FIELDS: { field: GridField; label: string }[] = [
  { field: 'columns', label: 'Columns' },
  { field: 'rows', label: 'Rows' },
  { field: 'count', label: 'Frames' },
  { field: 'gutterX', label: 'Gutter across, px' },
  { field: 'gutterY', label: 'Gutter down, px' },
  { field: 'marginX', label: 'Margin left and right, px' },
  { field: 'marginY', label: 'Margin above and below, px' },
];

export interface GridEditorProps {
  picture: DraftPicture;
  address: string | undefined;
  /** As it is cut now; null: the picture is one frame. */
  grid: Grid | null;
  onGrid: (grid: Grid | null) => void;
  onRemove: (name: string) => void;
  /** Why the last correction was not kept. */
  problem: string | null;
}

/** How a strip picture is cut into frames: the grid that was found, drawn over it and correctable. */
export function GridEditor({ picture, address, grid, onGrid, onRemove, problem }: GridEditorProps) {
  // While a number is half written the drawing follows it, and only a grid that can be cut is sent.
  const [written, setWritten] = useState<Grid | null>(null);
  const shown = written ?? grid;
  const wrong = shown && gridProblem(shown, picture);

  const handleField = (field: GridField, text: string) => {
    if (!shown) return;
    const next = withField(shown, field, text === '' ? Number.NaN : Number(text), picture);
    setWritten(next);
    if (!gridProblem(next, picture)) onGrid(next);
  };

  return (
    <Card className="px-4 py-3" aria-labelledby="strip-picture">
      <div className="mb-2 flex flex-wrap items-baseline gap-x-3">
        <h2 id="strip-picture" className="text-md">
          {shown ? `A strip of ${Number.isInteger(shown.count) ? shown.count : '…'} frames` : 'One picture'}
        </h2>
        <span className="text-sm text-graphite">
          <span className="font-mono text-xs break-all">{picture.name}</span>, {picture.width} × {picture.height} px
          {shown && !wrong && `, each frame ${shown.cellWidth} × ${shown.cellHeight} px`}
        </span>
        <Button size="small" kind="quiet" className="ml-auto" onClick={() => onRemove(picture.name)}>
          Take it out
        </Button>
      </div>
      <div className="flex justify-center overflow-hidden rounded-control bg-surround">
        <div className="relative max-h-112 w-full" style={{ aspectRatio: `${picture.width} / ${picture.height}` }}>
          {address && (
            <img
              src={address}
              alt={`The strip ${picture.name}`}
              className="absolute inset-0 size-full object-contain"
            />
          )}
          {shown && !wrong && <GridDrawing grid={shown} picture={picture} />}
        </div>
      </div>
      {shown ? (
        <>
          <p className="mt-2 text-sm text-graphite">
            Frames are read row by row. Where the lines do not meet your frames, correct the numbers.
          </p>
          <div className="mt-2 grid grid-cols-2 gap-2.5 sm:grid-cols-4">
            {FIELDS.map(({ field, label }) => (
              <TextField
                key={field}
                label={label}
                type="number"
                min={0}
                inputMode="numeric"
                value={Number.isNaN(shown[field]) ? '' : shown[field]}
                onChange={(event) => handleField(field, event.target.value)}
                fieldClassName="font-mono"
              />
            ))}
          </div>
          {(wrong ?? problem) && <ErrorNote className="mt-2">{wrong ?? problem}</ErrorNote>}
          <Button
            size="small"
            kind="quiet"
            className="mt-2"
            onClick={() => {
              setWritten(null);
              onGrid(null);
            }}
          >
            This is one frame, not a strip
          </Button>
        </>
      ) : (
        <p className="mt-2 flex flex-wrap items-center gap-3 text-sm text-graphite">
          One frame has no motion to read. Add the others, or cut this picture into frames.
          <Button
            size="small"
            onClick={() => {
              setWritten(null);
              onGrid(firstCut(picture));
            }}
          >
            Cut it into frames
          </Button>
        </p>
      )}
    </Card>
  );
}

/** Above this many cells their numbers would only hide the picture. */
const MOST_NUMBERS = 120;

function GridDrawing({ grid, picture }: { grid: Grid; picture: DraftPicture }) {
  const cells = cellsOf(grid);
  const unit = picture.width / 700;
  return (
    <svg
      viewBox={`0 0 ${picture.width} ${picture.height}`}
      preserveAspectRatio="xMidYMid meet"
      className="absolute inset-0 size-full"
      role="img"
      aria-label={`Cut into ${grid.columns} columns and ${grid.rows} rows, ${grid.count} frames`}
    >
      {cells.map((cell) => (
        <g key={cell.index}>
          <rect
            x={cell.x}
            y={cell.y}
            width={grid.cellWidth}
            height={grid.cellHeight}
            fill={cell.used ? 'none' : 'var(--color-surround)'}
            fillOpacity={cell.used ? undefined : 0.7}
            className="stroke-pencil-ink"
            strokeWidth="1.5"
            vectorEffect="non-scaling-stroke"
          />
          <rect
            x={cell.x}
            y={cell.y}
            width={grid.cellWidth}
            height={grid.cellHeight}
            fill="none"
            className="stroke-pencil-paper"
            strokeWidth="1.5"
            strokeDasharray="4 4"
            vectorEffect="non-scaling-stroke"
          />
          {cell.used && cells.length <= MOST_NUMBERS && (
            <text
              x={cell.x + 5 * unit}
              y={cell.y + 14 * unit}
              fontSize={11 * unit}
              className="fill-pencil-ink stroke-pencil-paper font-mono font-semibold [paint-order:stroke]"
              strokeWidth={3 * unit}
            >
              {cell.index + 1}
            </text>
          )}
        </g>
      ))}
    </svg>
  );
}
