import { cloud, disc, figure, flecks, line, oval, rect, shape, steadyRandom, wash } from '../shapes.ts';

/** 030-0010: the hoist; a flour sack swings off the hook and drops across to the raft. */
export function hoist(): string {
  return [
    wash('slate', 0, 540, ['#8f9a94', '#a3aca2', '#bcc0b0']),
    cloud(240, 84, 150, '#a9b1a7', 0.9),
    cloud(640, 60, 130, '#a4ada3', 0.9),
    cloud(820, 150, 110, '#b4bab0', 0.8),
    shape('M0 400 Q200 376 420 396 T960 384 V540 H0 Z', '#7e8a7c'),
    wash('tide', 424, 116, ['#74807a', '#616c66']),
    Array.from({ length: 13 }, (_, index) =>
      line(`M${(index * 173) % 940} ${440 + ((index * 37) % 90)} q24 -6 48 0`, '#93a097', 2.5),
    ).join(''),
    line('M62 540 V96 H250', '#4c3e33', 15),
    line('M62 190 L156 98', '#4c3e33', 9),
    line('M236 96 V112', '#3d332b', 4),
    disc(236, 116, 8, '#3d332b'),
    rect(0, 356, 150, 14, '#5f4c3d'),
    figure(104, 358, { coat: '#a0793c', skin: '#8d5a3b', hat: '#d9cda6', hand: { x: 42, y: -118 }, height: 142 }),
    shape('M640 470 H930 L916 498 H656 Z', '#6a5240'),
    rect(640, 456, 290, 16, '#927055'),
    line('M700 456 V472 M770 456 V472 M842 456 V472', '#6a5240', 4),
    figure(896, 458, { coat: '#6d5a63', skin: '#d7a67c', hat: '#e4d9b6', hand: { x: -50, y: -64 }, height: 138 }),
    oval(654, 442, 19, 18, '#d6c69b', 'stroke="#5a4a2c" stroke-width="2.5"'),
    flecks(81, 200, '#eef0e6', 0.28),
  ].join('');
}

/** 030-0070: rain on the flats; the boot comes out of the mud and goes over the shoulder. */
export function rainFlats(): string {
  const random = steadyRandom(91);
  const rain = Array.from({ length: 120 }, () => {
    const [x, y] = [random() * 980, random() * 470];
    return line(`M${x.toFixed(0)} ${y.toFixed(0)} l-6 20`, '#e8ece2', 1.4);
  });
  return [
    wash('rain', 0, 400, ['#7f8c86', '#93a098', '#aab3a6']),
    cloud(180, 54, 180, '#76827d', 0.9),
    cloud(560, 40, 200, '#7c8883', 0.9),
    cloud(860, 70, 150, '#76827d', 0.9),
    `<g opacity="0.55">${rain.join('')}</g>`,
    shape('M0 372 Q220 352 470 366 T960 358 V540 H0 Z', '#7d7460'),
    wash('mud', 400, 140, ['#85795f', '#6a5f49']),
    oval(280, 470, 120, 14, '#978c72'),
    oval(690, 496, 150, 15, '#978c72'),
    oval(470, 440, 70, 8, '#968a70'),
    oval(166, 448, 44, 9, '#564c39'),
    flecks(92, 160, '#4b4231', 0.35, [0, 400, 960, 140]),
    line('M760 372 V300 M760 310 h40 M788 372 V326', '#5f5646', 6),
    figure(110, 446, { coat: '#c79a3b', skin: '#e0b189', hat: '#c79a3b', hand: { x: 52, y: -46 }, height: 168 }),
    shape('M752 430 H880 L868 462 H764 Z', '#574635'),
    rect(742, 420, 148, 14, '#77614a', 'rx="4"'),
    disc(776, 466, 18, '#493b2d'),
    disc(776, 466, 7, '#8c785d'),
    disc(856, 466, 18, '#493b2d'),
    disc(856, 466, 7, '#8c785d'),
  ].join('');
}

/** 030-0120: the wind drops; a straw hat goes up and means to stay there. */
export function windyNoon(): string {
  const reeds = Array.from({ length: 44 }, (_, index) => {
    const x = (index * 67) % 980;
    return line(
      `M${x} 500 q10 ${-38 - ((index * 17) % 34)} ${22 + ((index * 11) % 18)} ${-58 - ((index * 17) % 40)}`,
      index % 3 ? '#93985f' : '#7c8350',
      4,
    );
  });
  return [
    wash('noon', 0, 420, ['#c3dccb', '#d3e4cf', '#e7ecd3']),
    cloud(210, 118, 120, '#f7f8ee', 0.95),
    cloud(640, 84, 150, '#f7f8ee', 0.95),
    cloud(880, 190, 90, '#f2f5e8', 0.9),
    line('M60 230 q50 -20 96 0 t84 4 M690 250 q50 -20 96 0 t84 4', '#b5cfbd', 4),
    shape('M0 392 Q180 352 380 382 T760 372 T960 380 V540 H0 Z', '#b9bf8c'),
    shape('M0 430 Q260 396 520 424 T960 414 V540 H0 Z', '#a5ad78'),
    reeds.join(''),
    rect(0, 486, 960, 54, '#8e9563'),
    flecks(101, 140, '#6f7749', 0.4, [0, 488, 960, 52]),
    figure(196, 490, {
      coat: '#9a6b4a',
      apron: '#f4ead2',
      skin: '#c98e63',
      hat: '#4b3a2a',
      hand: { x: 52, y: -106 },
      height: 168,
    }),
    figure(776, 490, { coat: '#6c6f52', skin: '#8d5a3b', hat: '#e2d3a0', hand: { x: -46, y: -100 }, height: 160 }),
    flecks(102, 200, '#ffffff', 0.35),
  ].join('');
}
