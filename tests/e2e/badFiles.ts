import { copyFile, mkdir, readFile, truncate, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { crc32, deflateSync } from 'node:zlib';
import sharp from 'sharp';
import { drawTossFrame } from '../support/pictures.ts';

/** Writes frames that are fine: small, numbered from 1001. */
export async function goodFrames(folder: string, count: number, firstFrame = 1001): Promise<string[]> {
  await mkdir(folder, { recursive: true });
  const files: string[] = [];
  for (let frame = 1; frame <= count; frame += 1) {
    const file = path.join(folder, `toss.${firstFrame + frame - 1}.png`);
    await writeFile(file, await drawTossFrame(frame, { frames: count }));
    files.push(file);
  }
  return files;
}

/** One file of each kind that cannot be used, under numbers that would continue `goodFrames`. */
export async function brokenFiles(folder: string) {
  await mkdir(folder, { recursive: true });
  const at = (name: string) => path.join(folder, name);
  await writeFile(at('toss.1101.png'), 'Shot list: the egg goes over the shoulder.\n');
  await writeFile(at('toss.1102.png'), '');
  const jpeg = await drawTossFrame(3, { frames: 8, format: 'jpeg' });
  await writeFile(at('toss.1103.jpg'), jpeg);
  await truncate(at('toss.1103.jpg'), Math.floor(jpeg.length / 2));
  await writeFile(at('toss.1104.png'), hugePng(20_000, 20_000));
  await writeFile(at('toss.1105.png'), await drawTossFrame(3, { frames: 8, width: 300, height: 200 }));
  return {
    text: at('toss.1101.png'),
    empty: at('toss.1102.png'),
    cutOff: at('toss.1103.jpg'),
    huge: at('toss.1104.png'),
    otherSize: at('toss.1105.png'),
  };
}

/** The same tiny picture many times over, under one number each. */
export async function manyFrames(folder: string, count: number): Promise<string[]> {
  await mkdir(folder, { recursive: true });
  const source = path.join(folder, 'tiny.png');
  await writeFile(source, await drawTossFrame(1, { frames: 8, width: 64, height: 36 }));
  const files = Array.from({ length: count }, (_, index) => path.join(folder, `many.${10_001 + index}.png`));
  for (const file of files) await copyFile(source, file);
  return files;
}

/** A row or a grid of frames in one picture, with gutters. */
export async function stripPicture(file: string, frames: string[], columns: number, gutter: number): Promise<string> {
  const { width, height } = await sharp(frames[0]).metadata();
  const rows = Math.ceil(frames.length / columns);
  const cells = await Promise.all(
    frames.map(async (frame, index) => ({
      input: await readFile(frame),
      left: (index % columns) * (width + gutter),
      top: Math.floor(index / columns) * (height + gutter),
    })),
  );
  await sharp({
    create: {
      width: columns * width + (columns - 1) * gutter,
      height: rows * height + (rows - 1) * gutter,
      channels: 3,
      background: '#1c1c1c',
    },
  })
    .composite(cells)
    .png()
    .toFile(file);
  return file;
}

/** A real picture of one bit a pixel, all black: small on disk, huge once it is decoded (PNG, third edition, 5 and 11). */
function hugePng(width: number, height: number): Buffer {
  const header = Buffer.alloc(13);
  header.writeUInt32BE(width, 0);
  header.writeUInt32BE(height, 4);
  header.set([1, 0, 0, 0, 0], 8);
  const rows = Buffer.alloc((Math.ceil(width / 8) + 1) * height);
  const signature = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);
  return Buffer.concat([
    signature,
    chunk('IHDR', header),
    chunk('IDAT', deflateSync(rows, { level: 1 })),
    chunk('IEND', Buffer.alloc(0)),
  ]);
}

function chunk(name: string, data: Buffer): Buffer {
  const body = Buffer.concat([Buffer.from(name, 'latin1'), data]);
  const length = Buffer.alloc(4);
  length.writeUInt32BE(data.length);
  const check = Buffer.alloc(4);
  check.writeUInt32BE(crc32(body));
  return Buffer.concat([length, body, check]);
}
