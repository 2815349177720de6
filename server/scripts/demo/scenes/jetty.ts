import { cloud, disc, figure, flecks, line, oval, rect, shape, wash } from '../shapes.ts';

/** The bakery on its stilts: the house that every outdoor shot is near. */
function bakery(x: number, y: number, size: number, wall: string, roof: string): string {
  return `<g transform="translate(${x} ${y}) scale(${size})">${[
    line('M-70 0 V96 M-24 0 V104 M24 0 V104 M70 0 V96 M-70 40 L-24 78 M70 40 L24 78', '#5b4636', 7),
    rect(-92, -6, 184, 12, '#6f543e'),
    rect(-78, -92, 156, 88, wall),
    shape('M-94 -88 L0 -156 L94 -88 Z', roof),
    rect(34, -166, 20, 54, '#7d6350'),
    cloud(56, -184, 22, '#f6efe2', 0.85),
    rect(-58, -70, 34, 34, '#f5d488', 'stroke="#6f543e" stroke-width="4"'),
    rect(24, -70, 34, 34, '#f5d488', 'stroke="#6f543e" stroke-width="4"'),
    rect(-14, -62, 28, 58, '#6b4c36'),
  ].join('')}</g>`;
}

const ripples = (y: number, colour: string, seed: number) =>
  Array.from({ length: 16 }, (_, index) => {
    const x = ((index * 137 + seed * 71) % 960) - 20;
    return line(`M${x} ${y + ((index * 29 + seed * 13) % 90)} q22 -5 44 0`, colour, 2.5);
  }).join('');

function gull(x: number, y: number, size: number): string {
  return line(
    `M${x - size} ${y} q${size * 0.5} ${-size * 0.6} ${size} 0 q${size * 0.5} ${-size * 0.6} ${size} 0`,
    '#6c5b52',
    3,
  );
}

/** 020-0030: sunrise, the first bun goes from the bakery's landing to the ferry. */
export function firstFerry(): string {
  return [
    wash('sky', 0, 400, ['#e9d9c0', '#f3d5ab', '#f6c89a', '#f2b98c']),
    disc(560, 352, 74, '#fbe6b4'),
    cloud(300, 92, 92, '#f8e9d3', 0.9),
    cloud(720, 136, 70, '#f8e9d3', 0.8),
    cloud(520, 58, 46, '#fbf1e0', 0.8),
    shape('M0 352 Q160 322 320 346 T640 340 T960 334 V400 H0 Z', '#b7a28f'),
    wash('flats', 372, 168, ['#c9b294', '#a99a85', '#8c8474']),
    oval(560, 400, 150, 9, '#f9e2b4', 'opacity="0.8"'),
    ripples(392, '#e6d3b4', 3),
    gull(410, 176, 13),
    gull(452, 160, 10),
    bakery(112, 286, 0.9, '#c9b08a', '#7f6a58'),
    rect(0, 420, 262, 16, '#7b6048'),
    line('M30 436 V540 M120 436 V540 M214 436 V540', '#5b4636', 11),
    figure(196, 422, {
      coat: '#5f6a52',
      apron: '#f4ead2',
      skin: '#c98e63',
      hat: '#f4ead2',
      hand: { x: 40, y: -84 },
      height: 140,
    }),
    shape('M660 446 H934 Q922 506 870 510 H722 Q676 506 660 446 Z', '#6e4e3a'),
    shape('M660 446 H934 L930 462 H665 Z', '#d8b36a'),
    line('M900 446 V240', '#5b4636', 6),
    shape('M894 250 V410 H800 Q872 340 894 250 Z', '#efe3c8'),
    figure(820, 448, { coat: '#85604e', skin: '#8d5a3b', hat: '#4e5a48', hand: { x: -46, y: -82 }, height: 130 }),
    rect(704, 420, 40, 28, '#a27c4c', 'rx="3"'),
    flecks(51, 200, '#fffaf0', 0.28),
  ].join('');
}

