import { writeFile } from 'node:fs/promises';
import { basename } from 'node:path';
import type { Reading } from '../../shared/reading/document.ts';
import { analyseFrames } from '../analysis/analyseFrames.ts';
import { PictureError } from '../analysis/PictureError.ts';
import { InputError } from './read/InputError.ts';
import { readJsonLines } from './read/jsonLines.ts';
import { readMarksCsv } from './read/marksInput.ts';
import { parseReadOptions, type ReadOptions } from './read/options.ts';
import { writeOverlays } from './read/overlay.ts';
import { withPictureInput } from './read/pictureInput.ts';
import { plainWords } from './read/plainWords.ts';

/** Reads a take without a server or a database. Exit 0 read, 2 the input cannot be used, 1 a fault of the program. */
async function main(argv: string[]): Promise<void> {
  const options = parseReadOptions(argv);
  if (options.input === '-') {
    const texts: string[] = [];
    for await (const reading of readJsonLines(process.stdin, options)) {
      const text = options.json ? `${JSON.stringify(reading)}\n` : `${plainWords(reading, reading.id ?? 'Track')}\n`;
      if (options.out === undefined) await print(text);
      else texts.push(text);
    }
    if (options.out !== undefined) await writeFile(options.out, texts.join(''));
    return;
  }
  const reading = options.input.toLowerCase().endsWith('.csv') ? await readMarks(options) : await readPictures(options);
  const text = options.json ? `${JSON.stringify(reading, null, 2)}\n` : plainWords(reading, basename(options.input));
  if (options.out === undefined) await print(text);
  else await writeFile(options.out, text);
}

async function readMarks(options: ReadOptions): Promise<Reading> {
  if (options.overlay !== undefined) {
    throw new InputError('--overlay draws on frames, and a CSV has none; give a folder of frames.');
  }
  return readMarksCsv(options);
}

function readPictures(options: ReadOptions): Promise<Reading> {
  return withPictureInput(options, async ({ framePaths, kind, firstFrame, fps, cautions }) => {
    const start = options.firstFrame ?? firstFrame ?? 1;
    const { reading } = await analyseFrames(
      {
        id: basename(options.input),
        framePaths,
        kind,
        firstFrame: start,
        fps: options.fps ?? fps ?? { num: 24, den: 1 },
        hold: options.hold,
        scale: options.pxPerMetre === undefined ? null : { pxPerMetre: options.pxPerMetre },
        gravity: options.gravity,
        object: options.object && { ...options.object, frame: options.object.frame - start + 1 },
      },
      () => undefined,
    );
    if (options.overlay !== undefined) await writeOverlays(reading, framePaths, options.overlay);
    return { ...reading, cautions: [...cautions, ...reading.cautions] };
  });
}

/** Waits until a slow reader has taken the text, so that nothing is lost when the process ends. */
function print(text: string): Promise<void> {
  return new Promise((resolve, reject) => {
    process.stdout.write(text, (error) => (error ? reject(error) : resolve()));
  });
}

try {
  await main(process.argv.slice(2));
} catch (cause) {
  if (cause instanceof InputError || cause instanceof PictureError) {
    process.stderr.write(`${cause.message}\n`);
    process.exitCode = 2;
  } else if (cause instanceof Error && 'code' in cause && cause.code === 'EPIPE') {
    process.exitCode = 0;
  } else {
    process.stderr.write(`The program failed: ${cause instanceof Error ? cause.stack : String(cause)}\n`);
    process.exitCode = 1;
  }
}
