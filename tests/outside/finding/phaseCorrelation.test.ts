import { describe, expect, it } from 'vitest';
import { type Spectrum, transform } from '../../../shared/finding/fourier.ts';
import { phaseShift } from '../../../shared/finding/phaseCorrelation.ts';

const SIZE = 128;

describe('phase correlation', () => {
  // Source: the worked example of the published method (Guizar-Sicairos, Thurman and Fienup 2008, Optics Letters 33:156)
  // in the documentation of a scientific image library, as quoted in methods.md 8: a picture shifted in the Fourier
  // domain by (-22.4, 13.32) px is given back exactly at steps of 0.01 px.
  it('gives back a shift of (-22.4, 13.32) px at a hundredth of a pixel', () => {
    const reference = picture();
    const moved = shifted(reference, 13.32, -22.4);
    const shift = phaseShift(reference, moved, 100);
    expect(shift.x).toBeCloseTo(13.32, 6);
    expect(shift.y).toBeCloseTo(-22.4, 6);
  });

  // Source: the shift theorem of the discrete Fourier transform (Oppenheim and Schafer; common practice).
  it('gives back whole shifts without refinement', () => {
    const reference = picture();
    const { x, y } = phaseShift(reference, shifted(reference, -9, 31));
    expect([x, y]).toEqual([-9, 31]);
  });
});

describe('the Fourier transform', () => {
  // Source: definition of the transform: a single wave has a single line, and the inverse gives the grid back.
  it('has one line for one wave and undoes itself', () => {
    const wave = { size: 8, re: new Float64Array(64), im: new Float64Array(64) };
    for (let at = 0; at < 64; at++) wave.re[at] = Math.cos((2 * Math.PI * 3 * (at % 8)) / 8);
    const before = wave.re.slice();
    transform(wave);
    expect(wave.re[3]).toBeCloseTo(32, 9);
    expect(wave.re[5]).toBeCloseTo(32, 9);
    expect(wave.re[1]).toBeCloseTo(0, 9);
    transform(wave, true);
    for (let at = 0; at < 64; at++) expect(wave.re[at]).toBeCloseTo(before[at], 9);
  });
});

/** The spectrum of a picture with something at every frequency: a pseudo-random field. */
function picture(): Spectrum {
  const re = new Float64Array(SIZE * SIZE);
  let state = 7;
  for (let at = 0; at < re.length; at++) {
    state = (state * 48271) % 2147483647;
    re[at] = state / 2147483647 + 0.4 * Math.sin((at % SIZE) / 9);
  }
  return transform({ size: SIZE, re, im: new Float64Array(re.length) });
}

/** A spectrum times the phase ramp of a shift, as the published example makes its second picture. */
function shifted({ size, re, im }: Spectrum, dx: number, dy: number): Spectrum {
  const out = { size, re: new Float64Array(re.length), im: new Float64Array(re.length) };
  const frequency = (k: number): number => (k < size / 2 ? k : k - size);
  for (let row = 0; row < size; row++) {
    for (let column = 0; column < size; column++) {
      const at = row * size + column;
      const angle = (-2 * Math.PI * (frequency(column) * dx + frequency(row) * dy)) / size;
      out.re[at] = re[at] * Math.cos(angle) - im[at] * Math.sin(angle);
      out.im[at] = re[at] * Math.sin(angle) + im[at] * Math.cos(angle);
    }
  }
  return out;
}