/** 020-0050: fog over the boards; a roll gets away and bounces along them. */
export function fogBoards(): string {
  const boards = Array.from({ length: 17 }, (_, index) =>
    rect(index * 60 - 20, 442, 56, 26, index % 2 ? '#9b8463' : '#a68e6b', 'rx="2"'),
  );
  return [
    wash('fog', 0, 540, ['#dfe3d6', '#d3d9c9', '#c2cab6']),
    cloud(220, 120, 170, '#eceee4', 0.8),
    cloud(700, 170, 190, '#eceee4', 0.7),
    shape('M520 330 L600 262 L676 330 V392 H520 Z', '#b3bca5'),
    line('M536 392 V440 M660 392 V440', '#b3bca5', 8),
    line('M250 300 V440 M360 320 V440 M820 290 V440', '#a5ae97', 9),
    rect(0, 434, 960, 10, '#8d7758'),
    boards.join(''),
    rect(0, 466, 960, 12, '#7a6549'),
    line('M90 478 V540 M330 478 V540 M570 478 V540 M810 478 V540', '#7a6549', 14),
    wash('water', 506, 34, ['#aab59d', '#9aa58d']),
    line('M0 372 H960', '#8d7758', 4, 'opacity="0.35"'),
    figure(58, 440, {
      coat: '#8b6a4d',
      apron: '#efe6cf',
      skin: '#e0b189',
      hat: '#efe6cf',
      hand: { x: 34, y: -206 },
      height: 178,
    }),
    rect(838, 398, 96, 42, '#8f6d43', 'rx="5"'),
    line('M838 412 H934 M838 426 H934', '#6a4f2f', 3),
    flecks(61, 240, '#ffffff', 0.4),
    flecks(62, 70, '#5f4d36', 0.25, [0, 444, 960, 22]),
  ].join('');
}

/** 020-0090: evening at the slip; a cork float falls off the rack and bounces down to the boat. */
export function eveningSlip(): string {
  const nets = Array.from({ length: 9 }, (_, index) => line(`M${596 + index * 32} 150 q-14 76 6 146`, '#8d7f8d', 2));
  return [
    wash('evening', 0, 540, ['#b9aec0', '#cdb7bf', '#dcc4b8', '#e2cfb6']),
    cloud(210, 84, 96, '#d9cbd2', 0.8),
    cloud(520, 118, 70, '#e3d3d3', 0.8),
    disc(846, 96, 34, '#f3e4c4'),
    shape('M0 376 Q240 344 480 366 T960 356 V452 H0 Z', '#9a8d93'),
    line('M584 150 H880', '#6b5b60', 6),
    nets.join(''),
    line('M584 150 V452 M880 150 V452', '#6b5b60', 9),
    rect(0, 452, 960, 88, '#7f6c66'),
    Array.from({ length: 13 }, (_, index) =>
      rect(index * 78 - 30, 452, 74, 20, index % 2 ? '#94807a' : '#9b8780', 'rx="2"'),
    ).join(''),
    flecks(71, 120, '#5a4a48', 0.3, [0, 454, 960, 80]),
    rect(24, 196, 128, 10, '#5d4c4c'),
    line('M40 206 V452 M136 206 V452', '#5d4c4c', 9),
    disc(58, 176, 19, '#cfc2b2', 'stroke="#5d4c4c" stroke-width="2.5"'),
    disc(58, 232, 15, '#a99a90', 'stroke="#5d4c4c" stroke-width="2.5"'),
    rect(112, 380, 60, 72, '#8b6c58', 'rx="5"'),
    line('M112 402 H172 M112 430 H172', '#5d4c4c', 4),
    figure(930, 454, { coat: '#65705c', skin: '#a06c45', hat: '#d6b35c', hand: { x: -44, y: -52 }, height: 150 }),
    flecks(72, 220, '#fff6ea', 0.25),
  ].join('');
}
