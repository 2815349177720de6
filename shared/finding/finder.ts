import type { Mark, Reading } from '../reading/document.ts';
import type { Pose } from './align.ts';
import { type Candidate, candidateOf, foreignIn, ontoPicture, regionsOf, windowOf, withoutDust } from './candidates.ts';
import { coarseFactor, reduce } from './coarse.ts';
import { difference, looseDifference, noiseThreshold } from './difference.ts';
import { restsFromGhosts } from './ghosts.ts';
import { type Ground, learnGround } from './ground.ts';
import { extend } from './extend.ts';
import { joinParts } from './joinParts.ts';
import { bestPath } from './link.ts';
import { cut, type GroundCut, measure } from './measure.ts';
import { settle } from './settle.ts';
import { isGrainy, isPaletted, smooth } from './smooth.ts';
import { type FoundTrack, thingsAmong, trackOf } from './tracks.ts';
import type { Picture, PointAt } from './types.ts';

export interface FinderOptions {
  width: number;
  height: number;
  /** Number of pictures of the take. */
  frames: number;
  camera?: 'still' | 'moving';
  object?: PointAt;
}

export interface Found {
  tracks: { id: string; marks: Mark[] }[];
  camera: Reading['camera'];
  cautions: string[];
}

/** Most pictures kept in full for the background; the benchmark of `stack.md` 5 uses as many. */
const MOST_SAMPLES = 15;
/** Paths taken out of the candidates before they are judged: the thing, its shadow, counters, a second thing. */
const MOST_PATHS = 8;
/** Least difference that counts where a palette dithers, grey levels. */
const DITHERED = 16;
const NAMES = ['A', 'B', 'C'];

/**
 * Finds what moves in a take, one picture at a time: `sampleIndices` says which pictures to give to `learn` first, then
 * every picture goes once through `look`, in any order, and `finish` links what stood out. Pictures are not kept.
 */
export class Finder {
  readonly sampleIndices: number[];
  readonly #frames: Candidate[][];
  readonly #factor: number;
  readonly #camera: FinderOptions['camera'];
  readonly #object: PointAt | undefined;
  readonly #poses: (Pose | undefined)[];
  #ground: Ground | null = null;
  #grainy = false;
  #least: number | undefined;
  #differences = new Uint8Array(0);

  constructor(options: FinderOptions) {
    this.#factor = coarseFactor(options.width, options.height);
    this.#camera = options.camera;
    this.#object = options.object;
    this.#poses = Array.from({ length: options.frames });
    this.#frames = Array.from({ length: options.frames }, () => []);
    const count = Math.min(MOST_SAMPLES, options.frames);
    const step = (options.frames - 1) / Math.max(1, count - 1);
    this.sampleIndices = Array.from({ length: count }, (_, k) => Math.round(k * step));
  }

  /** Learns the background from the pictures at `sampleIndices`, in that order. They are kept until `finish`. */
  learn(samples: Picture[]): void {
    const paletted = isPaletted(samples[0]);
    this.#least = paletted ? DITHERED : undefined;
    this.#grainy = paletted || isGrainy(samples);
    const clean = this.#grainy ? samples.map(smooth) : samples;
    this.#ground = learnGround(clean, this.sampleIndices, this.#factor, this.#camera);
  }

