import { readFile, stat } from 'node:fs/promises';
import { MarksCsvError, parseMarksCsv } from '../../../shared/finding/marksCsv.ts';
import { readMotion } from '../../../shared/motion/read.ts';
import type { Reading } from '../../../shared/reading/document.ts';
import { InputError } from './InputError.ts';
import type { ReadOptions } from './options.ts';

const MOST_BYTES = 8 * 1024 * 1024;
/** Frame numbers from here on are taken as the production's own even when nothing says so. */
const OWN_NUMBERS_FROM = 100;

/**
 * Reads the motion of a CSV of marks, whose rows carry the production's frame numbers.
 * @throws InputError when the file cannot be used
 */
export async function readMarksCsv(options: ReadOptions): Promise<Reading> {
  const facts = await stat(options.input).catch(() => null);
  if (!facts?.isFile()) throw new InputError(`“${options.input}” is not there; check the path.`);
  if (facts.size > MOST_BYTES) {
    throw new InputError(`“${options.input}” is larger than 8 MB; give the marks of one shot.`);
  }
  try {
    const imported = parseMarksCsv(await readFile(options.input, 'utf8'));
    const numbers = imported.flatMap((track) => track.marks.map((mark) => mark.frame));
    const lowest = Math.min(...numbers);
    const firstFrame = options.firstFrame ?? (lowest < OWN_NUMBERS_FROM ? Math.min(1, lowest) : lowest);
    if (lowest < firstFrame) {
      throw new InputError(`Frame ${lowest} lies before --first-frame ${firstFrame}; give a first frame that fits.`);
    }
    return readMotion({
      id: options.input,
      kind: 'marks',
      frames: Math.max(...numbers) - firstFrame + 1,
      width: 0,
      height: 0,
      firstFrame,
      fps: options.fps ?? { num: 24, den: 1 },
      hold: options.hold,
      scale: options.pxPerMetre === undefined ? null : { pxPerMetre: options.pxPerMetre },
      gravity: options.gravity,
      tracks: imported.map(({ object, marks }) => ({
        id: object,
        marks: marks.map((mark) => ({ ...mark, frame: mark.frame - firstFrame + 1 })),
      })),
    });
  } catch (cause) {
    if (cause instanceof MarksCsvError) throw new InputError(`“${options.input}”: ${cause.message}`);
    throw cause;
  }
}
