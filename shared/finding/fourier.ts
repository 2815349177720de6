/** A square grid of complex numbers, row by row. */
export interface Spectrum {
  size: number;
  re: Float64Array;
  im: Float64Array;
}

/**
 * Discrete Fourier transform of a square grid in place, rows then columns, by the radix-2 method (Cooley and Tukey
 * 1965). The size is a power of two; `inverse` also divides by the number of points.
 */
export function transform(grid: Spectrum, inverse = false): Spectrum {
  const { size, re, im } = grid;
  const turn = twiddles(size, inverse ? 1 : -1);
  const lineRe = new Float64Array(size);
  const lineIm = new Float64Array(size);
  const along = (start: number, step: number): void => {
    for (let k = 0; k < size; k++) {
      lineRe[k] = re[start + k * step];
      lineIm[k] = im[start + k * step];
    }
    transformLine(lineRe, lineIm, turn);
    for (let k = 0; k < size; k++) {
      re[start + k * step] = lineRe[k];
      im[start + k * step] = lineIm[k];
    }
  };
  for (let row = 0; row < size; row++) along(row * size, 1);
  for (let column = 0; column < size; column++) along(column, size);
  if (inverse) {
    const scale = 1 / (size * size);
    for (let at = 0; at < re.length; at++) {
      re[at] *= scale;
      im[at] *= scale;
    }
  }
  return grid;
}

interface Twiddles {
  cos: Float64Array;
  sin: Float64Array;
}

function twiddles(size: number, sign: number): Twiddles {
  const angle = (k: number): number => (sign * 2 * Math.PI * k) / size;
  return {
    cos: Float64Array.from({ length: size / 2 }, (_, k) => Math.cos(angle(k))),
    sin: Float64Array.from({ length: size / 2 }, (_, k) => Math.sin(angle(k))),
  };
}

function transformLine(re: Float64Array, im: Float64Array, { cos, sin }: Twiddles): void {
  const size = re.length;
  for (let k = 1, mirrored = 0; k < size; k++) {
    let bit = size >> 1;
    for (; mirrored & bit; bit >>= 1) mirrored ^= bit;
    mirrored ^= bit;
    if (k < mirrored) {
      [re[k], re[mirrored]] = [re[mirrored], re[k]];
      [im[k], im[mirrored]] = [im[mirrored], im[k]];
    }
  }
  for (let half = 1; half < size; half *= 2) {
    const stride = size / (2 * half);
    for (let start = 0; start < size; start += 2 * half) {
      for (let k = 0; k < half; k++) {
        const a = start + k;
        const b = a + half;
        const turnedRe = re[b] * cos[k * stride] - im[b] * sin[k * stride];
        const turnedIm = re[b] * sin[k * stride] + im[b] * cos[k * stride];
        re[b] = re[a] - turnedRe;
        im[b] = im[a] - turnedIm;
        re[a] += turnedRe;
        im[a] += turnedIm;
      }
    }
  }
}
