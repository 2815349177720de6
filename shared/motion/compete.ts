import type { Account, Fault, Field } from './account.ts';
import { fitOnce, trim } from './trim.ts';
import { promising } from './faults.ts';
import { SHAPE_NAMES, SHAPE_STARTS } from './shapes.ts';
import type { Sketch } from './sketch.ts';
import { pathOf, sketchFrom } from './sketch.ts';

/** All accounts of one track, the one chosen first of all, and the best one without a fault. */
export interface Contest {
  chosen: Account;
  clean: Account;
  accounts: Account[];
}

/** An account so much dearer than the best that leaving drawings out will not save it. */
const OUT_OF_REACH = 40;

/** Fits the structure of a sketch without a fault and with every fault that promises something. */
export function compete(sketch: Sketch, weight: Float64Array, field: Field): Contest {
  const raw = fitOnce(pathOf(sketch, null, false, field), null, false, weight, field);
  const clean = trim(raw, field);
  const tried: Account[] = [];
  for (const start of clean === raw ? [raw] : [raw, clean]) {
    const base = sketchOfAccount(start);
    for (const { fault, depth } of promising(start, field))
      tried.push(...fitStarts(base, fault, depth, start.weight, field));
  }
  tried.push(...afterGravity(clean, tried, field));
  tried.sort((a, b) => a.cost - b.cost);
  const accounts = [clean];
  for (const account of tried.slice(0, 3)) {
    const near = account.cost < Math.min(clean.cost, tried[0]!.cost) + OUT_OF_REACH;
    accounts.push(near ? trim(account, field) : account);
  }
  accounts.sort((a, b) => a.cost - b.cost);
  const deep = accounts.slice(0, 2).find((account) => account.depth);
  if (deep) accounts.push(...inDepth(deep, field));
  else if (unexplained(accounts[0]!, field)) accounts.push(...bentInDepth(accounts[0]!, field));
  accounts.sort((a, b) => a.cost - b.cost);
  return { chosen: accounts[0]!, clean, accounts };
}

function fitStarts(base: Sketch, fault: Fault | null, depth: boolean, weight: Float64Array, field: Field): Account[] {
  if (fault?.kind !== 'shape') return [fitOnce(pathOf(base, fault, depth, field), fault, depth, weight, field)];
  const out: Account[] = [];
  for (const start of SHAPE_STARTS[fault.name]) {
    const shape = start.base + start.steps * field.step;
    out.push(fitOnce(pathOf(base, fault, depth, field, { shape }), fault, depth, weight, field));
    if (!unexplained(out[out.length - 1]!, field)) break;
  }
  return out;
}

/**
 * A flight of a strange shape between true ones drags the gravity of all of them. Where letting it bend by its own gravity
 * helps much, its shapes are tried from there, with the gravity of the others.
 */
function afterGravity(clean: Account, tried: readonly Account[], field: Field): Account[] {
  const free = tried
    .filter((account) => account.fault?.kind === 'gravity')
    .reduce<Account | null>((best, one) => (!best || one.cost < best.cost ? one : best), null);
  if (!free || free.fault?.kind !== 'gravity' || free.cost > clean.cost - 10) return [];
  if (Math.sqrt(free.noise2) < 1.5 * field.noise + 0.1) return [];
  const base = sketchOfAccount(free);
  const { span } = free.fault;
  return SHAPE_NAMES.flatMap((name) => fitStarts(base, { kind: 'shape', name, span }, false, free.weight, field));
}

/** Faults on top of motion towards or away from the camera. */
function inDepth(deep: Account, field: Field): Account[] {
  const { path, theta } = deep.fit;
  const base = sketchOfAccount(deep);
  const depth: [number, number] = [theta[path.depthAt]!, theta[path.depthAt + 1]!];
  const out: Account[] = [];
  for (const { fault } of promising(deep, field)) {
    if (!fault) continue;
    const start = fault.kind === 'shape' ? SHAPE_STARTS[fault.name][0]! : { base: 0, steps: 0 };
    const shape = start.base + start.steps * field.step;
    out.push(fitOnce(pathOf(base, fault, true, field, { shape, depth }), fault, true, deep.weight, field));
  }
  out.sort((a, b) => a.cost - b.cost);
  return out.slice(0, 2).map((account) => trim(account, field));
}

/** Whether an account leaves far more than noise. */
export function unexplained(account: Account, field: Field): boolean {
  return Math.sqrt(account.noise2) > 2 * field.noise + 0.25;
}

/** One flight that no fault alone explains: every shape of it, moving towards or away from the camera at the same time. */
function bentInDepth(account: Account, field: Field): Account[] {
  const base = sketchOfAccount(account);
  const flights = base.spans.flatMap((span, k) => (span.kind === 'flight' ? [k] : []));
  if (field.scaled || flights.length !== 1) return [];
  const out = SHAPE_NAMES.map((name) => {
    const fault: Fault = { kind: 'shape', name, span: flights[0]! };
    const start = SHAPE_STARTS[name][0]!;
    const path = pathOf(base, fault, true, field, { shape: start.base + start.steps * field.step });
    return fitOnce(path, fault, true, account.weight, field);
  }).sort((a, b) => a.cost - b.cost);
  return out.slice(0, 1).map((one) => trim(one, field));
}

function sketchOfAccount(account: Account): Sketch {
  return sketchFrom(account.fit.path, account.fit.theta, account.fit.knots);
}
