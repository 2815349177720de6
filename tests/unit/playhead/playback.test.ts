import { describe, expect, it } from 'vitest';
import { frameDue } from '../../../src/features/playhead/playback.ts';

describe('the frame that is due', () => {
  it('follows the clock at the exact rate', () => {
    const film = { num: 24000, den: 1001 };
    expect(frameDue(1, 0, film, 1000)).toBe(1);
    expect(frameDue(1, 1001, film, 1000)).toBe(25);
    expect(frameDue(1, 41.7, film, 1000)).toBe(1);
    expect(frameDue(1, 41.75, film, 1000)).toBe(2);
  });

  it('leaves frames out on a slow screen and never falls behind', () => {
    expect(frameDue(5, 500, { num: 24, den: 1 }, 100)).toBe(17);
  });

  it('goes round', () => {
    expect(frameDue(24, 100, { num: 24, den: 1 }, 25)).toBe(1);
  });
});
