import { cloud, disc, figure, flecks, gradient, line, oval, rect, shape, steadyRandom, wash } from '../shapes.ts';

const loafRow = (x: number, y: number, count: number) =>
  Array.from({ length: count }, (_, index) => {
    const left = x + index * 42;
    return (
      rect(left, y - 20, 36, 20, index % 3 === 1 ? '#b7793c' : '#a7682f', 'rx="10"') +
      line(`M${left + 10} ${y - 8} l5 -8 M${left + 21} ${y - 8} l5 -8`, '#dfb478', 2.5)
    );
  }).join('');

/** 010-0020: the long table before dawn; dough crosses from the baker to the trough. */
export function kneadingTable(): string {
  return [
    wash('wall', 0, 540, ['#d9b684', '#caa06c', '#b98a5a']),
    flecks(11, 260, '#fff3d8', 0.22),
    // The window with the first light in it, beside the way the dough goes.
    rect(722, 40, 176, 116, '#7d5a3a', 'rx="6"'),
    gradient('dawn', ['#c9cfb4', '#f1ddb0', '#f6cf98']),
    rect(731, 49, 158, 98, 'url(#dawn)'),
    cloud(790, 78, 32, '#fbeed2', 0.9),
    shape('M731 126 Q772 108 812 122 T889 116 V147 H731 Z', '#93a07c'),
    rect(806, 49, 8, 98, '#7d5a3a'),
    rect(731, 94, 158, 7, '#7d5a3a'),
    rect(712, 152, 196, 11, '#6d4a2e', 'rx="3"'),
    // The oven under it.
    shape('M376 430 V292 Q376 186 486 186 Q596 186 596 292 V430 Z', '#8b6a4d'),
    shape('M420 430 V306 Q420 238 486 238 Q552 238 552 306 V430 Z', '#4f3524'),
    shape('M430 430 V350 Q446 312 466 348 Q482 294 504 346 Q524 316 542 354 V430 Z', '#e79a3a'),
    shape('M448 430 V384 Q466 352 482 380 Q500 350 522 388 V430 Z', '#f8d27a'),
    // Shelf, table, floor.
    rect(40, 128, 262, 11, '#6d4a2e'),
    loafRow(52, 128, 6),
    line('M84 139 v34 M150 139 v22 M216 139 v40', '#5a3c25', 4),
    disc(84, 184, 13, '#8c7a5c'),
    oval(150, 172, 8, 16, '#8c7a5c'),
    disc(216, 190, 15, '#76664c'),
    rect(0, 470, 960, 70, '#7a5738'),
    flecks(12, 90, '#4d3320', 0.25, [0, 476, 960, 64]),
    rect(0, 424, 960, 22, '#a9794c'),
    rect(0, 446, 960, 12, '#6d482b'),
    rect(70, 458, 26, 82, '#6d482b'),
    rect(846, 458, 26, 82, '#6d482b'),
    figure(120, 426, {
      coat: '#5f6f5a',
      apron: '#f2e7cf',
      skin: '#c98e63',
      hat: '#f6edd8',
      hand: { x: 44, y: -58 },
      height: 186,
    }),
    figure(902, 426, {
      coat: '#7e5a6b',
      apron: '#efe0bf',
      skin: '#8d5a3b',
      hat: '#d9c27a',
      hand: { x: -44, y: -44 },
      height: 160,
    }),
    shape('M744 362 H862 L848 424 H758 Z', '#5e3f27'),
    oval(803, 362, 59, 8, '#3f2918'),
    flecks(13, 80, '#fff8e8', 0.8, [180, 414, 420, 9]),
  ].join('');
}

