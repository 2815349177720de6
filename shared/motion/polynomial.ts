/** A polynomial in centred and scaled time u = (t - middle) / half: c[0] + c[1] u + c[2] u² + … */
export interface Polynomial {
  middle: number;
  half: number;
  c: Float64Array;
  /** Residual sum of squares. */
  rss: number;
}

/**
 * Least-squares polynomial of any degree over the points themselves, by orthogonal polynomials and their three-term recurrence
 * (Forsythe 1957). Keeps its digits where normal equations lose them all (NIST Wampler and Filip).
 */
export function fitPolynomial(times: ArrayLike<number>, values: ArrayLike<number>, degree: number): Polynomial {
  const n = times.length;
  let low = Infinity;
  let high = -Infinity;
  for (let i = 0; i < n; i += 1) {
    low = Math.min(low, times[i]!);
    high = Math.max(high, times[i]!);
  }
  const middle = n ? (low + high) / 2 : 0;
  const half = high > low ? (high - low) / 2 : 1;
  const u = Float64Array.from({ length: n }, (_, i) => (times[i]! - middle) / half);
  const rest = Float64Array.from({ length: n }, (_, i) => values[i]!);
  const c = new Float64Array(degree + 1);
  let before = new Float64Array(n);
  let now = new Float64Array(n).fill(1);
  let beforeBasis = new Float64Array(degree + 1);
  let basis = new Float64Array(degree + 1);
  basis[0] = 1;
  let normBefore = 0;
  for (let d = 0; d <= degree; d += 1) {
    let norm = 0;
    let shift = 0;
    for (let i = 0; i < n; i += 1) {
      norm += now[i]! * now[i]!;
      shift += u[i]! * now[i]! * now[i]!;
    }
    if (!(norm > 1e-22 * Math.max(1, n))) break;
    // Twice over the residuals, so that what rounding left of a coefficient is found the second time.
    for (let twice = 0; twice < 2; twice += 1) {
      let part = 0;
      for (let i = 0; i < n; i += 1) part += rest[i]! * now[i]!;
      part /= norm;
      for (let i = 0; i < n; i += 1) rest[i] = rest[i]! - part * now[i]!;
      for (let k = 0; k <= degree; k += 1) c[k] = c[k]! + part * basis[k]!;
    }
    const alpha = shift / norm;
    const beta = d === 0 ? 0 : norm / normBefore;
    const next = Float64Array.from(now, (value, i) => (u[i]! - alpha) * value - beta * before[i]!);
    const nextBasis = Float64Array.from(basis, (value, k) => {
      return (k > 0 ? basis[k - 1]! : 0) - alpha * value - beta * beforeBasis[k]!;
    });
    [before, now, beforeBasis, basis, normBefore] = [now, next, basis, nextBasis, norm];
  }
  let rss = 0;
  for (let i = 0; i < n; i += 1) rss += rest[i]! * rest[i]!;
  return { middle, half, c, rss };
}

/** Value at a time. */
export function valueAt(fit: Polynomial, t: number): number {
  const u = (t - fit.middle) / fit.half;
  let value = 0;
  for (let k = fit.c.length - 1; k >= 0; k -= 1) value = value * u + fit.c[k]!;
  return value;
}

/** Speed at a time, per frame. */
export function speedAt(fit: Polynomial, t: number): number {
  const u = (t - fit.middle) / fit.half;
  let slope = 0;
  for (let k = fit.c.length - 1; k >= 1; k -= 1) slope = slope * u + k * fit.c[k]!;
  return slope / fit.half;
}
