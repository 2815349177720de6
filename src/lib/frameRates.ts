import type { FrameRate } from '../../shared/reading/document.ts';

export interface NamedRate extends FrameRate {
  label: string;
}

/** Frame rates a production works at, as exact fractions. */
export const FRAME_RATES: NamedRate[] = [
  { num: 24, den: 1, label: '24' },
  { num: 25, den: 1, label: '25' },
  { num: 30, den: 1, label: '30' },
  { num: 24000, den: 1001, label: '23.976 (24000/1001)' },
  { num: 30000, den: 1001, label: '29.97 (30000/1001)' },
  { num: 48, den: 1, label: '48' },
  { num: 60, den: 1, label: '60' },
];

/** Decimals that everyone writes for a rate that is really a fraction over 1001 (common practice, no source). */
const OVER_1001: Record<string, number> = {
  '23.976': 24000,
  '23.98': 24000,
  '29.97': 30000,
  '47.952': 48000,
  '59.94': 60000,
  '119.88': 120000,
};

/**
 * A frame rate as it is written: "12", "12.5", "24000/1001". The short decimals of rates over 1001 become their fraction.
 * Null when it is no frame rate between 1 and 240.
 */
export function parseFrameRate(text: string): FrameRate | null {
  const written = text.trim().replace(',', '.');
  const over1001 = OVER_1001[written];
  if (over1001) return { num: over1001, den: 1001 };
  const parts = /^(\d{1,7})(?:\.(\d{1,4})|\/(\d{1,7}))?$/.exec(written);
  if (!parts) return null;
  const [, whole, decimals, below] = parts;
  const den = below ? Number(below) : decimals ? 10 ** decimals.length : 1;
  const num = decimals ? Number(whole) * den + Number(decimals) : Number(whole);
  if (den === 0 || num / den < 1 || num / den > 240) return null;
  const shared = greatestCommonDivisor(num, den);
  return { num: num / shared, den: den / shared };
}

function greatestCommonDivisor(a: number, b: number): number {
  return b === 0 ? a : greatestCommonDivisor(b, a % b);
}
