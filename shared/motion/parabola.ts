/** A quadratic (or line) fitted to values over times, in centred and scaled time u = (t - middle) / half. */
export interface PolynomialFit {
  middle: number;
  half: number;
  /** Value, slope and half curvature in u: value = c0 + c1 u + c2 u². */
  c0: number;
  c1: number;
  c2: number;
  /** Residual sum of squares and degrees of freedom left. */
  rss: number;
  freedom: number;
}

/**
 * Least-squares quadratic by orthogonal polynomials on the points themselves (Forsythe 1957), which stays exact where the
 * normal equations of raw times fail (NIST Pontius, frames near 100,000). Weights are optional counts of equal marks.
 * Fewer than three different times give the polynomial of the degree that they carry.
 */
export function fitQuadratic(
  times: ArrayLike<number>,
  values: ArrayLike<number>,
  weights?: ArrayLike<number>,
): PolynomialFit {
  const n = times.length;
  let low = Infinity;
  let high = -Infinity;
  for (let i = 0; i < n; i += 1) {
    const t = times[i]!;
    if (t < low) low = t;
    if (t > high) high = t;
  }
  const middle = n ? (low + high) / 2 : 0;
  const half = high > low ? (high - low) / 2 : 1;
  const origin = n ? values[0]! : 0;
  let sw = 0;
  let su = 0;
  let sv = 0;
  for (let i = 0; i < n; i += 1) {
    const w = weights ? weights[i]! : 1;
    sw += w;
    su += w * ((times[i]! - middle) / half);
    sv += w * (values[i]! - origin);
  }
  const alpha = sw ? su / sw : 0;
  const mean = sw ? sv / sw : 0;
  let s1 = 0;
  let s1v = 0;
  let s1u = 0;
  for (let i = 0; i < n; i += 1) {
    const w = weights ? weights[i]! : 1;
    const p = (times[i]! - middle) / half - alpha;
    s1 += w * p * p;
    s1v += w * p * (values[i]! - origin - mean);
    s1u += w * p * p * p;
  }
  const slope = s1 > 1e-24 ? s1v / s1 : 0;
  const beta = s1 > 1e-24 ? s1u / s1 : 0;
  const gamma = sw ? s1 / sw : 0;
  let s2 = 0;
  let s2v = 0;
  for (let i = 0; i < n; i += 1) {
    const w = weights ? weights[i]! : 1;
    const p = (times[i]! - middle) / half - alpha;
    const q = p * (p - beta) - gamma;
    s2 += w * q * q;
    s2v += w * q * (values[i]! - origin - mean - slope * p);
  }
  const bend = s2 > 1e-18 ? s2v / s2 : 0;
  let rss = 0;
  for (let i = 0; i < n; i += 1) {
    const w = weights ? weights[i]! : 1;
    const p = (times[i]! - middle) / half - alpha;
    const r = values[i]! - origin - mean - slope * p - bend * (p * (p - beta) - gamma);
    rss += w * r * r;
  }
  const used = (sw > 0 ? 1 : 0) + (s1 > 1e-24 ? 1 : 0) + (s2 > 1e-18 ? 1 : 0);
  return {
    middle,
    half,
    c0: origin + mean - slope * alpha + bend * (alpha * alpha + alpha * beta - gamma),
    c1: slope - bend * (2 * alpha + beta),
    c2: bend,
    rss,
    freedom: Math.max(0, n - used),
  };
}
