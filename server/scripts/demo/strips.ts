import type { FrameRate, Hold, Point } from '../../../shared/reading/document.ts';
import type { FindingKind } from '../../../shared/reading/kinds.ts';
import type { StripDrawing } from './drawStrip.ts';
import { bouncePath, onTwos, type PathFault, tossPath, type Toss } from './flight.ts';
import { PROPS, type PropName } from './props.ts';
import { hoist, rainFlats, windyNoon } from './scenes/flats.ts';
import { eveningSlip, firstFerry, fogBoards } from './scenes/jetty.ts';
import { eggCorner, kneadingTable, pantry } from './scenes/kitchen.ts';
import { lastLoaf, orangeStall } from './scenes/market.ts';

/** One drawn take of the demo production and what is true of it. */
export interface DemoStrip extends StripDrawing {
  fps: FrameRate;
  hold: Hold;
  /** The one thing that is off, as an animator would name it; null when it is right. */
  fault: FindingKind | null;
  /** Spans in the air, the drop of a bounce included. */
  flights: number;
}

const FILM: FrameRate = { num: 24, den: 1 };
const BROADCAST: FrameRate = { num: 25, den: 1 };

type Look = Pick<StripDrawing, 'scene' | 'format' | 'firstFrame' | 'prefix'> & { prop: PropName };

function strip(look: Look, path: Point[], fault: FindingKind | null, more: Partial<DemoStrip> = {}): DemoStrip {
  return { fps: FILM, hold: 1, flights: 1, fault, ...look, prop: PROPS[look.prop], path, ...more };
}

/** Degrees on each frame of a thing that turns `times` whole times between take-off and landing. */
function turning(toss: Toss, times: number): number[] {
  return Array.from({ length: toss.frames }, (_, index) => {
    const share = Math.min(Math.max((index + 1 - toss.takeOff) / toss.airTime, 0), 1);
    return 360 * times * share;
  });
}

const withFault = (toss: Toss, fault: PathFault): Point[] => tossPath({ ...toss, fault });

const dough: Look = { scene: kneadingTable(), prop: 'dough', format: 'jpeg', firstFrame: 1001, prefix: '010-0020' };
const doughToss: Toss = {
  from: { x: 172, y: 346 },
  to: { x: 803, y: 346 },
  takeOff: 4,
  airTime: 20.4,
  gravity: 4.6,
  frames: 28,
};

const pin: Look = { scene: pantry(), prop: 'pin', format: 'png', firstFrame: 1001, prefix: '010-0040' };
const pinToss: Toss = {
  from: { x: 168, y: 348 },
  to: { x: 812, y: 350 },
  takeOff: 4,
  airTime: 19.3,
  gravity: 5.2,
  frames: 27,
};

const egg: Look = { scene: eggCorner(), prop: 'egg', format: 'jpeg', firstFrame: 1001, prefix: '010-0060' };
const eggToss: Toss = {
  from: { x: 192, y: 329 },
  to: { x: 795, y: 329 },
  takeOff: 4,
  airTime: 20.6,
  gravity: 4.4,
  frames: 28,
};

const bun: Look = { scene: firstFerry(), prop: 'bun', format: 'jpeg', firstFrame: 1009, prefix: '020-0030' };
const bunToss: Toss = {
  from: { x: 244, y: 318 },
  to: { x: 766, y: 346 },
  takeOff: 4,
  airTime: 19.6,
  gravity: 4.8,
  frames: 27,
};

const roll: Look = { scene: fogBoards(), prop: 'roll', format: 'webp', firstFrame: 1001, prefix: '020-0050' };
const rollStart = { from: { x: 98, y: 214 }, takeOff: 4, groundY: 414, gravity: [4, 4, 4] };

const float: Look = { scene: eveningSlip(), prop: 'float', format: 'jpeg', firstFrame: 1001, prefix: '020-0090' };
const sack: Look = { scene: hoist(), prop: 'sack', format: 'jpeg', firstFrame: 1001, prefix: '030-0010' };
const sackToss: Toss = {
  from: { x: 172, y: 236 },
  to: { x: 764, y: 420 },
  takeOff: 5,
  airTime: 22,
  gravity: 3,
  frames: 32,
};

