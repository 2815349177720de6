import { useState } from 'react';
import type { DraftPicture } from '../../../shared/api/drafts.ts';
import type { Grid } from '../../../shared/finding/grid.ts';
import { Button } from '../../components/Button.tsx';
import { Card } from '../../components/Card.tsx';
import { ErrorNote } from '../../components/ErrorNote.tsx';
import { TextField } from '../../components/TextField.tsx';
import { CutFrames } from './CutFrames.tsx';
import { GridDrawing } from './GridDrawing.tsx';
import { firstCut, type GridField, gridProblem, withField } from './gridEdit.ts';
import { StripPicture } from './StripPicture.tsx';

const FIELDS: { field: GridField; label: string }[] = [
  { field: 'columns', label: 'Columns' },
  { field: 'rows', label: 'Rows' },
  { field: 'count', label: 'Frames' },
  { field: 'gutterX', label: 'Gutter across, px' },
  { field: 'gutterY', label: 'Gutter down, px' },
  { field: 'marginX', label: 'Side margin, px' },
  { field: 'marginY', label: 'Top margin, px' },
];

export interface GridEditorProps {
  picture: DraftPicture;
  address: string | undefined;
  /** As it is cut now; null: the picture is one frame. */
  grid: Grid | null;
  /** A correction that can be cut. */
  onGrid: (grid: Grid | null) => void;
  /** Whether what is written cannot be cut, so that nobody posts something else than is shown. */
  onWrong: (wrong: boolean) => void;
  onRemove: (name: string) => void;
  /** Why the last correction was not kept. */
  problem: string | null;
}

/** How a strip picture is cut into frames: the grid that was found, drawn over it and correctable. */
export function GridEditor({ picture, address, grid, onGrid, onWrong, onRemove, problem }: GridEditorProps) {
  // While a number is half written the drawing follows it, and only a grid that can be cut is sent.
  const [written, setWritten] = useState<Grid | null>(null);
  // A field is written digit by digit, and 1 on the way to 12 must not throw away what belongs to 12.
  const [writing, setWriting] = useState<{ field: GridField; from: Grid } | null>(null);
  const shown = written ?? grid;
  const wrong = shown && gridProblem(shown, picture);

  const set = (next: Grid | null) => {
    setWritten(next);
    const canBeCut = next === null || gridProblem(next, picture) === null;
    onWrong(!canBeCut);
    if (canBeCut) onGrid(next);
  };

  return (
    <Card className="px-4 py-3" aria-labelledby="strip-picture">
      <div className="mb-2 flex flex-wrap items-baseline gap-x-3">
        <h2 id="strip-picture" className="text-md">
          {shown ? `A strip of ${Number.isInteger(shown.count) ? shown.count : '…'} frames` : 'One picture'}
        </h2>
        <span className="min-w-0 text-sm text-graphite">
          <span className="font-mono text-xs break-all">{picture.name}</span>, {picture.width} × {picture.height} px
          {shown && !wrong && `, each frame ${shown.cellWidth} × ${shown.cellHeight} px`}
        </span>
        <Button size="small" kind="quiet" className="ml-auto" onClick={() => onRemove(picture.name)}>
          Take it out
        </Button>
      </div>
      <StripPicture picture={picture} address={address}>
        {shown && !wrong && <GridDrawing grid={shown} picture={picture} />}
      </StripPicture>
      {shown ? (
        <>
          <p className="mt-2 text-sm text-graphite">
            Frames are read row by row. Where the lines do not meet your frames, correct the numbers.
          </p>
          <div className="mt-2 grid grid-cols-2 gap-2.5 sm:grid-cols-4 xl:grid-cols-7">
            {FIELDS.map(({ field, label }) => (
              <TextField
                key={field}
                label={label}
                type="number"
                min={0}
                inputMode="numeric"
                value={Number.isNaN(shown[field]) ? '' : shown[field]}
                onFocus={() => setWriting({ field, from: shown })}
                onChange={(event) => {
                  const from = writing?.field === field ? writing.from : shown;
                  set(withField(from, field, event.target.valueAsNumber, picture));
                }}
                fieldClassName="font-mono"
              />
            ))}
          </div>
          {(wrong ?? problem) && <ErrorNote className="mt-2">{wrong ?? problem}</ErrorNote>}
          {!wrong && address && <CutFrames grid={shown} picture={picture} address={address} />}
          <Button size="small" kind="quiet" className="mt-2 -ml-2.5" onClick={() => set(null)}>
            This is one frame, not a strip
          </Button>
        </>
      ) : (
        <p className="mt-2 flex flex-wrap items-center gap-3 text-sm text-graphite">
          One frame has no motion to read. Add the others, or cut this picture into frames.
          <Button size="small" onClick={() => set(firstCut(picture))}>
            Cut it into frames
          </Button>
        </p>
      )}
    </Card>
  );
}
