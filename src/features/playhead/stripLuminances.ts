import { thumbnailUrl } from '../../../shared/api/takes.ts';
import { meanLuminance } from './flicker.ts';

const WIDTH = 32;
const HEIGHT = 18;
const AT_ONCE = 8;

async function luminanceOf(address: string): Promise<number> {
  const image = new Image();
  image.src = address;
  await image.decode();
  const canvas = document.createElement('canvas');
  canvas.width = WIDTH;
  canvas.height = HEIGHT;
  const context = canvas.getContext('2d', { willReadFrequently: true });
  if (!context) throw new Error('This browser cannot read a picture.');
  context.drawImage(image, 0, 0, WIDTH, HEIGHT);
  return meanLuminance(context.getImageData(0, 0, WIDTH, HEIGHT).data);
}

/**
 * Mean relative luminance of every frame of a take, 0 to 1, from its thumbnails.
 * @throws when a thumbnail cannot be read: the caller then cannot know whether the strip flickers
 */
export async function stripLuminances(takeId: string, frames: number): Promise<number[]> {
  const luminances: number[] = [];
  for (let start = 1; start <= frames; start += AT_ONCE) {
    const batch = Array.from({ length: Math.min(AT_ONCE, frames - start + 1) }, (_, index) =>
      luminanceOf(thumbnailUrl(takeId, start + index)),
    );
    luminances.push(...(await Promise.all(batch)));
  }
  return luminances;
}
