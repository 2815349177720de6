import type { Account, Field } from './account.ts';
import { fitOnce } from './trim.ts';
import type { Contest } from './compete.ts';
import { compete } from './compete.ts';
import { honour } from './honour.ts';
import type { Sketch } from './sketch.ts';
import { oneFlight, restFirst, restLast } from './sketchEdits.ts';
import { pathOf, sketchFrom, sketchOf } from './sketch.ts';
import type { Stretch } from './spans.ts';
import { isDoubtful, restructure } from './structure.ts';

/**
 * Lets every account of a track compete on the same residuals and takes the one that costs least. Structure and fault are
 * searched in turn: the best fault for a structure, then the best structure for that fault, until neither changes.
 */
export function holdContest(
  field: Field,
  stretches: readonly Stretch[],
  lost: readonly number[],
  odd: readonly number[],
): Contest | null {
  const full = Float64Array.from(field.drawings, (drawing) => drawing.weight);
  const even = full.map((one, i) => (odd.includes(i) ? 0 : one));
  const weight = even.map((one, i) => (lost.includes(i) ? 0 : one));
  let best: Contest | null = null;
  if (stretches.some((stretch) => stretch.kind === 'flight')) {
    for (const sketch of firstSketches(sketchOf(field, stretches), stretches, field, weight)) {
      const next = compete(honour(sketch, field), weight, field);
      if (!best || next.chosen.cost < best.chosen.cost) best = next;
    }
    if (best && lost.some((i) => best!.chosen.left.includes(i))) {
      const { path, theta, knots } = best.chosen.fit;
      const next = compete(sketchFrom(path, theta, knots), even, field);
      if (next.chosen.cost < best.chosen.cost) best = next;
    }
  }
  if (!best || isPoor(best.chosen, field)) {
    for (const sketch of plainSketches(field, full)) {
      const next = compete(honour(sketch, field), full, field);
      if (!best || next.chosen.cost < best.chosen.cost) best = next;
    }
  }
  if (!best) return null;
  for (let round = 0; round < 3; round += 1) {
    let better: Account | null = null;
    if (!isDoubtful(best.chosen, field)) break;
    for (const account of best.accounts.slice(0, 2)) {
      if (account.cost > best.chosen.cost + RIVAL) break;
      const next = restructure(account, field, full);
      if (next && next.cost < (better ?? best.chosen).cost) better = next;
    }
    if (!better) break;
    const next = compete(sketchFrom(better.fit.path, better.fit.theta, better.fit.knots), better.weight, field);
    if (next.chosen.cost >= best.chosen.cost) break;
    best = next;
  }
  return best;
}

/** Cost within which a dearer account may still turn out to be the right one. */
const RIVAL = 40;

/** The sketch as it is, and with the drawings that no stretch claims at either end taken for rest. */
function firstSketches(sketch: Sketch, stretches: readonly Stretch[], field: Field, weight: Float64Array): Sketch[] {
  const before = stretches[0]!.from;
  const after = field.drawings.length - 1 - stretches[stretches.length - 1]!.to;
  const opened = before > 0 && before < 4 ? restFirst(sketch, before, field) : null;
  const closed = after > 0 && after < 4 ? restLast(opened ?? sketch, after, field) : null;
  const resting = closed ?? opened;
  if (!resting) return [sketch];
  const [plain, rested] = [sketch, resting].map((one) =>
    fitOnce(pathOf(one, null, false, field), null, false, weight, field),
  );
  if (rested!.cost < plain!.cost - RIVAL) return [resting];
  return [sketch, resting];
}

/** The two best of the plainest sketches: one flight, with rest before and after it or without. */
function plainSketches(field: Field, weight: Float64Array): Sketch[] {
  const ends: [number, number][] = [
    [0, 0],
    [1, 0],
    [2, 0],
    [1, 1],
    [2, 1],
    [3, 1],
  ];
  return ends
    .flatMap(([before, after]) => {
      const sketch = oneFlight(field, before, after);
      return sketch
        ? [{ sketch, cost: fitOnce(pathOf(sketch, null, false, field), null, false, weight, field).cost }]
        : [];
    })
    .sort((a, b) => a.cost - b.cost)
    .slice(0, 2)
    .map((one) => one.sketch);
}

/** An account that leaves out much or fits badly: its structure may be wrong. */
function isPoor(account: Account, field: Field): boolean {
  return account.left.length > 0.2 * field.drawings.length || account.noise2 > 9;
}
