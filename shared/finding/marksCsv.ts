import type { Mark } from '../reading/document.ts';

/** Marks of one thing as a file gives them; `frame` is the production's number. */
export interface ImportedTrack {
  object: string;
  marks: Mark[];
}

/** A CSV of marks that cannot be used: the message is one sentence that names the line and what to do. */
export class MarksCsvError extends Error {
  override readonly name = 'MarksCsvError';
}

const COLUMNS = ['frame', 'x', 'y', 'radius', 'object'] as const;
type Column = (typeof COLUMNS)[number];
const HOW = 'give frame,x,y and where you have them radius and object';
/** Most rows of one file: a thousand things over a hundred frames. */
const MOST_ROWS = 100_000;

/**
 * Reads a CSV of marks: `frame,x,y[,radius][,object]`, one row a mark, with or without a header, separated by commas or
 * semicolons. Rows without x and y are frames on which the thing is hidden.
 * @returns one track a thing, in the order in which things appear, frames ascending
 * @throws MarksCsvError for wrong columns, numbers that are none, two marks of one thing on one frame, or too many rows
 */
export function parseMarksCsv(text: string): ImportedTrack[] {
  const lines = text.replace(/^\uFEFF/, '').split(/\r\n|\n|\r/);
  if (lines.length > MOST_ROWS + 2) {
    throw new MarksCsvError(
      `The file has ${lines.length.toLocaleString('en-GB')} rows; the most is ${MOST_ROWS.toLocaleString('en-GB')}.`,
    );
  }
  const rows = lines
    .map((line, index) => ({ number: index + 1, line: line.trim() }))
    .filter(({ line }) => line !== '' && !line.startsWith('#'));
  if (rows.length === 0) throw new MarksCsvError(`The file has no rows; ${HOW}.`);
  const separator = rows[0].line.includes(';') ? ';' : ',';
  const cellsOf = (line: string): string[] =>
    line.split(separator).map((cell) => cell.trim().replace(/^"(.*)"$/, '$1'));
  const head = cellsOf(rows[0].line);
  const hasHeader =
    head.some((cell) => /[a-z]/i.test(cell) && !/^nan$/i.test(cell)) && !Number.isFinite(Number(head[0]));
  const columns = hasHeader ? columnsOf(head) : positional(head.length);
  const tracks = new Map<string, Map<number, Mark>>();
  for (const { number, line } of hasHeader ? rows.slice(1) : rows) {
    const cells = cellsOf(line);
    const mark = markOf(cells, columns, number);
    if (!mark) continue;
    const object = (columns.object === undefined ? '' : cells[columns.object]) || 'A';
    const marks = tracks.get(object) ?? new Map<number, Mark>();
    tracks.set(object, marks);
    if (marks.has(mark.frame)) {
      throw new MarksCsvError(`Line ${number} gives frame ${mark.frame} a second mark; keep one row a frame.`);
    }
    marks.set(mark.frame, mark);
  }
  if (tracks.size === 0) throw new MarksCsvError(`No row has a mark; ${HOW}.`);
  return [...tracks].map(([object, marks]) => ({
    object,
    marks: [...marks.values()].toSorted((a, b) => a.frame - b.frame),
  }));
}

type Columns = Record<'frame' | 'x' | 'y', number> & Partial<Record<Column, number>>;

function columnsOf(head: string[]): Columns {
  const names = head.map((cell) => cell.toLowerCase());
  const found: Partial<Record<Column, number>> = {};
  for (const column of COLUMNS) {
    const at = names.indexOf(column);
    if (at >= 0) found[column] = at;
  }
  const { frame, x, y } = found;
  if (frame === undefined || x === undefined || y === undefined) {
    throw new MarksCsvError(`The columns are “${head.join(', ')}”; ${HOW}.`);
  }
  return { ...found, frame, x, y };
}

function positional(count: number): Columns {
  if (count < 3 || count > 5) throw new MarksCsvError(`The first row has ${count} columns; ${HOW}.`);
  return { frame: 0, x: 1, y: 2, ...(count > 3 ? { radius: 3 } : {}), ...(count > 4 ? { object: 4 } : {}) };
}

function markOf(cells: string[], columns: Columns, line: number): Mark | null {
  const number = (column: 'frame' | 'x' | 'y' | 'radius', at: number): number => {
    const text = cells[at] ?? '';
    const value = Number(text);
    if (text === '' || !Number.isFinite(value)) {
      throw new MarksCsvError(
        `Line ${line} has “${text}” for ${column}, which is no number; correct it or leave the row out.`,
      );
    }
    return value;
  };
  const frame = number('frame', columns.frame);
  if (!Number.isSafeInteger(frame))
    throw new MarksCsvError(`Line ${line} has frame ${frame}; frames are whole numbers.`);
  if ((cells[columns.x] ?? '') === '' && (cells[columns.y] ?? '') === '') return null;
  const mark: Mark = { frame, x: number('x', columns.x), y: number('y', columns.y), origin: 'import' };
  if (columns.radius === undefined || (cells[columns.radius] ?? '') === '') return mark;
  const radius = number('radius', columns.radius);
  if (radius < 0) throw new MarksCsvError(`Line ${line} has a radius below zero; correct it or leave it out.`);
  return { ...mark, radius };
}
