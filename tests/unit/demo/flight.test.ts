import { describe, expect, it } from 'vitest';
import { bouncePath, contactsOf, onTwos, tossPath, type Toss } from '../../../server/scripts/demo/flight.ts';

const toss: Toss = {
  from: { x: 100, y: 400 },
  to: { x: 700, y: 400 },
  takeOff: 4,
  airTime: 20,
  gravity: 5,
  frames: 28,
};
const steps = (values: number[]) => values.slice(1).map((value, index) => value - values[index]!);

describe('a drawn toss', () => {
  it('rests, flies for the air time and rests where it lands', () => {
    const path = tossPath(toss);
    expect(path).toHaveLength(28);
    expect(path.slice(0, 4)).toEqual(Array(4).fill(toss.from));
    expect(path.slice(23)).toEqual(Array(5).fill(toss.to));
  });

  it('falls with its gravity on every frame in the air and keeps its speed across', () => {
    const air = tossPath(toss).slice(3, 24);
    const bends = steps(steps(air.map((place) => place.y)));
    for (const bend of bends) expect(bend).toBeCloseTo(5, 9);
    for (const step of steps(air.map((place) => place.x))) expect(step).toBeCloseTo(30, 9);
  });

  it('puts a late apex where it was asked to be, at the height of the true arc', () => {
    const path = tossPath({ ...toss, fault: { kind: 'apex-off-centre', riseShare: 0.7 } });
    expect(path[17]!.y).toBeCloseTo(400 - (5 * 400) / 8, 9);
    expect(Math.min(...path.map((place) => place.y))).toBe(path[17]!.y);
  });

  it('moves one popped drawing and no other', () => {
    const [right, popped] = [tossPath(toss), tossPath({ ...toss, fault: { kind: 'pop', frame: 11, dx: 6, dy: -20 } })];
    const moved = right.flatMap((place, index) => (place.y === popped[index]!.y ? [] : [index + 1]));
    expect(moved).toEqual([11]);
  });

  it('shows a held drawing twice and then goes on in time', () => {
    const [right, held] = [tossPath(toss), tossPath({ ...toss, fault: { kind: 'held', frame: 9 } })];
    expect(held[8]).toEqual(held[7]);
    expect(held[9]).toEqual(right[9]);
  });
});

describe('drawn bounces', () => {
  const bounces = {
    from: { x: 50, y: 200 },
    takeOff: 3,
    groundY: 400,
    across: 12,
    gravity: [4, 4, 2],
    rebounds: [128, 64],
    frames: 46,
  };

  it('touch the ground when the fall says so and reach the heights they were given', () => {
    expect(contactsOf(bounces)).toEqual([13, 29, 45]);
    const path = bouncePath(bounces);
    expect(path[12]!.y).toBe(400);
    expect(path[20]!.y).toBeCloseTo(400 - 128, 9);
    expect(path[36]!.y).toBeCloseTo(400 - 64, 9);
  });
});

it('shows every drawing for two frames on twos', () => {
  const path = onTwos(tossPath(toss));
  for (let index = 0; index < path.length; index += 2) expect(path[index + 1]).toEqual(path[index]);
});
