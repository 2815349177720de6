import { open } from 'node:fs/promises';
import sharp, { type Metadata } from 'sharp';
import { MAX_EDGE, MAX_PIXELS, MIN_EDGE } from './pictureLimits.ts';
import { PictureError } from './PictureError.ts';

export type PictureFormat = 'png' | 'jpeg' | 'webp';

export interface PictureFacts {
  width: number;
  height: number;
  format: PictureFormat;
}

const FORMATS: ReadonlySet<string> = new Set<PictureFormat>(['png', 'jpeg', 'webp']);
const HEAD_BYTES = 64 * 1024;

/**
 * Reads a picture whole and says its size in px (after the orientation its camera wrote into it) and format.
 * @param path where the bytes are
 * @param originalName the name the person knows the file by; messages use it
 * @throws PictureError when the file is empty, is no PNG, JPEG or WebP, is animated, too large, too small or damaged
 */
export async function inspectPicture(path: string, originalName: string): Promise<PictureFacts> {
  const head = await readHead(path, originalName);
  if (head.length === 0) {
    throw new PictureError(originalName, 'empty_file', `“${originalName}” is empty: 0 bytes arrived.`);
  }
  const metadata = await readMetadata(path, originalName, head);
  if (!FORMATS.has(metadata.format)) {
    const found = metadata.format.toUpperCase();
    throw new PictureError(
      originalName,
      'unsupported_format',
      `“${originalName}” is a ${found} picture; post PNG, JPEG or WebP.`,
    );
  }
  if ((metadata.pages ?? 1) > 1 || isAnimatedPng(head)) {
    throw new PictureError(
      originalName,
      'animated_picture',
      `“${originalName}” is an animation; one frame a file is wanted here.`,
    );
  }
  const { width, height } = metadata.autoOrient;
  refuseBadSize(originalName, width, height);
  await readToTheEnd(path, originalName, metadata.width, metadata.height);
  return { width, height, format: metadata.format as PictureFormat };
}

async function readHead(path: string, originalName: string): Promise<Buffer> {
  try {
    const file = await open(path, 'r');
    try {
      const { buffer, bytesRead } = await file.read(Buffer.alloc(HEAD_BYTES), 0, HEAD_BYTES, 0);
      return buffer.subarray(0, bytesRead);
    } finally {
      await file.close();
    }
  } catch {
    throw new PictureError(originalName, 'unreadable_file', `“${originalName}” could not be opened.`);
  }
}

async function readMetadata(path: string, originalName: string, head: Buffer): Promise<Metadata> {
  try {
    // The limit is checked here and not by sharp, so that the sentence can give the size.
    return await sharp(path, { limitInputPixels: false }).metadata();
  } catch {
    if (hasKnownSignature(head)) {
      throw new PictureError(
        originalName,
        'damaged_picture',
        `“${originalName}” is damaged and cannot be read; export it again.`,
      );
    }
    const what = looksLikeText(head) ? 'is a text file, not a picture' : 'is not a picture';
    throw new PictureError(originalName, 'not_a_picture', `“${originalName}” ${what}; post PNG, JPEG or WebP.`);
  }
}

function refuseBadSize(name: string, width: number, height: number): void {
  const size = `${format(width)} × ${format(height)} px`;
  if (width * height > MAX_PIXELS || Math.max(width, height) > MAX_EDGE) {
    throw new PictureError(
      name,
      'picture_too_large',
      `“${name}” is ${size}; the most is ${format(MAX_PIXELS / 1e6)} million pixels and ${format(MAX_EDGE)} px a side.`,
    );
  }
  if (Math.min(width, height) < MIN_EDGE) {
    throw new PictureError(
      name,
      'picture_too_small',
      `“${name}” is ${size}; a frame needs at least ${MIN_EDGE} px a side.`,
    );
  }
}

/** Asking for the last row makes the decoder go through the whole picture without keeping it. */
async function readToTheEnd(path: string, originalName: string, width: number, height: number): Promise<void> {
  try {
    await sharp(path, { limitInputPixels: MAX_PIXELS, failOn: 'error', sequentialRead: true })
      .extract({ left: 0, top: height - 1, width, height: 1 })
      .raw()
      .toBuffer();
  } catch {
    throw new PictureError(
      originalName,
      'damaged_picture',
      `“${originalName}” is cut off or damaged; export it again and post it once more.`,
    );
  }
}

function hasKnownSignature(head: Buffer): boolean {
  const png = head.subarray(0, 4).equals(Buffer.from([0x89, 0x50, 0x4e, 0x47]));
  const jpeg = head[0] === 0xff && head[1] === 0xd8;
  const webp = head.subarray(0, 4).toString('latin1') === 'RIFF' && head.subarray(8, 12).toString('latin1') === 'WEBP';
  return png || jpeg || webp;
}

function looksLikeText(head: Buffer): boolean {
  return head.every((byte) => byte >= 0x20 || byte === 0x09 || byte === 0x0a || byte === 0x0d);
}

/** APNG announces itself with an `acTL` chunk before the picture data (PNG, third edition, 11.3.4.2). */
function isAnimatedPng(head: Buffer): boolean {
  const animation = head.indexOf('acTL', 8, 'latin1');
  const picture = head.indexOf('IDAT', 8, 'latin1');
  return animation > 0 && (picture < 0 || animation < picture);
}

function format(value: number): string {
  return value.toLocaleString('en-GB');
}
