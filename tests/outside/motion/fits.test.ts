import { readFileSync } from 'node:fs';
import { levenbergMarquardt } from 'ml-levenberg-marquardt';
import { Matrix, QrDecomposition } from 'ml-matrix';
import { describe, expect, it } from 'vitest';
import { fitQuadratic } from '../../../shared/motion/parabola.ts';
import { fitPolynomial } from '../../../shared/motion/polynomial.ts';
import { randomFrom } from '../../unit/motion/factories.ts';

interface StrdSet {
  x: number[];
  y: number[];
  n: number;
  certified: { coef: number[]; rss?: number; residual_sd?: number };
}

// Source: NIST Statistical Reference Datasets, as carried by the Debian source package gsl 2.7.1 (Pontius, Filip) and rebuilt
// from the published construction (Wampler); certified values from there (the shelf's methods, section 3).
const { sets } = JSON.parse(readFileSync(new URL('../../fixtures/nist/nist-strd.json', import.meta.url), 'utf8')) as {
  sets: Record<string, StrdSet>;
};

/** Digits to which a value agrees with the certified one (log relative error). */
const digits = (value: number, certified: number) => {
  if (value === certified) return 16;
  return -Math.log10(Math.abs(value - certified) / Math.abs(certified || 1));
};

/** Coefficients of powers of x itself, from those of u = (x - middle) / half. */
function inPowers(fit: { middle: number; half: number; c: ArrayLike<number> }): number[] {
  const degree = fit.c.length - 1;
  const out = Array.from({ length: degree + 1 }, () => 0);
  let power = [1];
  for (let k = 0; k <= degree; k += 1) {
    power.forEach((value, i) => {
      out[i] = out[i]! + fit.c[k]! * value;
    });
    power = Array.from({ length: power.length + 1 }, (_, i) => {
      return ((power[i - 1] ?? 0) - fit.middle * (power[i] ?? 0)) / fit.half;
    });
  }
  return out;
}

describe('NIST StRD', () => {
  it('Pontius: our quadratic agrees to 12 digits', () => {
    const set = sets.Pontius!;
    const fit = fitQuadratic(set.x, set.y);
    const coefficients = inPowers({ ...fit, c: [fit.c0, fit.c1, fit.c2] });
    set.certified.coef.forEach((value, k) => expect(digits(coefficients[k]!, value)).toBeGreaterThan(12));
    // The certified residual sum of squares, from the same source.
    expect(digits(fit.rss, 0.155761768796992e-5)).toBeGreaterThan(10);
  });

  it.each(['Wampler1', 'Wampler2', 'Wampler3', 'Wampler4', 'Wampler5'])('%s: a quintic keeps its digits', (name) => {
    const set = sets[name]!;
    const coefficients = inPowers(fitPolynomial(set.x, set.y, 5));
    const least = name === 'Wampler5' ? 5 : name === 'Wampler4' ? 7 : 8;
    set.certified.coef.forEach((value, k) => expect(digits(coefficients[k]!, value)).toBeGreaterThan(least));
  });

  it('Filip: degree ten over a tiny range keeps its digits', () => {
    const set = sets.Filip!;
    const coefficients = inPowers(fitPolynomial(set.x, set.y, 10));
    set.certified.coef.forEach((value, k) => expect(digits(coefficients[k]!, value)).toBeGreaterThan(6));
  });
});

describe('independent fits agree on 1,000 random cases', () => {
  const random = randomFrom(41);
  const cases = Array.from({ length: 1000 }, () => {
    const n = 5 + Math.floor(random() * 40);
    const t = Array.from({ length: n }, (_, i) => i + 1);
    const [a, b, c] = [200 * random(), 40 * (random() - 0.5), 6 * random()];
    const y = t.map((k) => a + b * k + 0.5 * c * k * k + (random() - 0.5) * 3);
    return { t, y };
  });
  const curvature = (t: number[], y: number[]) => {
    const fit = fitQuadratic(t, y);
    return (2 * fit.c2) / fit.half ** 2;
  };

  it('ml-matrix, by QR', () => {
    for (const { t, y } of cases) {
      const middle = (t[0]! + t[t.length - 1]!) / 2;
      const design = new Matrix(t.map((k) => [1, k - middle, (k - middle) ** 2]));
      const answer = new QrDecomposition(design).solve(Matrix.columnVector(y));
      expect(Math.abs(curvature(t, y) - 2 * answer.get(2, 0))).toBeLessThan(1e-9);
    }
  });

  it('ml-levenberg-marquardt, from a rough start', () => {
    for (const { t, y } of cases) {
      const middle = (t[0]! + t[t.length - 1]!) / 2;
      const { parameterValues } = levenbergMarquardt(
        { x: t.map((k) => k - middle), y },
        ([a = 0, b = 0, c = 0]) =>
          (u: number) =>
            a + b * u + 0.5 * c * u * u,
        {
          initialValues: [y[0]!, 0, 1],
          damping: 1e-3,
          maxIterations: 100,
          gradientDifference: 1e-3,
          errorTolerance: 1e-14,
        },
      );
      expect(Math.abs(curvature(t, y) - parameterValues[2]!)).toBeLessThan(1e-4);
    }
  });
});
