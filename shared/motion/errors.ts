import type { Account } from './account.ts';
import type { Knots } from './follow.ts';
import { makeKnotsFor, placeKnots } from './follow.ts';

/**
 * Standard deviation of a number that follows from the parameters of a fit, by the first order of its slopes (delta method).
 * Infinity where the marks do not decide the parameters.
 */
export function errorOf(account: Account, number: (theta: Float64Array, knots: Knots) => number): number {
  const { covariance, noise2, fit } = account;
  if (!covariance) return Infinity;
  const p = fit.path.size;
  const theta = Float64Array.from(fit.theta);
  const knots = makeKnotsFor(fit.path);
  placeKnots(fit.path, theta, knots);
  const base = number(theta, knots);
  const slopes = new Float64Array(p);
  for (let k = 0; k < p; k += 1) {
    const value = theta[k]!;
    const small = 1e-6 * Math.max(1e-2, Math.abs(value));
    theta[k] = value + small;
    placeKnots(fit.path, theta, knots);
    slopes[k] = (number(theta, knots) - base) / (theta[k]! - value);
    theta[k] = value;
  }
  let variance = 0;
  for (let a = 0; a < p; a += 1) {
    if (slopes[a] === 0) continue;
    for (let b = 0; b < p; b += 1) variance += slopes[a]! * slopes[b]! * covariance[a * p + b]!;
  }
  return Number.isFinite(variance) ? Math.sqrt(Math.max(0, variance) * noise2) : Infinity;
}
