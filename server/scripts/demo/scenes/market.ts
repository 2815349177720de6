import { disc, figure, flecks, line, oval, rect, shape, wash } from '../shapes.ts';

function awning(x: number, y: number, wide: number, colours: [string, string]): string {
  const stripes = Array.from({ length: 6 }, (_, index) => {
    const left = x + (index * wide) / 6;
    return shape(`M${left} ${y} h${wide / 6} v44 q${-wide / 12} 18 ${-wide / 6} 0 Z`, colours[index % 2]!);
  });
  return line(`M${x + 6} ${y} V440 M${x + wide - 6} ${y} V440`, '#5a4742', 8) + stripes.join('');
}

const bulbs = (y: number) =>
  line(`M0 ${y} Q240 ${y + 54} 480 ${y + 8} T960 ${y}`, '#6b5550', 2.5) +
  Array.from({ length: 14 }, (_, index) => {
    const x = 34 + index * 69;
    const sag = y + 27 * Math.sin((x / 480) * Math.PI) * (x < 480 ? 1 : 0.6) + 8;
    return disc(x, +sag.toFixed(1), 12, '#fbe7ae', 'opacity="0.4"') + disc(x, +sag.toFixed(1), 5.5, '#fdf0c4');
  }).join('');

/** 040-0020: the floating market at dusk; an orange pays the ferryman. */
export function orangeStall(): string {
  return [
    wash('dusk', 0, 540, ['#8f7f92', '#a98f97', '#c3a49a', '#d3b79f']),
    shape('M0 330 Q160 300 330 322 T660 312 T960 322 V440 H0 Z', '#8a777f'),
    bulbs(36),
    awning(24, 190, 236, ['#dcc48c', '#f2e8d2']),
    awning(700, 206, 240, ['#7d8a68', '#ece4cc']),
    rect(0, 440, 960, 100, '#6f5a55'),
    Array.from({ length: 12 }, (_, index) =>
      rect(index * 84 - 12, 440, 80, 18, index % 2 ? '#84706a' : '#8c7771', 'rx="2"'),
    ).join(''),
    rect(36, 372, 150, 68, '#7a5f46', 'rx="4"'),
    Array.from({ length: 6 }, (_, index) => disc(56 + index * 22, 366 - (index % 2) * 5, 11, '#d98b34')).join(''),
    rect(760, 380, 130, 60, '#6a5648', 'rx="4"'),
    oval(826, 378, 52, 9, '#cdbf9b'),
    figure(214, 442, {
      coat: '#6a7358',
      apron: '#efe3c6',
      skin: '#9c6a48',
      hat: '#d9b35a',
      hand: { x: 44, y: -80 },
      height: 160,
    }),
    figure(712, 442, { coat: '#7d5560', skin: '#e0b189', hat: '#4a3d3b', hand: { x: -48, y: -82 }, height: 168 }),
    flecks(111, 220, '#fff2dc', 0.25),
  ].join('');
}

/** 040-0080: the last loaf over the rail, as the market casts off. */
export function lastLoaf(): string {
  return [
    wash('late', 0, 540, ['#6f8580', '#86988d', '#a6ab96', '#c2b895']),
    disc(172, 92, 38, '#ece3c0'),
    disc(188, 84, 34, '#728883'),
    shape('M0 356 Q200 330 430 350 T960 338 V470 H0 Z', '#718078'),
    bulbs(150),
    wash('bay', 432, 108, ['#647a74', '#53665f']),
    Array.from({ length: 12 }, (_, index) =>
      line(`M${(index * 197) % 940} ${450 + ((index * 31) % 80)} q22 -5 44 0`, '#8b9d92', 2.5),
    ).join(''),
    rect(0, 410, 268, 18, '#6b5442'),
    line('M24 428 V540 M132 428 V540 M242 428 V540', '#574334', 12),
    line('M0 356 H262 M30 356 V410 M110 356 V410 M190 356 V410 M258 356 V410', '#7c6350', 6),
    figure(150, 412, {
      coat: '#a17a4a',
      apron: '#f1e6cc',
      skin: '#d7a67c',
      hat: '#f1e6cc',
      hand: { x: 56, y: -88 },
      height: 164,
    }),
    shape('M640 430 H960 V520 H716 Q664 512 640 430 Z', '#5e4738'),
    shape('M640 430 H960 V446 H644 Z', '#c7a566'),
    awning(742, 236, 200, ['#b98d4c', '#efe5cc']),
    figure(716, 432, { coat: '#59644f', skin: '#8d5a3b', hat: '#d9c58a', hand: { x: -40, y: -74 }, height: 146 }),
    rect(800, 398, 60, 32, '#8a6a47', 'rx="3"'),
    flecks(121, 220, '#f5f3e2', 0.24),
  ].join('');
}
