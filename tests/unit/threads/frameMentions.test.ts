import { describe, expect, it } from 'vitest';
import { frameMentions } from '../../../src/features/threads/frameMentions.ts';

const frames = (body: string) =>
  frameMentions(body, 1001, 1025).flatMap((piece) => (piece.frame === null ? [] : [piece.frame]));

describe('frames that a note names', () => {
  it('are found in the production’s numbers, also at both ends of a span', () => {
    expect(frames('Moving 1008–1012 up, and 1014.')).toEqual([1008, 1012, 1014]);
  });

  it('are only those of the strip', () => {
    expect(frames('It was 1000 on take 1, 1026 now, and 3 px off on 1009')).toEqual([1009]);
  });

  it('are not parts of other numbers', () => {
    expect(frames('1010.5 of 21010 px, shot x1010, 1010 %, v1.1010')).toEqual([1010]);
    expect(frames('1010%')).toEqual([]);
  });

  it('leave every word of the note in its place', () => {
    const body = 'On 1003, then 1004–1006.\nThanks';
    expect(
      frameMentions(body, 1001, 1025)
        .map((piece) => piece.text)
        .join(''),
    ).toBe(body);
  });

  it('are not guessed in a strip that is counted from one', () => {
    expect(frameMentions('Move it 12 px on 14', 1, 25)).toEqual([{ text: 'Move it 12 px on 14', frame: null }]);
  });
});
