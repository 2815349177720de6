import { mkdir } from 'node:fs/promises';
import path from 'node:path';
import sharp, { type OverlayOptions, type Sharp } from 'sharp';
import type { Point } from '../../../shared/reading/document.ts';
import type { Prop } from './props.ts';

export interface StripDrawing {
  /** SVG of everything that stands still, 960 × 540. */
  scene: string;
  prop: Prop;
  /** Where the middle of the thing's area is on each frame, px. */
  path: Point[];
  /** Degrees turned on each frame; left out: it does not turn. */
  turns?: number[];
  format: 'png' | 'jpeg' | 'webp';
  /** File names are `<prefix>.<first frame + index, four digits>.<ending>`. */
  prefix: string;
  firstFrame: number;
}

export const PICTURE_WIDTH = 960;
export const PICTURE_HEIGHT = 540;
const ENDINGS = { png: 'png', jpeg: 'jpg', webp: 'webp' } as const;

/**
 * Draws a strip: the scene once, the thing on every frame at its exact place. Answers the file paths in order.
 * The folder is made when it is missing.
 */
export async function drawStrip(drawing: StripDrawing, folder: string): Promise<string[]> {
  await mkdir(folder, { recursive: true });
  const backdrop = await sharp(svgOf(PICTURE_WIDTH, PICTURE_HEIGHT, drawing.scene))
    .removeAlpha()
    .raw()
    .toBuffer();
  const middle = await middleOf(drawing.prop);
  const files: string[] = [];
  // One after the other: a frame takes a few milliseconds, and the rest of the machine has work too.
  for (const [index, place] of drawing.path.entries()) {
    const number = String(drawing.firstFrame + index).padStart(4, '0');
    const file = path.join(folder, `${drawing.prefix}.${number}.${ENDINGS[drawing.format]}`);
    const picture = sharp(backdrop, { raw: { width: PICTURE_WIDTH, height: PICTURE_HEIGHT, channels: 3 } })
      .composite([sprite(drawing.prop, middle, place, drawing.turns?.[index] ?? 0)])
      .removeAlpha();
    await inFormat(picture, drawing.format).toFile(file);
    files.push(file);
  }
  return files;
}

function inFormat(picture: Sharp, format: StripDrawing['format']): Sharp {
  if (format === 'png') return picture.png({ compressionLevel: 4 });
  if (format === 'webp') return picture.webp({ quality: 92, effort: 0 });
  return picture.jpeg({ quality: 93, chromaSubsampling: '4:4:4' });
}

function svgOf(width: number, height: number, inside: string): Buffer {
  return Buffer.from(`<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height}">${inside}</svg>`);
}

/** The thing on a small see-through sheet, laid so that the middle of its area falls on `place` to a fraction of a pixel. */
function sprite(prop: Prop, middle: Point, place: Point, turn: number): OverlayOptions {
  const half = Math.ceil(prop.reach) + 4;
  const left = Math.floor(place.x) - half;
  const top = Math.floor(place.y) - half;
  const inside = `<g transform="translate(${place.x - left} ${place.y - top}) rotate(${turn}) translate(${-middle.x} ${-middle.y})">${prop.svg}</g>`;
  return { input: svgOf(half * 2 + 1, half * 2 + 1, inside), left, top };
}

/** The middle of the drawing's area from its own origin, px, measured at four times its size. */
async function middleOf(prop: Prop): Promise<Point> {
  const zoom = 4;
  const half = Math.ceil(prop.reach) + 4;
  const side = half * 2 * zoom;
  const alpha = await sharp(
    svgOf(side, side, `<g transform="scale(${zoom}) translate(${half} ${half})">${prop.svg}</g>`),
  )
    .extractChannel('alpha')
    .raw()
    .toBuffer();
  let area = 0;
  let sumX = 0;
  let sumY = 0;
  for (const [index, value] of alpha.entries()) {
    area += value;
    sumX += value * ((index % side) + 0.5);
    sumY += value * (Math.floor(index / side) + 0.5);
  }
  return { x: sumX / area / zoom - half, y: sumY / area / zoom - half };
}
