import { mkdtemp, readFile, rm, truncate, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { inspectPicture } from '../../../server/analysis/inspect.ts';
import { makeThumbnail } from '../../../server/analysis/thumbnail.ts';
import { blankPng, pngChunk } from '../../support/pngBytes.ts';
import { paintTake } from '../../support/paintTake.ts';

let folder: string;
const at = (name: string): string => join(folder, name);
const [frame] = paintTake({ frames: 1, grain: 20 }).pictures;
const drawn = () => sharp(frame.data, { raw: { width: frame.width, height: frame.height, channels: 3 } });

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'spandrel-inspect-'));
});
afterAll(() => rm(folder, { recursive: true, force: true }));

describe('a picture that can be used', () => {
  it.each(['png', 'jpeg', 'webp'] as const)('is told by its bytes as %s, whatever it is called', async (format) => {
    const path = at(`whole-${format}.bin`);
    await drawn().toFormat(format).toFile(path);
    await expect(inspectPicture(path, 'f_0001.tif')).resolves.toEqual({ width: 320, height: 200, format });
  });

  it('is measured upright when its camera was held on its side', async () => {
    await drawn().withMetadata({ orientation: 6 }).jpeg().toFile(at('turned.jpg'));
    await expect(inspectPicture(at('turned.jpg'), 'turned.jpg')).resolves.toMatchObject({ width: 200, height: 320 });
  });

  it('gets a WebP thumbnail 240 px wide', async () => {
    await drawn().png().toFile(at('frame.png'));
    await makeThumbnail(at('frame.png'), at('thumb.webp'), { width: 240 });
    await expect(sharp(at('thumb.webp')).metadata()).resolves.toMatchObject({
      format: 'webp',
      width: 240,
      height: 150,
    });
  });
});

describe('a file that cannot be used is refused with its name and the reason', () => {
  it('a text file named .png', async () => {
    await writeFile(at('notes.png'), 'Apex sits late on frame 12.\n');
    await expect(inspectPicture(at('notes.png'), 'notes.png')).rejects.toMatchObject({
      code: 'not_a_picture',
      file: 'notes.png',
      message: '“notes.png” is a text file, not a picture; post PNG, JPEG or WebP.',
    });
  });

  it('an empty file', async () => {
    await writeFile(at('empty.png'), '');
    await expect(inspectPicture(at('empty.png'), 'f_0007.png')).rejects.toMatchObject({
      code: 'empty_file',
      message: '“f_0007.png” is empty: 0 bytes arrived.',
    });
  });

  it.each(['jpeg', 'png', 'webp'] as const)('a %s cut off anywhere past its head', async (format) => {
    const path = at(`cut.${format}`);
    for (const share of [0.98, 0.5, 0.1]) {
      await drawn().toFormat(format).toFile(path);
      await truncate(path, Math.floor((await readFile(path)).length * share));
      await expect(inspectPicture(path, 'cut-off'), String(share)).rejects.toMatchObject({ code: 'damaged_picture' });
    }
  });

  it('a picture of 20,000 × 20,000 px', async () => {
    await writeFile(at('huge.png'), blankPng(20_000, 20_000));
    await expect(inspectPicture(at('huge.png'), 'huge.png')).rejects.toMatchObject({
      code: 'picture_too_large',
      message: expect.stringContaining('“huge.png” is 20,000 × 20,000 px'),
    });
  });

  it('a picture with a side of 60,000 px', async () => {
    await sharp({ create: { width: 60_000, height: 9, channels: 3, background: '#fff' } })
      .png()
      .toFile(at('long.png'));
    await expect(inspectPicture(at('long.png'), 'long.png')).rejects.toMatchObject({ code: 'picture_too_large' });
  });

  it('a picture of a kind that browsers show differently', async () => {
    await drawn().tiff().toFile(at('scan.png'));
    await expect(inspectPicture(at('scan.png'), 'scan.png')).rejects.toMatchObject({
      code: 'unsupported_format',
      message: '“scan.png” is a TIFF picture; post PNG, JPEG or WebP.',
    });
  });

  it('an animation where one frame is wanted', async () => {
    const { pictures } = paintTake({ frames: 3 });
    const stack = Buffer.concat(pictures.map((picture) => picture.data));
    const raw = { width: 320, height: 600, channels: 3 as const, pageHeight: 200 };
    await sharp(stack, { raw }).webp({ delay: 40 }).toFile(at('loop.webp'));
    await expect(inspectPicture(at('loop.webp'), 'loop.webp')).rejects.toMatchObject({ code: 'animated_picture' });
    await writeFile(at('loop.png'), withAnimationChunk(await drawn().png().toBuffer()));
    await expect(inspectPicture(at('loop.png'), 'loop.png')).rejects.toMatchObject({ code: 'animated_picture' });
  });

  it('a file that is not there', async () => {
    await expect(inspectPicture(at('gone.png'), 'gone.png')).rejects.toMatchObject({ code: 'unreadable_file' });
  });
});

/** Puts an `acTL` chunk (PNG, third edition, 11.3.4.2: number of frames, number of plays) after a still's header. */
function withAnimationChunk(png: Buffer): Buffer {
  return Buffer.concat([
    png.subarray(0, 33),
    pngChunk('acTL', Buffer.from([0, 0, 0, 2, 0, 0, 0, 0])),
    png.subarray(33),
  ]);
}
