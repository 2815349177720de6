import { describe, expect, it } from 'vitest';
import { type Found, Finder, type FinderOptions } from '../../../shared/finding/finder.ts';
import { ontoStage } from '../../../shared/finding/cameraMove.ts';
import type { Picture } from '../../../shared/finding/types.ts';
import { paintTake, type PaintOptions, type Place, toss } from '../../support/paintTake.ts';

function findIn(pictures: Picture[], options: Partial<FinderOptions> = {}): Found {
  const { width, height } = pictures[0];
  const finder = new Finder({ width, height, frames: pictures.length, ...options });
  finder.learn(finder.sampleIndices.map((index) => pictures[index]));
  pictures.forEach((picture, index) => finder.look(index, picture));
  return finder.finish();
}

function findInTake(options: Partial<PaintOptions>): Found & { places: (Place | null)[][] } {
  const { pictures, places } = paintTake(options);
  return { ...findIn(pictures), places };
}

/** Distances of a track's marks from where one of the discs was painted, px. */
function errorsOf(found: Found, track: number, places: (Place | null)[][], disc = 0): number[] {
  return found.tracks[track].marks.map((mark) => {
    const place = places[mark.frame - 1][disc];
    return place ? Math.hypot(mark.x - place.x, mark.y - place.y) : Number.POSITIVE_INFINITY;
  });
}