const boot: Look = { scene: rainFlats(), prop: 'boot', format: 'jpeg', firstFrame: 1017, prefix: '030-0070' };
const bootToss: Toss = {
  from: { x: 178, y: 374 },
  to: { x: 814, y: 390 },
  takeOff: 4,
  airTime: 21.2,
  gravity: 4.4,
  frames: 29,
};

const hat: Look = { scene: windyNoon(), prop: 'hat', format: 'jpeg', firstFrame: 1001, prefix: '030-0120' };
const hatToss: Toss = {
  from: { x: 256, y: 366 },
  to: { x: 722, y: 366 },
  takeOff: 4,
  airTime: 24.3,
  gravity: 3.6,
  frames: 32,
};

const orange: Look = { scene: orangeStall(), prop: 'orange', format: 'jpeg', firstFrame: 1001, prefix: '040-0020' };
const orangeToss: Toss = {
  from: { x: 264, y: 340 },
  to: { x: 658, y: 340 },
  takeOff: 4,
  airTime: 20.2,
  gravity: 4.9,
  frames: 28,
};

const loaf: Look = { scene: lastLoaf(), prop: 'loaf', format: 'jpeg', firstFrame: 1001, prefix: '040-0080' };
const loafToss: Toss = {
  from: { x: 222, y: 305 },
  to: { x: 664, y: 340 },
  takeOff: 4,
  airTime: 19.4,
  gravity: 4.9,
  frames: 27,
};

/** Every strip of the demo production, by shot and take: `010-0020/1`. */
export const DEMO_STRIPS = {
  '010-0020/1': strip(dough, withFault(doughToss, { kind: 'exponent', p: 1.25 }), 'too-straight'),
  '010-0020/2': strip(dough, withFault(doughToss, { kind: 'exponent', p: 1.74 }), 'too-straight'),
  '010-0020/3': strip(dough, tossPath(doughToss), null),
  '010-0040/1': strip(pin, tossPath(pinToss), null, { turns: turning(pinToss, 1) }),
  '010-0060/1': strip(egg, withFault(eggToss, { kind: 'apex-off-centre', riseShare: 0.66 }), 'apex-off-centre'),
  '010-0060/2': strip(egg, withFault(eggToss, { kind: 'apex-off-centre', riseShare: 0.56 }), 'apex-off-centre'),
  '020-0030/1': strip(bun, withFault(bunToss, { kind: 'slow-out', strength: 0.32 }), 'across-uneven'),
  '020-0030/2': strip(bun, tossPath(bunToss), null),
  '020-0050/1': strip(
    roll,
    bouncePath({ ...rollStart, across: 17, rebounds: [104, 142], frames: 49 }),
    'bounce-gains',
    { flights: 3 },
  ),
  '020-0050/2': strip(roll, bouncePath({ ...rollStart, across: 18.85, rebounds: [124, 77], frames: 46 }), null, {
    flights: 3,
  }),
  '020-0090/1': strip(
    float,
    bouncePath({
      from: { x: 146, y: 177 },
      takeOff: 3,
      groundY: 433,
      gravity: [4.6, 4.6, 2.85],
      across: 16,
      rebounds: [165, 105],
      frames: 51,
    }),
    'gravity-changes',
    { flights: 3 },
  ),
  '030-0010/1': strip(sack, onTwos(tossPath(sackToss)), null, { hold: 2 }),
  '030-0070/1': strip(boot, withFault(bootToss, { kind: 'pop', frame: 12, dx: 4, dy: -12 }), 'pop', {
    turns: turning(bootToss, 1),
  }),
  '030-0120/1': strip(hat, withFault(hatToss, { kind: 'exponent', p: 3 }), 'hang'),
  '040-0020/1': strip(orange, withFault(orangeToss, { kind: 'held', frame: 9 }), 'held-frame'),
  '040-0020/2': strip(orange, tossPath(orangeToss), null),
  '040-0080/1': strip(loaf, tossPath(loafToss), null, { fps: BROADCAST, turns: turning(loafToss, 1) }),
} satisfies Record<string, DemoStrip>;
export type DemoStripId = keyof typeof DEMO_STRIPS;
