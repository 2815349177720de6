import { describe, expect, it } from 'vitest';
import { frameDue, picturesAhead } from '../../../src/features/playhead/playback.ts';

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

describe('the pictures wanted next', () => {
  it('are those ahead and the one behind, inside the strip', () => {
    expect(picturesAhead(5, 25, 3)).toEqual([6, 4, 7, 8]);
    expect(picturesAhead(1, 25, 2)).toEqual([2, 3]);
    expect(picturesAhead(25, 25, 3)).toEqual([24]);
  });
});
