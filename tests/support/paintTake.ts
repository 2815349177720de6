import type { Picture } from '../../shared/finding/types.ts';

export interface Place {
  x: number;
  y: number;
}

export interface PaintOptions {
  width: number;
  height: number;
  frames: number;
  radius: number;
  /** Where the discs' centres are on a frame, px of the stage; null paints none. */
  discs: ((frame: number) => Place | null)[];
  /** Where the picture's corner lies on the stage. */
  camera: (frame: number) => Place;
  /** Standard deviation of the grain, grey levels. */
  grain: number;
  colour: [number, number, number];
}

/** A fall: thrown up from the left, gravity 2 px/frame². */
export function toss(frame: number): Place {
  return { x: 40 + 11 * frame, y: 170 - 18 * frame + frame * frame };
}

const DEFAULTS: PaintOptions = {
  width: 320,
  height: 200,
  frames: 18,
  radius: 9,
  discs: [toss],
  camera: () => ({ x: 0, y: 0 }),
  grain: 0,
  colour: [200, 60, 40],
};

/** Paints a take: antialiased discs in front of a textured stage. Also answers where the discs are on each picture. */
export function paintTake(options: Partial<PaintOptions> = {}): { pictures: Picture[]; places: (Place | null)[][] } {
  const all = { ...DEFAULTS, ...options };
  const random = seeded(11);
  const pictures: Picture[] = [];
  const places: (Place | null)[][] = [];
  for (let frame = 0; frame < all.frames; frame++) {
    const corner = all.camera(frame);
    const here = all.discs.map((disc) => {
      const place = disc(frame);
      return place && { x: place.x - corner.x, y: place.y - corner.y };
    });
    places.push(here);
    pictures.push(paint(all, corner, here, random));
  }
  return { pictures, places };
}

function paint(all: PaintOptions, corner: Place, discs: (Place | null)[], random: () => number): Picture {
  const { width, height, radius } = all;
  const data = new Uint8Array(width * height * 3);
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      const stage = stageAt(x + corner.x, y + corner.y);
      const covered = Math.max(0, ...discs.map((disc) => (disc ? cover(x, y, disc, radius) : 0)));
      const grain = all.grain === 0 ? 0 : all.grain * (random() + random() + random() - 1.5) * 2;
      for (let channel = 0; channel < 3; channel++) {
        const value = stage[channel] * (1 - covered) + all.colour[channel] * covered + grain;
        data[(y * width + x) * 3 + channel] = Math.max(0, Math.min(255, Math.round(value)));
      }
    }
  }
  return { width, height, data };
}

/** A smooth, never repeating backdrop, so that a moving camera has something to hold on to. */
function stageAt(x: number, y: number): [number, number, number] {
  const wave = 18 * Math.sin(x / 7.3 + y / 19) + 14 * Math.sin(x / 23 - y / 8.1) + 10 * Math.sin(x / 3.7 + y / 4.3);
  return [120 + wave, 150 + 0.6 * wave, 140 - 0.5 * wave];
}

/** Share of a pixel that a disc covers, from 8 × 8 points in it. */
function cover(x: number, y: number, disc: Place, radius: number): number {
  const middle = Math.hypot(x + 0.5 - disc.x, y + 0.5 - disc.y);
  if (middle > radius + 1) return 0;
  if (middle < radius - 1) return 1;
  let inside = 0;
  for (let i = 0; i < 64; i++) {
    const px = x + ((i % 8) + 0.5) / 8;
    const py = y + ((i >> 3) + 0.5) / 8;
    if (Math.hypot(px - disc.x, py - disc.y) <= radius) inside++;
  }
  return inside / 64;
}

/** Lehmer's generator (Park and Miller 1988): the same grain on every run. */
function seeded(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state * 48271) % 2147483647;
    return state / 2147483647;
  };
}
