import type { Account, Fault, Field } from './account.ts';
import { fitPath } from './fit.ts';
import { judge } from './judge.ts';
import type { Path } from './path.ts';

/** Fits one account with the weights given. */
export function fitOnce(
  start: { path: Path; theta: Float64Array },
  fault: Fault | null,
  depth: boolean,
  weight: Float64Array,
  field: Field,
  most?: number,
): Account {
  return judge(fitPath(start.path, start.theta, { ...field.samples, weight }, most), fault, depth, weight, field);
}

/** Fits an account again and again without the drawing that lies farthest off, as long as leaving it out is worth its price. */
export function trim(first: Account, field: Field): Account {
  let account = first;
  const most = 1 + Math.floor(field.drawings.length / 6);
  for (let round = 0; round < most; round += 1) {
    const worst = worstDrawing(account, field);
    if (worst < 0) break;
    const weight = Float64Array.from(account.weight);
    weight[worst] = 0;
    const next = fitOnce(account.fit, account.fault, account.depth, weight, field);
    if (next.cost >= account.cost) break;
    account = next;
  }
  return account.left.length ? readmit(account, field) : account;
}

/** Takes drawings back in that the path passes through after all. */
function readmit(account: Account, field: Field): Account {
  let best = account;
  for (const i of account.left) {
    const off = (field.samples.x[i]! - best.fit.xs[i]!) ** 2 + (field.samples.y[i]! - best.fit.ys[i]!) ** 2;
    const outer = i < 2 || i >= field.drawings.length - 2;
    if (!outer && off * field.drawings[i]!.weight > 30 * best.noise2) continue;
    const weight = Float64Array.from(best.weight);
    weight[i] = field.drawings[i]!.weight;
    const next = fitOnce(best.fit, best.fault, best.depth, weight, field);
    if (next.cost < best.cost) best = next;
  }
  return best;
}

function worstDrawing(account: Account, field: Field): number {
  let worst = -1;
  let most = 9 * account.noise2;
  const { xs, ys } = account.fit;
  for (let i = 0; i < xs.length; i += 1) {
    if (account.weight[i] === 0) continue;
    const r = account.weight[i]! * ((field.samples.x[i]! - xs[i]!) ** 2 + (field.samples.y[i]! - ys[i]!) ** 2);
    if (r > most) {
      most = r;
      worst = i;
    }
  }
  return worst;
}