/** 010-0040: the pantry with its tiles; the rolling pin turns once over the shelf. */
export function pantry(): string {
  const random = steadyRandom(31);
  const tiles = Array.from({ length: 7 * 14 }, (_, index) => {
    const [column, row] = [index % 14, Math.floor(index / 14)];
    const tone = ['#cdd8c0', '#c5d2b9', '#d4dec9', '#cad5bb'][Math.floor(random() * 4)]!;
    return rect(column * 70 - 10, row * 62 - 8, 67, 59, tone, 'rx="4"');
  });
  const jar = (x: number, y: number, tall: number, fill: string) =>
    rect(x - 17, y - tall, 34, tall, '#eef0e2', 'rx="7" opacity="0.95"') +
    rect(x - 14, y - tall * 0.66, 28, tall * 0.62, fill, 'rx="5"') +
    rect(x - 13, y - tall - 8, 26, 9, '#8a6b45', 'rx="2"');
  return [
    rect(0, 0, 960, 540, '#b4c2a6'),
    tiles.join(''),
    flecks(32, 160, '#ffffff', 0.3),
    rect(640, 150, 270, 12, '#7c5b39'),
    jar(676, 150, 58, '#d8a24a'),
    jar(724, 150, 44, '#a9683c'),
    jar(770, 150, 62, '#e8d8a8'),
    jar(822, 150, 48, '#8f8a56'),
    jar(872, 150, 56, '#c98d58'),
    rect(60, 96, 150, 10, '#7c5b39'),
    jar(90, 96, 46, '#8f8a56'),
    jar(136, 96, 54, '#dcb25c'),
    jar(182, 96, 40, '#a9683c'),
    rect(0, 430, 960, 110, '#8f6d4a'),
    rect(0, 424, 960, 16, '#c79b6a'),
    line('M120 470 V540 M320 470 V540 M520 470 V540 M720 470 V540', '#7a5a3b', 4),
    disc(300, 500, 5, '#d9b98c'),
    disc(700, 500, 5, '#d9b98c'),
    figure(92, 426, {
      coat: '#8a5f58',
      apron: '#f5ebd4',
      skin: '#e0b189',
      hat: '#f5ebd4',
      hand: { x: 62, y: -66 },
      height: 176,
    }),
    figure(884, 426, {
      coat: '#4f5d4a',
      apron: '#eadfc4',
      skin: '#a06c45',
      hat: '#c9a45a',
      hand: { x: -58, y: -62 },
      height: 172,
    }),
    oval(480, 424, 70, 9, '#f6ead0'),
    flecks(33, 70, '#fffaf0', 0.9, [380, 412, 210, 12]),
  ].join('');
}

/** 010-0060: the kitchen corner; an egg goes over the shoulder into the bowl. */
export function eggCorner(): string {
  const bunting = Array.from({ length: 9 }, (_, index) => {
    const x = 40 + index * 108;
    return shape(
      `M${x} ${44 + 12 * Math.sin(index * 1.3)} l34 2 l-17 34 Z`,
      ['#d9963f', '#6f8562', '#f4ecd6'][index % 3]!,
    );
  });
  return [
    wash('plaster', 0, 540, ['#c9c39a', '#bab389', '#a8a077']),
    flecks(41, 320, '#eeeacb', 0.35),
    flecks(42, 120, '#6b6644', 0.18),
    line('M0 40 Q240 74 480 46 T960 44', '#6b4630', 3),
    bunting.join(''),
    // A half door with the fog behind it.
    rect(420, 190, 150, 240, '#6f4c34'),
    rect(432, 202, 126, 110, '#d7dccb'),
    shape('M432 282 Q470 268 500 280 T558 276 V312 H432 Z', '#aeb79d'),
    rect(432, 318, 126, 112, '#7d5740'),
    rect(484, 318, 6, 112, '#6f4c34'),
    rect(0, 430, 960, 110, '#835a40'),
    Array.from({ length: 12 }, (_, index) =>
      rect(index * 84 - 20, 470, 80, 70, index % 2 ? '#94694b' : '#8b6146', 'rx="2"'),
    ).join(''),
    rect(0, 430, 960, 40, '#6d4932'),
    figure(150, 446, {
      coat: '#596650',
      apron: '#f3e8ce',
      skin: '#9c6a48',
      hat: '#f3e8ce',
      hand: { x: 36, y: -96 },
      otherHand: { x: -40, y: -70 },
      height: 190,
    }),
    figure(846, 446, {
      coat: '#a8763a',
      skin: '#d7a67c',
      hat: '#5b6b4f',
      hand: { x: -46, y: -58 },
      otherHand: { x: 30, y: -60 },
      height: 132,
    }),
    shape('M752 350 H838 Q834 392 795 392 Q756 392 752 350 Z', '#e9dfc6', 'stroke="#6d4932" stroke-width="3"'),
    line('M768 366 H822', '#b98a5a', 4),
    rect(46, 330, 62, 116, '#9a6d43', 'rx="6"'),
    line('M46 356 H108 M46 414 H108', '#6d4932', 5),
  ].join('');
}
