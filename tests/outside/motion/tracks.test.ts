import { existsSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { orderedMarks } from '../../../shared/motion/drawings.ts';
import { findHold } from '../../../shared/motion/hold.ts';
import { readMotion } from '../../../shared/motion/read.ts';
import type { Mark } from '../../../shared/reading/document.ts';

// Source: the shelf's open tracks (footage/README.md, B), 2,000 of known truth; the full score is footage/score_tracks.py.
const TRACKS = new URL('../../../../shared/footage/open/tracks.jsonl', import.meta.url);
const here = existsSync(TRACKS);

interface Track {
  id: string;
  fps: number;
  hold: 1 | 2 | 3;
  width: number;
  height: number;
  n: number;
  x: (number | null)[];
  y: number[];
  truth: { clean: boolean; perspective: boolean; sigma: number; outliers: number[] };
}

const tracks = here
  ? readFileSync(TRACKS, 'utf8')
      .trim()
      .split('\n')
      .map((line) => JSON.parse(line) as Track)
  : [];
const marksOf = (track: Track): Mark[] =>
  track.x.flatMap((x, i) => (x === null ? [] : [{ frame: i + 1, x, y: track.y[i]!, origin: 'import' as const }]));

describe.skipIf(!here)('tracks of known truth', () => {
  it('clean ones hardly ever get a finding: at most 1.5 % of all, 1 % of the flat ones', () => {
    const alarms = tracks
      .filter((track) => track.truth.clean)
      .map((track) => {
        const reading = readMotion({
          kind: 'marks',
          frames: track.n,
          width: track.width,
          height: track.height,
          firstFrame: 1,
          fps: { num: track.fps, den: 1 },
          hold: track.hold,
          tracks: [{ id: 'A', marks: marksOf(track) }],
        });
        // A pop called on a stray mark of the tracker is no false alarm (footage/README.md, B).
        const called = reading.findings.filter((finding) => {
          const stray = track.truth.outliers.some((i) => Math.abs(i + 1 - finding.fromFrame) <= track.hold);
          return !(finding.kind === 'pop' && stray);
        });
        return { flat: !track.truth.perspective, alarm: called.length > 0 };
      });
    const share = (some: typeof alarms) => some.filter((one) => one.alarm).length / some.length;
    expect(share(alarms)).toBeLessThanOrEqual(0.015);
    expect(share(alarms.filter((one) => one.flat))).toBeLessThanOrEqual(0.01);
  });

  it('ones, twos and threes are found when not told, on 97 % with noise up to 0.8 px', () => {
    const quiet = tracks.filter((track) => track.truth.sigma <= 0.8);
    const right = quiet.filter((track) => findHold(orderedMarks(marksOf(track))).hold === track.hold);
    expect(right.length / quiet.length).toBeGreaterThanOrEqual(0.97);
  });
});
