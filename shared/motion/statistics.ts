/**
 * Two-sided 95 % and one-sided quantiles of Student's t by the expansion of Cornish and Fisher in 1/freedom
 * (Abramowitz and Stegun 26.7.5), within 0.5 % from 3 degrees of freedom on.
 */
export function studentQuantile(normal: number, freedom: number): number {
  const v = Math.max(1, freedom);
  const z = normal;
  const g1 = (z ** 3 + z) / 4;
  const g2 = (5 * z ** 5 + 16 * z ** 3 + 3 * z) / 96;
  const g3 = (3 * z ** 7 + 19 * z ** 5 + 17 * z ** 3 - 15 * z) / 384;
  return z + g1 / v + g2 / v ** 2 + g3 / v ** 3;
}

/** Normal quantiles in use: two-sided 95 %, one-sided 99 % and 95 %. */
export const Z95 = 1.959964;
export const Z99_ONE = 2.326348;
export const Z95_ONE = 1.644854;
