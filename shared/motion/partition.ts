import type { Drawing } from './drawings.ts';
import { thirdDifference } from './drawings.ts';

/** A run of drawings that one simple motion explains: still, along a line, or a parabola. `lost` is one drawing off everything. */
export interface Piece {
  kind: 'rest' | 'line' | 'flight' | 'lost';
  from: number;
  to: number;
}

/** Longest piece tried; longer motions come out as several pieces of one motion, which the next step joins again. */
const LONGEST = 48;

/**
 * Optimal partitioning (Jackson et al. 2005; Bai & Perron 2003): the cut of the drawings into pieces that minimises the sum of
 * residuals over noise² plus a price per parameter, exactly, by running sums. `noise` is px per axis.
 */
export function partition(drawings: readonly Drawing[], noise: number): Piece[] {
  let pieces = cutOnce(drawings, noise);
  for (let wider = 3; wider < 40 && lostShare(pieces, drawings) > 0.25; wider *= 3)
    pieces = cutOnce(drawings, wider * noise);
  return pieces;
}

function lostShare(pieces: readonly Piece[], drawings: readonly Drawing[]): number {
  return pieces.filter((piece) => piece.kind === 'lost').length / drawings.length;
}

function cutOnce(drawings: readonly Drawing[], noise: number): Piece[] {
  const n = drawings.length;
  const s2 = noise * noise;
  const price = 1.3 * Math.log(2 * n + 4);
  const best = new Float64Array(n + 1).fill(Infinity);
  const cut = new Int32Array(n + 1);
  const kinds: Piece['kind'][] = [];
  best[0] = 0;
  for (let j = 1; j <= n; j += 1) {
    const last = drawings[j - 1]!;
    let sw = 0,
      st = 0,
      st2 = 0,
      st3 = 0,
      st4 = 0;
    let sx = 0,
      sxt = 0,
      sxt2 = 0,
      sxx = 0,
      sy = 0,
      syt = 0,
      syt2 = 0,
      syy = 0;
    for (let i = j - 1; i >= 0 && i >= j - LONGEST; i -= 1) {
      const d = drawings[i]!;
      const w = d.weight;
      const t = d.t - last.t;
      const x = d.x - last.x;
      const y = d.y - last.y;
      sw += w;
      st += w * t;
      st2 += w * t * t;
      st3 += w * t * t * t;
      st4 += w * t * t * t * t;
      sx += w * x;
      sxt += w * x * t;
      sxt2 += w * x * t * t;
      sxx += w * x * x;
      sy += w * y;
      syt += w * y * t;
      syt2 += w * y * t * t;
      syy += w * y * y;
      const count = j - i;
      let cost = Infinity;
      let kind: Piece['kind'] = 'lost';
      if (count === 1) cost = 4.5 * price;
      const restX = Math.max(0, sxx - (sx * sx) / sw);
      const restY = Math.max(0, syy - (sy * sy) / sw);
      if (count >= 2) {
        const rest = (restX + restY) / s2 + 3 * price;
        if (rest < cost) {
          cost = rest;
          kind = 'rest';
        }
      }
      if (count >= 3) {
        const stt = st2 - (st * st) / sw;
        const ctx = sxt - (st * sx) / sw;
        const cty = syt - (st * sy) / sw;
        const lineX = Math.max(0, restX - (ctx * ctx) / stt);
        const lineY = Math.max(0, restY - (cty * cty) / stt);
        const line = (lineX + lineY) / s2 + 5 * price;
        if (line < cost) {
          cost = line;
          kind = 'line';
        }
        const ctq = st3 - (st * st2) / sw;
        const cqq = st4 - (st2 * st2) / sw;
        const cqy = syt2 - (st2 * sy) / sw;
        const q = cqq - (ctq * ctq) / stt;
        const qy = cqy - (ctq * cty) / stt;
        const gain = q > 1e-9 && qy > 0 ? (qy * qy) / q : 0;
        const qx = sxt2 - (st2 * sx) / sw - (ctq * ctx) / stt;
        const eased = q > 1e-9 ? (qx * qx) / q : 0;
        const across = Math.min(lineX / s2, Math.max(0, lineX - eased) / s2 + 2 * price);
        const flight = across + Math.max(0, lineY - gain) / s2 + 6 * price;
        if (gain > 0 && flight < cost) {
          cost = flight;
          kind = 'flight';
        }
      }
      if (best[i]! + cost < best[j]!) {
        best[j] = best[i]! + cost;
        cut[j] = i;
        kinds[j] = kind;
      }
    }
  }
  const pieces: Piece[] = [];
  for (let j = n; j > 0; j = cut[j]!) pieces.unshift({ kind: kinds[j]!, from: cut[j]!, to: j - 1 });
  return pieces;
}

/** Noise per axis (px) from third differences over time: zero for anything that flies, rolls or rests; corners are few. */
export function roughNoise(drawings: readonly Drawing[]): number {
  const values: number[] = [];
  for (let i = 3; i < drawings.length; i += 1) {
    const [a, b, c, d] = [drawings[i - 3]!, drawings[i - 2]!, drawings[i - 1]!, drawings[i]!];
    if (d.t - a.t > 4 * (b.t - a.t)) continue;
    values.push(Math.abs(thirdDifference(a, b, c, d, 'x')), Math.abs(thirdDifference(a, b, c, d, 'y')));
  }
  if (values.length < 4) return 0.5;
  values.sort((p, q) => p - q);
  return values[Math.floor(values.length * 0.3)]! / 0.385;
}
