import { createInterface } from 'node:readline';
import { z } from 'zod';
import { readMotion } from '../../../shared/motion/read.ts';
import { frameRateSchema, holdSchema, type Reading } from '../../../shared/reading/document.ts';
import { InputError } from './InputError.ts';
import { parseFrameRate, type ReadOptions } from './options.ts';

const markSchema = z.object({
  frame: z.int(),
  x: z.number(),
  y: z.number(),
  radius: z.number().nonnegative().optional(),
});

const lineSchema = z.object({
  id: z.union([z.string(), z.number()]).optional(),
  fps: z.union([z.number().positive(), z.string(), frameRateSchema]).optional(),
  hold: holdSchema.nullish(),
  width: z.number().nonnegative().optional(),
  height: z.number().nonnegative().optional(),
  marks: z.array(markSchema).max(100_000),
});

/**
 * Reads tracks from JSON lines and hands out one reading a line, in the order of the lines.
 * @throws InputError naming the first line that is no track
 */
export async function* readJsonLines(
  input: NodeJS.ReadableStream,
  options: ReadOptions,
): AsyncGenerator<Reading, void, undefined> {
  let number = 0;
  for await (const text of createInterface({ input, crlfDelay: Number.POSITIVE_INFINITY })) {
    number++;
    if (text.trim() !== '') yield readLine(text, number, options);
  }
  if (number === 0) throw new InputError('Nothing came on standard input; give one track a line.');
}

function readLine(text: string, number: number, options: ReadOptions): Reading {
  const parsed = lineSchema.safeParse(fromJson(text, number));
  if (!parsed.success) {
    const [issue] = parsed.error.issues;
    const where = issue.path.length === 0 ? 'the line' : issue.path.join('.');
    throw new InputError(`Line ${number} is no track: ${where}: ${issue.message}.`);
  }
  const { id, fps, hold, width = 0, height = 0, marks } = parsed.data;
  const frames = marks.length === 0 ? 0 : Math.max(...marks.map((mark) => mark.frame));
  return readMotion({
    id: id === undefined ? undefined : String(id),
    kind: 'marks',
    frames: Math.max(0, frames),
    width,
    height,
    firstFrame: options.firstFrame ?? 1,
    fps: options.fps ?? frameRateOf(fps),
    hold: options.hold ?? hold ?? undefined,
    scale: options.pxPerMetre === undefined ? null : { pxPerMetre: options.pxPerMetre },
    gravity: options.gravity,
    tracks: [{ id: 'A', marks: marks.map((mark) => ({ ...mark, origin: 'import' })) }],
  });
}

function frameRateOf(fps: z.infer<typeof lineSchema>['fps']) {
  if (fps === undefined) return { num: 24, den: 1 };
  return typeof fps === 'object' ? fps : parseFrameRate(String(fps));
}

function fromJson(text: string, number: number): unknown {
  try {
    return JSON.parse(text);
  } catch {
    throw new InputError(
      `Line ${number} is not JSON; give one track a line, such as {"marks": [{"frame", "x", "y"}]}.`,
    );
  }
}