  /**
   * Looks for what stands out on one picture.
   * @param index place of the picture in the take, from 0
   * @throws Error when nothing was learned yet
   */
  look(index: number, original: Picture): void {
    const ground = this.#ground;
    if (!ground) throw new Error('The finder has to learn the background before it looks at a picture.');
    const picture = this.#grainy ? smooth(original) : original;
    const coarse = reduce(picture, this.#factor);
    const pose = ground.poseOf(index, coarse);
    this.#poses[index] = pose;
    const differences = this.#compare(coarse, ground.coarse(pose));
    const threshold = noiseThreshold(differences, this.#least);
    const { labels, regions } = regionsOf(differences, coarse.width, coarse.height, threshold);
    for (const region of regions) {
      const box = windowOf(region, this.#factor, picture);
      const foreign = foreignIn(box, region.label, labels, coarse.width, this.#factor);
      const noise = { threshold, factor: this.#factor };
      const measured = measure(cut(picture, box), ground.window(box, pose), noise, foreign, picture);
      if (measured) this.#frames[index].push(candidateOf(measured, index, pose));
    }
  }

  #compare(coarse: Picture, ground: GroundCut): Uint8Array {
    const pixels = coarse.width * coarse.height;
    if (this.#differences.length !== pixels) this.#differences = new Uint8Array(pixels);
    if (!ground.known) return difference(coarse, ground, this.#differences);
    return looseDifference(coarse, ground, ground.known, this.#differences);
  }

  /** Links what stood out to tracks and names the things A, B and C. Frames of the marks count from 1. */
  finish(): Found {
    let rest = withoutDust(this.#frames);
    const tracks: FoundTrack[] = [];
    while (tracks.length < MOST_PATHS) {
      const path = bestPath(rest);
      if (path.length < 3) break;
      const taken = new Set(path);
      rest = rest.map((candidates) => candidates.filter((candidate) => !taken.has(candidate)));
      tracks.push(trackOf(path));
    }
    const joined = joinParts(tracks);
    const { named, cautions } = this.#choose(joined);
    const things = named.map((thing) => {
      const others = new Set(named.filter((other) => other !== thing).flatMap((other) => other.path));
      return extend(
        thing,
        this.#frames.map((candidates) => candidates.filter((candidate) => !others.has(candidate))),
      );
    });
    return {
      tracks: things.map((thing, k) => ({ id: NAMES[k], marks: this.#marksOf(thing, joined) })),
      camera: this.#cameraMove(),
      cautions,
    };
  }

  #marksOf(thing: FoundTrack, tracks: FoundTrack[]): Mark[] {
    const settled = settle(thing);
    // On a moving stage nothing rests in the picture, so there is no ghost to ask.
    const placed = this.#ground?.moves ? settled : restsFromGhosts(settled, tracks, this.#frames.length);
    return placed.map(({ candidate, x, y, radius, support }) => ({
      frame: candidate.index + 1,
      x: round(x),
      y: round(y),
      radius: round(radius),
      origin: 'found',
      confidence: Math.round(100 * Math.min(0.99, support * Math.min(1, candidate.contrast / 40))) / 100,
    }));
  }

  /** The things that are to be followed: what someone pointed at, or what is in flight. */
  #choose(tracks: FoundTrack[]): { named: FoundTrack[]; cautions: string[] } {
    const object = this.#object;
    const pointed = object && trackAt(tracks, object);
    if (pointed) return { named: [pointed], cautions: [] };
    const named = thingsAmong(tracks);
    const cautions: string[] = [];
    if (named.length === 0) cautions.push('Nothing moves in these frames, so there is no flight to read.');
    if (named.length > 1) cautions.push(`${listed(named.map((_, k) => NAMES[k]))} move here; each is read on its own.`);
    if (object) cautions.unshift('Nothing stands out where you pointed, so what moves most was followed.');
    return { named, cautions };
  }

  /** The camera's way against the first frame, px of the full picture. */
  #cameraMove(): Reading['camera'] {
    if (!this.#ground?.moves) return { moved: false, offsets: [] };
    const first = this.#poses.find((pose) => pose !== undefined);
    if (!first) return { moved: false, offsets: [] };
    const offsets = this.#poses.flatMap((pose, index) => {
      if (!pose) return [];
      const { dx, dy, zoom } = pose;
      return [{ frame: index + 1, dx: round(dx - first.dx), dy: round(dy - first.dy), zoom: round(zoom, 5) }];
    });
    return { moved: true, offsets };
  }
}

/** How far from a thing someone may point, in its radii, and px that are always near enough. */
const POINTED = 1.5;
const NEAR = 12;

/** The track that has something nearest to the place that was pointed at, on that frame; null where nothing is near. */
function trackAt(tracks: FoundTrack[], point: PointAt): FoundTrack | null {
  let best: { track: FoundTrack; distance: number } | null = null;
  for (const track of tracks) {
    const candidate = track.path.find(({ index }) => index === point.frame - 1);
    if (!candidate) continue;
    const place = ontoPicture(candidate.whole, candidate.pose);
    const distance = Math.hypot(place.x - point.x, place.y - point.y);
    if (distance > Math.max(NEAR, POINTED * track.radius)) continue;
    if (!best || distance < best.distance) best = { track, distance };
  }
  return best?.track ?? null;
}

function round(value: number, digits = 3): number {
  return Number(value.toFixed(digits));
}

/** "A and B", "A, B and C". */
function listed(names: string[]): string {
  return `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`;
}
