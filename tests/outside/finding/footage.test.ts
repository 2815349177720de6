import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { analyseFrames } from '../../../server/analysis/analyseFrames.ts';
import type { FindingKind } from '../../../shared/reading/kinds.ts';

// Source: the shelf's footage with known truth (footage/README.md, sections A and D): what was drawn is in truth.json,
// and the floor of eight sequences is the first slice's. Skipped where the shelf is not there.
const SEQUENCES = join(import.meta.dirname, '../../../../shared/footage/open/sequences');

const FLOOR: [string, FindingKind[]][] = [
  ['o01-pencil-toss-clean', []],
  ['o02-pencil-bounces-twos-clean', []],
  ['o03-pencil-apex-late', ['apex-off-centre']],
  ['o05-cel-hat-too-straight', ['too-straight']],
  ['o06-ray-ball-bounces-clean', []],
  ['o07-ray-crate-even-spacing', ['spacing-off-path']],
  ['o14-ray-table-rolloff-clean', []],
  ['o20-cel-horizontal-slow-out', ['across-uneven']],
];

/** Sequences whose places are checked but whose findings other tests own. */
const PLACES = [
  ...FLOOR.map(([id]) => id),
  'o12-pan-bucket-clean',
  'o15-pencil-two-balls-clean',
  'o16-cel-apple-leaves-top-clean',
  'o17-cel-ball-behind-post-clean',
];

interface Truth {
  fps: number;
  frames: number;
  objects: { visible: number[]; radius_px: number[]; positions_full: [number, number][] }[];
}

async function readSequence(id: string) {
  const folder = join(SEQUENCES, id);
  const truth: Truth = JSON.parse(readFileSync(join(folder, 'truth.json'), 'utf8'));
  const names = readdirSync(join(folder, 'frames')).toSorted();
  const framePaths = names.map((name) => join(folder, 'frames', name));
  const { reading } = await analyseFrames(
    { id, framePaths, kind: 'frames', firstFrame: 1, fps: { num: truth.fps, den: 1 } },
    () => undefined,
  );
  return { truth, reading };
}

describe.skipIf(!existsSync(SEQUENCES))('footage with known truth', { timeout: 120_000 }, () => {
  it.each(FLOOR)('%s is read with the findings it carries: %j', async (id, kinds) => {
    const { reading } = await readSequence(id);
    expect(reading.findings.map((finding) => finding.kind)).toEqual(kinds);
  });

  it.each(PLACES)('%s: the thing is found where it is drawn', async (id) => {
    const { truth, reading } = await readSequence(id);
    expect(reading.objects).toHaveLength(truth.objects.length);
    for (const object of truth.objects) {
      const errors = reading.objects.map(({ marks }) => {
        const at = new Map(marks.map((mark) => [mark.frame - 1, mark]));
        return object.positions_full.flatMap(([x, y], frame) => {
          if (object.visible[frame] < 0.5) return [];
          const mark = at.get(frame);
          return [mark ? Math.hypot(mark.x - x, mark.y - y) : Number.POSITIVE_INFINITY];
        });
      });
      const mean = (values: number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length;
      const best = errors.toSorted((a, b) => mean(a) - mean(b))[0];
      const found = best.filter((error, frame) => error <= Math.max(8, object.radius_px[frame] ?? 8));
      expect(found.length / best.length).toBeGreaterThanOrEqual(0.98);
      expect(found.toSorted((a, b) => a - b)[found.length >> 1]).toBeLessThan(1.2);
    }
  });
});
