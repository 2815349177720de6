import { describe, expect, it } from 'vitest';
import { findMix } from '../../../shared/motion/mix.ts';
import type { Mark } from '../../../shared/reading/document.ts';
import { normalFrom, onHold, readMarks, throwMarks } from './factories.ts';

const plain = { takeOff: 4, landing: 36, frames: 40, height: 220, speed: 14 };

/** A throw with the frames that `onTwos` names drawn on twos (from odd frames), each frame with noise of its own. */
function mixedMarks(onTwos: (frame: number) => boolean, noise: number, seed: number, speed = plain.speed): Mark[] {
  const normal = normalFrom(seed);
  const places = throwMarks({ ...plain, speed });
  return places.map((mark) => {
    const shown = onTwos(mark.frame) && mark.frame % 2 === 0 ? places[mark.frame - 2]! : mark;
    return { ...mark, x: shown.x + noise * normal(), y: shown.y + noise * normal() };
  });
}

describe('a passage on ones beside one on twos, when nobody told', () => {
  const cases: [string, (frame: number) => boolean, number, number][] = [
    ['twos first', (frame) => frame < 20, 0.3, 14],
    ['ones first', (frame) => frame >= 20, 0.3, 14],
    ['twos between ones', (frame) => frame >= 11 && frame < 29, 0.3, 14],
    ['with noise of 0.8 px', (frame) => frame < 20, 0.8, 14],
    ['straight up and down', (frame) => frame >= 22, 0.2, 0],
  ];
  it.each(cases)('%s: is said as a caution and gives no finding', (_, onTwos, noise, speed) => {
    for (let seed = 1; seed <= 5; seed += 1) {
      const reading = readMarks(mixedMarks(onTwos, noise, seed, speed), { hold: undefined });
      expect(reading.source.hold).toBe('mixed');
      expect(reading.cautions.join(' ')).toContain('Ones and twos are mixed');
      expect(reading.findings).toEqual([]);
    }
  });
  it('is read on its drawings alone, at the frames on which they appear', () => {
    const { source } = readMarks(
      mixedMarks((frame) => frame >= 9 && frame < 21, 0.2, 1),
      { hold: undefined },
    );
    expect(source.exposure).not.toContain(12);
    expect(source.exposure).toContain(13);
    expect(source.exposure).toContain(24);
  });
});

describe('what is no mix', () => {
  it('a throw on ones, on twos or on threes throughout', () => {
    for (let seed = 1; seed <= 30; seed += 1) {
      const marks = throwMarks({ ...plain, noise: 0.8, seed });
      expect(findMix(marks)).toBeNull();
      expect(findMix(onHold(marks, 2))).toBeNull();
      expect(findMix(onHold(marks, 3))).toBeNull();
    }
  });
  it('one drawing shown again amid ones, which stays a fault', () => {
    const clean = throwMarks({ ...plain, noise: 0.2 });
    const marks = clean.map((mark, i) => (i === 9 ? { ...mark, x: clean[8]!.x, y: clean[8]!.y } : mark));
    const reading = readMarks(marks, { hold: undefined });
    expect(reading.source.hold).toBe(1);
    expect(reading.findings).toMatchObject([{ kind: 'held-frame', fromFrame: 10 }]);
  });
});