const mean = (values: number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length;

describe('a disc in flight', { timeout: 60_000 }, () => {
  it('is found on every frame, its centre to 0.05 px of the analytic one on average', () => {
    const found = findInTake({});
    expect(found.tracks).toHaveLength(1);
    expect(found.tracks[0].marks.map((mark) => mark.frame)).toEqual(Array.from({ length: 18 }, (_, k) => k + 1));
    expect(mean(errorsOf(found, 0, found.places))).toBeLessThan(0.05);
  });

  it('is measured in the full picture where the search is done on a reduced one', () => {
    const large = (frame: number): Place => ({ x: 4 * toss(frame).x, y: 4 * toss(frame).y });
    const found = findInTake({ width: 1300, height: 800, radius: 30, frames: 14, discs: [large] });
    expect(mean(errorsOf(found, 0, found.places))).toBeLessThan(0.08);
    expect(mean(found.tracks[0].marks.map((mark) => mark.radius ?? 0))).toBeCloseTo(30, 0);
  });

  it('is found under strong grain', () => {
    const found = findInTake({ grain: 9 });
    expect(found.tracks[0].marks.length).toBeGreaterThanOrEqual(17);
    expect(mean(errorsOf(found, 0, found.places))).toBeLessThan(0.4);
  });

  it('is found where it differs in colour only and not in grey', () => {
    const found = findInTake({ colour: [205, 118, 140] });
    expect(errorsOf(found, 0, found.places)).toHaveLength(18);
    expect(mean(errorsOf(found, 0, found.places))).toBeLessThan(0.3);
  });

  it('keeps its marks while it rests before and after', () => {
    const rests = (frame: number): Place => toss(Math.max(4, Math.min(14, frame)));
    const found = findInTake({ frames: 22, discs: [rests] });
    expect(found.tracks[0].marks).toHaveLength(22);
    expect(Math.max(...errorsOf(found, 0, found.places))).toBeLessThan(0.3);
  });

  it('keeps its marks where it rests for most of the take and the background takes it in', () => {
    const rests = (frame: number): Place => toss(Math.max(0, frame - 26));
    const found = findInTake({ frames: 44, discs: [rests] });
    const errors = errorsOf(found, 0, found.places);
    expect(errors.length).toBeGreaterThanOrEqual(42);
    expect(errors.filter((error) => error < 0.6).length).toBeGreaterThanOrEqual(41);
  });

  it('has no mark on frames that do not show it, and goes on afterwards', () => {
    const hides = (frame: number): Place | null => (frame >= 7 && frame <= 9 ? null : toss(frame));
    const found = findInTake({ discs: [hides] });
    const frames = found.tracks[0].marks.map((mark) => mark.frame);
    expect(frames).not.toContain(9);
    expect(frames).toHaveLength(15);
  });

  it('is one thing when it leaves the picture at the top and comes back', () => {
    const high = (frame: number): Place => ({ x: 40 + 9 * frame, y: 150 - 34 * frame + 1.4 * frame * frame });
    const found = findInTake({ frames: 25, discs: [high] });
    expect(found.tracks).toHaveLength(1);
    const frames = found.tracks[0].marks.map((mark) => mark.frame);
    expect(frames[0]).toBe(1);
    expect(frames.at(-1)).toBe(25);
    expect(frames).not.toContain(12);
  });
});

describe('what moves in a take', { timeout: 60_000 }, () => {
  it('is followed as A and B when two things fly', () => {
    const other = (frame: number): Place => ({ x: 290 - 9 * frame, y: 60 + 0.4 * frame * frame });
    const found = findInTake({ discs: [toss, other], radius: 7 });
    expect(found.tracks.map((track) => track.id)).toEqual(['A', 'B']);
    expect(found.cautions).toEqual(['A and B move here; each is read on its own.']);
    const near = [0, 1].map((track) =>
      Math.min(...[0, 1].map((disc) => mean(errorsOf(found, track, found.places, disc)))),
    );
    expect(Math.max(...near)).toBeLessThan(0.5);
  });

  it('is what someone pointed at, and nothing else', () => {
    const other = (frame: number): Place => ({ x: 290 - 9 * frame, y: 60 + 0.4 * frame * frame });
    const { pictures, places } = paintTake({ discs: [toss, other], radius: 7 });
    for (const disc of [0, 1]) {
      const { x, y } = places[4][disc]!;
      const found = findIn(pictures, { object: { x: x + 3, y: y - 2, frame: 5 } });
      expect(found.tracks).toHaveLength(1);
      expect(mean(errorsOf(found, 0, places, disc))).toBeLessThan(0.5);
    }
  });

  it('is said to be elsewhere when nothing is where someone pointed', () => {
    const { pictures } = paintTake({});
    const found = findIn(pictures, { object: { x: 5, y: 5, frame: 3 } });
    expect(found.tracks).toHaveLength(1);
    expect(found.cautions[0]).toContain('Nothing stands out where you pointed');
  });

  it('is nothing where nothing moves, and the caution says so', () => {
    const found = findInTake({ discs: [() => ({ x: 100, y: 100 })] });
    expect(found.tracks).toEqual([]);
    expect(found.cautions).toEqual(['Nothing moves in these frames, so there is no flight to read.']);
  });

  it('is not the counter that is burnt in', () => {
    const { pictures } = paintTake({ discs: [] });
    pictures.forEach((picture, frame) => burnIn(picture, frame));
    expect(findIn(pictures).tracks).toEqual([]);
  });

  it('is not the shadow under the thing', () => {
    const { pictures, places } = paintTake({});
    pictures.forEach((picture, frame) => castShadow(picture, places[frame][0]!.x, 185));
    const found = findIn(pictures);
    expect(found.tracks).toHaveLength(1);
    expect(mean(errorsOf(found, 0, places))).toBeLessThan(0.3);
  });

  it.each([1, 2, 3, 5])('is no reason to fail in a take of %i frames', (frames) => {
    expect(() => findInTake({ frames })).not.toThrow();
  });
});

describe('a camera that moves', { timeout: 60_000 }, () => {
  const pan = (frame: number): Place => ({ x: 4.3 * frame, y: 1.2 * Math.sin(frame / 3) });

  it('is followed, and its way is in the offsets', () => {
    const found = findInTake({ camera: pan, radius: 9 });
    expect(found.camera.moved).toBe(true);
    expect(found.camera.offsets).toHaveLength(18);
    for (const offset of found.camera.offsets) {
      const place = pan(offset.frame - 1);
      expect(Math.hypot(offset.dx - place.x, offset.dy - place.y), `frame ${offset.frame}`).toBeLessThan(0.4);
    }
  });

  it('is taken out of the marks by its offsets', () => {
    const found = findInTake({ camera: pan, radius: 9 });
    expect(mean(errorsOf(found, 0, found.places))).toBeLessThan(0.4);
    const onStage = ontoStage(found.tracks[0].marks, found.camera);
    for (const mark of onStage) {
      const place = toss(mark.frame - 1);
      expect(Math.hypot(mark.x - place.x, mark.y - place.y), `frame ${mark.frame}`).toBeLessThan(0.8);
    }
  });

  it('is still when it stands still', () => {
    expect(findInTake({}).camera).toEqual({ moved: false, offsets: [] });
  });
});

/** Two blocks that come and go as the digits of a frame counter do. */
function burnIn(picture: Picture, frame: number): void {
  for (let digit = 0; digit < 2; digit++) {
    if ((frame >> digit) % 2 === 0) continue;
    for (let y = 180; y < 190; y++) {
      const at = (y * picture.width + 280 + 12 * digit) * 3;
      picture.data.fill(240, at, at + 7 * 3);
    }
  }
}

/** Darkens an ellipse on the ground by a third. */
function castShadow(picture: Picture, centre: number, ground: number): void {
  for (let y = ground - 4; y <= ground + 4; y++) {
    for (let x = Math.max(0, Math.round(centre) - 12); x <= Math.min(picture.width - 1, centre + 12); x++) {
      if (((x - centre) / 12) ** 2 + ((y - ground) / 4) ** 2 > 1) continue;
      for (let channel = 0; channel < 3; channel++) picture.data[(y * picture.width + x) * 3 + channel] *= 0.66;
    }
  }
}
