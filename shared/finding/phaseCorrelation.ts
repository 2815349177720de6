import { type Spectrum, transform } from './fourier.ts';

/** A grey picture as numbers. */
export interface Grey {
  width: number;
  height: number;
  data: Float32Array;
}

export interface Shift {
  x: number;
  y: number;
  /** Height of the correlation's peak over its spread: under about 8 the two pictures share too little. */
  clarity: number;
}

/**
 * Spectrum of a grey picture for phase correlation: its mean taken off, faded out towards the edges (Hann), padded to a
 * square power of two.
 */
export function spectrumOf(grey: Grey, size: number): Spectrum {
  const re = new Float64Array(size * size);
  const { width, height, data } = grey;
  let mean = 0;
  for (const value of data) mean += value;
  mean /= data.length;
  for (let y = 0; y < height; y++) {
    const fadeY = 0.5 - 0.5 * Math.cos((2 * Math.PI * (y + 0.5)) / height);
    for (let x = 0; x < width; x++) {
      const fadeX = 0.5 - 0.5 * Math.cos((2 * Math.PI * (x + 0.5)) / width);
      re[y * size + x] = (data[y * width + x] - mean) * fadeX * fadeY;
    }
  }
  return transform({ size, re, im: new Float64Array(size * size) });
}

/**
 * The shift of `moved` against `reference`, px: what lies at (x, y) in the reference lies at (x, y) + shift in the other.
 * The whole-pixel peak of the phase correlation is refined with a matrix Fourier transform around it (Guizar-Sicairos,
 * Thurman and Fienup 2008, Optics Letters 33:156).
 * @param upsampling steps per px of the refinement; 1 gives whole pixels
 */
export function phaseShift(reference: Spectrum, moved: Spectrum, upsampling = 1): Shift {
  const cross = crossPower(reference, moved);
  const correlation = transform({ size: cross.size, re: cross.re.slice(), im: cross.im.slice() }, true);
  const { size } = cross;
  let peak = 0;
  let sum = 0;
  for (let at = 0; at < correlation.re.length; at++) {
    if (correlation.re[at] > correlation.re[peak]) peak = at;
    sum += correlation.re[at] ** 2;
  }
  const wrap = (value: number): number => (value > size / 2 ? value - size : value);
  const x = wrap(peak % size);
  const y = wrap(Math.floor(peak / size));
  const clarity = correlation.re[peak] / Math.sqrt(sum / correlation.re.length);
  if (upsampling <= 1) return { x, y, clarity };
  return { ...refine(cross, x, y, upsampling), clarity };
}

/** Cross power of two spectra with every frequency at weight one, so that only the phase counts. */
function crossPower(a: Spectrum, b: Spectrum): Spectrum {
  const re = new Float64Array(a.re.length);
  const im = new Float64Array(a.re.length);
  let strongest = 0;
  for (let at = 0; at < re.length; at++) {
    re[at] = b.re[at] * a.re[at] + b.im[at] * a.im[at];
    im[at] = b.im[at] * a.re[at] - b.re[at] * a.im[at];
    strongest = Math.max(strongest, Math.hypot(re[at], im[at]));
  }
  // Frequencies that the picture hardly has carry no phase worth counting.
  const floor = 1e-7 * strongest;
  for (let at = 0; at < re.length; at++) {
    const length = Math.hypot(re[at], im[at]) + floor;
    re[at] /= length;
    im[at] /= length;
  }
  return { size: a.size, re, im };
}

function refine(cross: Spectrum, x: number, y: number, upsampling: number): { x: number; y: number } {
  const { size } = cross;
  const count = Math.ceil(1.5 * upsampling);
  const places = (middle: number): number[] =>
    Array.from({ length: 2 * count + 1 }, (_, k) => middle + (k - count) / upsampling);
  const frequency = (k: number): number => (k < size / 2 ? k : k - size);
  const xs = places(x);
  const ys = places(y);
  const rows = xs.map((place) => {
    const re = new Float64Array(size);
    const im = new Float64Array(size);
    for (let column = 0; column < size; column++) {
      const angle = (2 * Math.PI * frequency(column) * place) / size;
      const cos = Math.cos(angle);
      const sin = Math.sin(angle);
      for (let row = 0; row < size; row++) {
        const at = row * size + column;
        re[row] += cross.re[at] * cos - cross.im[at] * sin;
        im[row] += cross.re[at] * sin + cross.im[at] * cos;
      }
    }
    return { re, im };
  });
  let best = { x, y, value: Number.NEGATIVE_INFINITY };
  for (const [k, line] of rows.entries()) {
    for (const place of ys) {
      let value = 0;
      for (let row = 0; row < size; row++) {
        const angle = (2 * Math.PI * frequency(row) * place) / size;
        value += line.re[row] * Math.cos(angle) - line.im[row] * Math.sin(angle);
      }
      if (value > best.value) best = { x: xs[k], y: place, value };
    }
  }
  return { x: best.x, y: best.y };
}
