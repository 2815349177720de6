import type { Account, Field } from './account.ts';
import { fitOnce, trim } from './account.ts';
import { promising } from './faults.ts';
import { SHAPE_STARTS } from './shapes.ts';
import type { Sketch } from './sketch.ts';
import { oneFlight, pathOf, restFirst, restLast, sketchFrom, sketchOf } from './sketch.ts';
import type { Stretch } from './spans.ts';
import { isDoubtful, restructure } from './structure.ts';

/** All accounts of one track, the one chosen first of all, and the best one without a fault. */
export interface Contest {
  chosen: Account;
  clean: Account;
  accounts: Account[];
}

/**
 * Lets every account of a track compete on the same residuals and takes the one that costs least. Structure and fault are
 * searched in turn: the best fault for a structure, then the best structure for that fault, until neither changes.
 */
export function holdContest(field: Field, stretches: readonly Stretch[], lost: readonly number[]): Contest | null {
  const full = Float64Array.from(field.drawings, (drawing) => drawing.weight);
  const weight = Float64Array.from(full);
  for (const index of lost) weight[index] = 0;
  let best: Contest | null = null;
  if (stretches.some((stretch) => stretch.kind === 'flight')) {
    for (const sketch of firstSketches(sketchOf(field, stretches), stretches, field)) {
      const next = compete(sketch, weight, field);
      if (!best || next.chosen.cost < best.chosen.cost) best = next;
    }
  }
  if (!best || isPoor(best.chosen, field)) {
    for (const sketch of plainSketches(field, full)) {
      const next = compete(sketch, full, field);
      if (!best || next.chosen.cost < best.chosen.cost) best = next;
    }
  }
  if (!best) return null;
  for (let round = 0; round < 3; round += 1) {
    let better: Account | null = null;
    if (!isDoubtful(best.chosen, field)) break;
    for (const account of best.accounts.slice(0, 2)) {
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

/** The sketch as it is, and with the drawings that no stretch claims at either end taken for rest. */
function firstSketches(sketch: Sketch, stretches: readonly Stretch[], field: Field): Sketch[] {
  const before = stretches[0]!.from;
  const after = field.drawings.length - 1 - stretches[stretches.length - 1]!.to;
  const opened = before > 0 && before < 4 ? restFirst(sketch, before, field) : null;
  const closed = after > 0 && after < 4 ? restLast(opened ?? sketch, after, field) : null;
  const resting = closed ?? opened;
  return resting ? [sketch, resting] : [sketch];
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

/** Fits the structure of a sketch without a fault and with every fault that promises something. */
function compete(sketch: Sketch, weight: Float64Array, field: Field): Contest {
  const raw = fitOnce(pathOf(sketch, null, false, field), null, false, weight, field);
  const clean = trim(raw, field);
  const base = sketchFrom(clean.fit.path, clean.fit.theta, clean.fit.knots);
  const tried: Account[] = [];
  const promises = promising(raw, field);
  if (clean.left.length !== raw.left.length) {
    for (const more of promising(clean, field)) {
      if (!promises.some((one) => JSON.stringify(one.fault) === JSON.stringify(more.fault))) promises.push(more);
    }
  }
  for (const { fault, depth } of promises) {
    const starts =
      fault?.kind === 'shape'
        ? SHAPE_STARTS[fault.name].map((start) => start.base + start.steps * field.step)
        : [undefined];
    for (const shape of starts)
      tried.push(fitOnce(pathOf(base, fault, depth, field, { shape }), fault, depth, weight, field));
  }
  tried.sort((a, b) => a.cost - b.cost);
  const accounts = [clean];
  for (const account of tried.slice(0, 4)) {
    const worthIt = account.cost < Math.min(clean.cost, tried[0]!.cost) + 60;
    accounts.push(worthIt ? trim(account, field) : account);
  }
  accounts.sort((a, b) => a.cost - b.cost);
  return { chosen: accounts[0]!, clean, accounts };
}
