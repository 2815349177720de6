import { disc, line, oval, rect, shape } from './shapes.ts';

/** Something that flies: SVG about its own origin, and how far it reaches from it, px. */
export interface Prop {
  name: string;
  svg: string;
  reach: number;
}

const ink = (colour: string, width = 2.5) => `stroke="${colour}" stroke-width="${width}" stroke-linejoin="round"`;

/** The things of the demo production. Where the drawing's own middle is not its area's middle, `drawStrip` balances it. */
export const PROPS = {
  dough: {
    name: 'dough ball',
    reach: 24,
    svg: disc(0, 0, 20, '#fdf6e6', ink('#7a5634')) + line('M-9 -6 Q-2 -12 7 -9', '#e4cfa6', 3),
  },
  pin: {
    name: 'rolling pin',
    reach: 52,
    svg:
      rect(-46, -4, 92, 8, '#4a2c18', `rx="4" ${ink('#33200f', 2)}`) +
      rect(-31, -12, 62, 24, '#9c6234', `rx="7" ${ink('#33200f')}`) +
      line('M-22 -5 H22', '#c48a55', 3),
  },
  egg: {
    name: 'egg',
    reach: 26,
    svg:
      shape(
        'M0 -21 C 13 -21 17 -3 17 5 C 17 15 9 21 0 21 C -9 21 -17 15 -17 5 C -17 -3 -13 -21 0 -21 Z',
        '#fffaf0',
        ink('#5d3826'),
      ) + oval(-6, -4, 4, 8, '#ffffff'),
  },
  bun: {
    name: 'bun',
    reach: 27,
    svg:
      oval(0, 0, 24, 19, '#9a5320', ink('#4e2609')) +
      line('M-11 -7 Q0 -13 11 -7', '#d98f4a', 4) +
      line('M-12 5 H12', '#6d3610', 3),
  },
  roll: {
    name: 'round roll',
    reach: 24,
    svg: disc(0, 0, 20, '#a85e22', ink('#4e2609')) + line('M-10 0 H10 M0 -10 V10', '#f0c98d', 4),
  },
  float: {
    name: 'cork float',
    reach: 23,
    svg:
      disc(0, 0, 19, '#f4ead2', ink('#3c2a20')) +
      shape('M-19 0 A19 19 0 0 1 19 0 Z', '#e08a1e', ink('#3c2a20')) +
      disc(0, 0, 4, '#3c2a20'),
  },
  boot: {
    name: 'boot',
    reach: 48,
    svg:
      shape('M-16 -30 L8 -30 L8 6 Q30 8 32 20 L32 28 L-16 28 Z', '#e3ae27', ink('#4a3a10')) +
      rect(-16, -30, 24, 8, '#b98612', ink('#4a3a10')) +
      rect(-16, 22, 48, 7, '#4a3a10'),
  },
  sack: {
    name: 'flour sack',
    reach: 44,
    svg:
      shape('M-22 -20 Q0 -28 22 -20 Q32 8 26 28 Q0 36 -26 28 Q-32 8 -22 -20 Z', '#f3e7c9', ink('#5a4a2c')) +
      shape('M-10 -24 L-16 -38 L16 -38 L10 -24 Z', '#dcc894', ink('#5a4a2c')) +
      oval(0, 6, 11, 9, '#c9a85a'),
  },
  hat: {
    name: 'straw hat',
    reach: 50,
    svg:
      oval(0, 10, 42, 10, '#6b4a1c', ink('#33230b')) +
      shape('M-22 8 Q-22 -22 0 -22 Q22 -22 22 8 Q0 14 -22 8 Z', '#8a6126', ink('#33230b')) +
      shape('M-22 2 Q0 9 22 2 L22 9 Q0 15 -22 9 Z', '#f0dfae'),
  },
  orange: {
    name: 'orange',
    reach: 22,
    svg: disc(0, 0, 18, '#f0962a', ink('#6a3608')) + oval(-6, -6, 5, 4, '#ffd08a') + disc(5, -12, 3, '#5b6b2c'),
  },
  loaf: {
    name: 'loaf',
    reach: 48,
    svg:
      rect(-44, -15, 88, 30, '#c67f36', `rx="15" ${ink('#553009')}`) +
      line('M-24 8 L-16 -9 M-4 8 L4 -9 M16 8 L24 -9', '#f6dcae', 5),
  },
} satisfies Record<string, Prop>;
export type PropName = keyof typeof PROPS;
