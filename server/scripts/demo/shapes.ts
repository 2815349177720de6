import type { Point } from '../../../shared/reading/document.ts';

/** Pieces of SVG text. Lengths in px of the picture, colours as CSS. */
export const rect = (x: number, y: number, width: number, height: number, fill: string, extra = '') =>
  `<rect x="${x}" y="${y}" width="${width}" height="${height}" fill="${fill}" ${extra}/>`;

export const disc = (x: number, y: number, radius: number, fill: string, extra = '') =>
  `<circle cx="${x}" cy="${y}" r="${radius}" fill="${fill}" ${extra}/>`;

export const oval = (x: number, y: number, rx: number, ry: number, fill: string, extra = '') =>
  `<ellipse cx="${x}" cy="${y}" rx="${rx}" ry="${ry}" fill="${fill}" ${extra}/>`;

export const shape = (d: string, fill: string, extra = '') => `<path d="${d}" fill="${fill}" ${extra}/>`;

export const line = (d: string, stroke: string, width: number, extra = '') =>
  `<path d="${d}" fill="none" stroke="${stroke}" stroke-width="${width}" stroke-linecap="round" stroke-linejoin="round" ${extra}/>`;

/** A gradient from top to bottom; fill with `url(#id)`. */
export function gradient(id: string, stops: string[]): string {
  const parts = stops.map((colour, index) => `<stop offset="${index / (stops.length - 1)}" stop-color="${colour}"/>`);
  return `<defs><linearGradient id="${id}" x1="0" y1="0" x2="0" y2="1">${parts.join('')}</linearGradient></defs>`;
}

/** A band across the whole picture that goes from one colour to the next, top to bottom. */
export function wash(id: string, y: number, height: number, stops: string[]): string {
  return gradient(id, stops) + rect(0, y, 960, height, `url(#${id})`);
}

/** A steady stream of numbers between 0 and 1, so that a scene is drawn the same every time (mulberry32, public domain). */
export function steadyRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
}

/** Flecks of paint over a box, like the tooth of the paper. */
export function flecks(seed: number, count: number, colour: string, opacity: number, box = [0, 0, 960, 540]): string {
  const random = steadyRandom(seed);
  const [left, top, width, height] = box as [number, number, number, number];
  const dots = Array.from({ length: count }, () => {
    const x = left + random() * width;
    const y = top + random() * height;
    return oval(+x.toFixed(1), +y.toFixed(1), +(0.6 + random() * 2.4).toFixed(1), +(0.5 + random()).toFixed(1), colour);
  });
  return `<g opacity="${opacity}">${dots.join('')}</g>`;
}

export function cloud(x: number, y: number, size: number, fill: string, opacity = 1): string {
  return `<g opacity="${opacity}">${oval(x, y, size, size * 0.24, fill)}${oval(x - size * 0.35, y - size * 0.14, size * 0.42, size * 0.24, fill)}${oval(x + size * 0.22, y - size * 0.2, size * 0.5, size * 0.3, fill)}</g>`;
}

export interface FigureLook {
  coat: string;
  apron?: string;
  skin: string;
  hat: string;
  /** Where the hand is, from the feet, px. */
  hand: Point;
  /** The other hand; left out: at the side. */
  otherHand?: Point;
  height?: number;
}

/** A person of simple shapes standing at (x, y); drawn still, so that only the thing flies. */
export function figure(x: number, y: number, look: FigureLook): string {
  const tall = look.height ?? 150;
  const shoulder = -tall * 0.66;
  const arm = (to: Point) =>
    line(`M0 ${shoulder + 6} Q ${to.x * 0.35} ${(shoulder + to.y) / 2 + 14} ${to.x} ${to.y}`, look.coat, tall * 0.105) +
    disc(to.x, to.y, tall * 0.058, look.skin);
  const wide = tall * 0.19;
  const body = shape(
    `M${-wide * 0.7} ${shoulder} Q 0 ${shoulder - 14} ${wide * 0.7} ${shoulder} L ${wide * 1.15} -8 Q 0 4 ${-wide * 1.15} -8 Z`,
    look.coat,
  );
  const apron = look.apron
    ? shape(
        `M${-wide * 0.5} ${shoulder * 0.72} L ${wide * 0.5} ${shoulder * 0.72} L ${wide * 0.85} -14 Q 0 -6 ${-wide * 0.85} -14 Z`,
        look.apron,
      )
    : '';
  const head = disc(0, shoulder - tall * 0.155, tall * 0.115, look.skin);
  const side = Math.sign(look.hand.x) || 1;
  const eyes = [0.025, 0.075]
    .map((out) => disc(side * tall * out, shoulder - tall * 0.15, tall * 0.0125, '#2d2622'))
    .join('');
  const cap = shape(
    `M${-tall * 0.125} ${shoulder - tall * 0.18} Q ${-tall * 0.13} ${shoulder - tall * 0.34} 0 ${shoulder - tall * 0.33} Q ${tall * 0.13} ${shoulder - tall * 0.34} ${tall * 0.125} ${shoulder - tall * 0.18} Z`,
    look.hat,
  );
  const boots = rect(-wide * 0.75, -10, wide * 0.6, 10, '#3d352f') + rect(wide * 0.15, -10, wide * 0.6, 10, '#3d352f');
  const other = look.otherHand ?? { x: -wide * 0.9, y: shoulder * 0.42 };
  return `<g transform="translate(${x} ${y})">${oval(0, 0, wide * 1.5, 5, '#00000022')}${arm(other)}${boots}${body}${apron}${head}${eyes}${cap}${arm(look.hand)}</g>`;
}
