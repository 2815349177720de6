import { parseArgs } from 'node:util';
import type { PointAt } from '../../../shared/finding/types.ts';
import type { FrameRate, Hold } from '../../../shared/reading/document.ts';
import { InputError } from './InputError.ts';

export interface ReadOptions {
  input: string;
  firstFrame?: number;
  fps?: FrameRate;
  hold?: Hold;
  grid?: { columns: number; rows: number };
  pxPerMetre?: number;
  gravity?: number;
  object?: PointAt;
  json: boolean;
  out?: string;
  overlay?: string;
}

export const USAGE = `npm run --silent read -- INPUT [options]
INPUT  a folder of frames, a strip picture, an animated GIF, WebP or APNG, a video, a .csv of marks, or - for JSON lines
  --first-frame N    what the production calls the first picture
  --fps N            frames a second, also as a fraction: 24000/1001
  --hold N           frames a drawing: 1, 2, 3 or mixed
  --grid CxR         columns and rows of a strip picture
  --px-per-metre N   scale of the picture
  --gravity N        the production's gravity, m/s²
  --object X,Y@F     where the thing is on frame F, px
  --json             print the reading as a document
  --out FILE         write it to a file
  --overlay DIR      write the frames with marks, true arc and findings drawn on`;

/**
 * Reads the command's arguments.
 * @throws InputError for an option that is not there or a value that does not fit
 */
export function parseReadOptions(argv: string[]): ReadOptions {
  const { values, positionals } = parse(argv);
  if (positionals.length !== 1) throw new InputError(`Give one input.\n${USAGE}`);
  return {
    input: positionals[0],
    firstFrame: values['first-frame'] === undefined ? undefined : wholeNumber('--first-frame', values['first-frame']),
    fps: values.fps === undefined ? undefined : parseFrameRate(values.fps),
    hold: values.hold === undefined ? undefined : parseHold(values.hold),
    grid: values.grid === undefined ? undefined : parseGrid(values.grid),
    pxPerMetre: values['px-per-metre'] === undefined ? undefined : positive('--px-per-metre', values['px-per-metre']),
    gravity: values.gravity === undefined ? undefined : positive('--gravity', values.gravity),
    object: values.object === undefined ? undefined : parseObject(values.object),
    json: values.json ?? false,
    out: values.out,
    overlay: values.overlay,
  };
}

function parse(argv: string[]) {
  try {
    return parseArgs({
      args: argv,
      allowPositionals: true,
      options: {
        'first-frame': { type: 'string' },
        fps: { type: 'string' },
        hold: { type: 'string' },
        grid: { type: 'string' },
        'px-per-metre': { type: 'string' },
        gravity: { type: 'string' },
        object: { type: 'string' },
        json: { type: 'boolean' },
        out: { type: 'string' },
        overlay: { type: 'string' },
      },
    });
  } catch (cause) {
    throw new InputError(`${cause instanceof Error ? cause.message : String(cause)}\n${USAGE}`);
  }
}

/** An exact frame rate: `24`, `24000/1001`, or a decimal such as `23.976`, which means its 1001 fraction. */
export function parseFrameRate(text: string): FrameRate {
  const fraction = /^(\d+)(?:\/(\d+))?$/.exec(text);
  if (fraction) {
    const [num, den] = [Number(fraction[1]), Number(fraction[2] ?? 1)];
    if (num > 0 && den > 0 && num / den <= 1000) return { num, den };
  }
  const decimal = Number(text);
  if (/^\d+\.\d+$/.test(text) && decimal > 0 && decimal <= 1000) {
    const whole = Math.ceil(decimal);
    if (Math.abs((whole * 1000) / 1001 - decimal) < 0.005) return { num: whole * 1000, den: 1001 };
    return { num: Math.round(decimal * 1000), den: 1000 };
  }
  throw new InputError(`--fps ${text} is no frame rate; give 24, 25 or a fraction such as 24000/1001.`);
}

function parseHold(text: string): Hold {
  if (text === 'mixed') return 'mixed';
  if (text === '1' || text === '2' || text === '3') return Number(text) as Hold;
  throw new InputError(`--hold ${text} is not known; give 1, 2, 3 or mixed.`);
}

function parseGrid(text: string): { columns: number; rows: number } {
  const match = /^(\d{1,3})[x×](\d{1,3})$/i.exec(text);
  const grid = match && { columns: Number(match[1]), rows: Number(match[2]) };
  if (grid && grid.columns > 0 && grid.rows > 0) return grid;
  throw new InputError(`--grid ${text} is no grid; give columns and rows, such as 6x4.`);
}

function parseObject(text: string): PointAt {
  const match = /^(-?\d+(?:\.\d+)?),(-?\d+(?:\.\d+)?)@(-?\d+)$/.exec(text);
  if (match) return { x: Number(match[1]), y: Number(match[2]), frame: Number(match[3]) };
  throw new InputError(`--object ${text} is no place; give x,y@frame, such as 120,340@1005.`);
}

function wholeNumber(name: string, text: string): number {
  const value = Number(text);
  if (/^-?\d+$/.test(text) && Number.isSafeInteger(value)) return value;
  throw new InputError(`${name} ${text} is no whole number.`);
}

function positive(name: string, text: string): number {
  const value = Number(text);
  if (text.trim() !== '' && Number.isFinite(value) && value > 0) return value;
  throw new InputError(`${name} ${text} is no number above zero.`);
}
