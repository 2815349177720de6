import { mkdir, writeFile } from 'node:fs/promises';
import path from 'node:path';
import sharp from 'sharp';
import type { Strip } from '../../server/services/posting.service.ts';

export interface TossDrawing {
  frames: number;
  width?: number;
  height?: number;
  format?: 'png' | 'jpeg' | 'webp';
  firstFrame?: number;
  /** Nothing moves. */
  still?: boolean;
  /** Even spacing up to a corner and down again, where a fall bends. */
  straight?: boolean;
  /** Balls in flight, side by side. */
  balls?: 1 | 2;
}

/** One frame of a ball on its way through a level room: y grows downwards, px/frame² for gravity. */
export async function drawTossFrame(frame: number, drawing: TossDrawing): Promise<Buffer> {
  const { frames, width = 320, height = 180, format = 'png', still = false, straight = false, balls = 1 } = drawing;
  const middle = (frames + 1) / 2;
  const at = still ? middle : frame;
  const half = Math.max(1, (frames - 1) / 2);
  const rise = height * 0.6;
  const marks = Array.from({ length: balls }, (_, index) => {
    const share = (at - 1) / Math.max(1, frames - 1);
    const x = index === 0 ? width * (0.1 + 0.8 * share) : width * (0.9 - 0.35 * share);
    const away = Math.abs(at - middle) / half;
    const lift = (1 - (straight ? away : away ** 2)) * rise * (index === 0 ? 1 : 0.7);
    return `<circle cx="${x.toFixed(3)}" cy="${(height * 0.85 - lift).toFixed(3)}" r="${height / 18}" fill="#d9682b"/>`;
  });
  const svg = `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height}">
    <rect width="100%" height="100%" fill="#e9e4d8"/>
    <rect y="${height * 0.92}" width="100%" height="10%" fill="#8f8a7c"/>${marks.join('')}</svg>`;
  return sharp(Buffer.from(svg)).flatten({ background: '#fff' }).toFormat(format).toBuffer();
}

/** Writes a toss as numbered files and answers with them as the posting service takes them. */
export async function drawToss(folder: string, drawing: TossDrawing): Promise<Strip> {
  const { frames, width = 320, height = 180, format = 'png', firstFrame = 1001 } = drawing;
  await mkdir(folder, { recursive: true });
  const files: Strip['frames'] = [];
  for (let frame = 1; frame <= frames; frame += 1) {
    const name = `toss.${firstFrame + frame - 1}.${format}`;
    const file = path.join(folder, name);
    await writeFile(file, await drawTossFrame(frame, drawing));
    files.push({ path: file, format, name });
  }
  return { kind: 'frames', frames: files, width, height };
}

/** A picture of grain, which no format makes small. */
export function drawGrain(width: number, height: number): Promise<Buffer> {
  const noise = { type: 'gaussian' as const, mean: 128, sigma: 40 };
  return sharp({ create: { width, height, channels: 3, background: '#000', noise } })
    .png()
    .toBuffer();
}
