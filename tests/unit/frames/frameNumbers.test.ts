import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { byName, readFrameNumbers, sayNumbers } from '../../../shared/frames/frameNumbers.ts';

describe('frame numbers in file names', () => {
  test('are the last group of digits, padded or not', () => {
    expect(readFrameNumbers(['toss_0998.png', 'toss_0999.png', 'toss_1000.png'])).toEqual({
      numbers: [998, 999, 1000],
      firstFrame: 998,
      missing: [],
      repeated: [],
    });
    expect(readFrameNumbers(['9.png', '10.png', '11.png']).numbers).toEqual([9, 10, 11]);
  });

  test('are not the version or shot number that every name carries', () => {
    expect(readFrameNumbers(['010-0020.1001.v2.png', '010-0020.1002.v2.png']).numbers).toEqual([1001, 1002]);
  });

  test('are not the digit of the ending', () => {
    expect(readFrameNumbers(['a7.mp3', 'a8.mp3']).numbers).toEqual([7, 8]);
  });

  test('show their gaps', () => {
    expect(readFrameNumbers(['a1.png', 'a2.png', 'a5.png', 'a7.png']).missing).toEqual([3, 4, 6]);
  });

  test('that two files share are named, and the strip then has no first frame', () => {
    expect(readFrameNumbers(['a1.png', 'a01.png', 'a2.png'])).toMatchObject({ firstFrame: null, repeated: [1] });
  });

  test('may be absent', () => {
    expect(readFrameNumbers(['rise.png', 'apex.png'])).toEqual({
      numbers: [null, null],
      firstFrame: null,
      missing: [],
      repeated: [],
    });
    expect(readFrameNumbers([])).toEqual({ numbers: [], firstFrame: null, missing: [], repeated: [] });
  });

  test('are absent from a name of another pattern than the rest', () => {
    expect(readFrameNumbers(['a1.png', 'a2.png', 'cover 3 of 9.png'])).toMatchObject({
      numbers: [1, 2, null],
      firstFrame: null,
    });
  });

  test('that leap by thousands count something else', () => {
    expect(readFrameNumbers(['20260101120000.png', '20260101120405.png', '20260301120405.png'])).toMatchObject({
      numbers: [null, null, null],
      firstFrame: null,
      missing: [],
    });
  });

  test('come back from any numbering, whatever the padding and the order', () => {
    fc.assert(
      fc.property(
        fc.uniqueArray(fc.integer({ min: 0, max: 900 }), { minLength: 2, maxLength: 40 }),
        fc.integer({ min: 0, max: 6 }),
        (frames, padding) => {
          const names = frames.map((frame) => `shot 12_${String(frame).padStart(padding, '0')}.webp`);
          const read = readFrameNumbers(names);
          expect(read.numbers).toEqual(frames);
          expect(read.firstFrame).toBe(Math.min(...frames));
          expect(read.missing.length + frames.length).toBe(Math.max(...frames) - Math.min(...frames) + 1);
        },
      ),
    );
  });
});

describe('names', () => {
  test('stand in natural order', () => {
    expect(['f10.png', 'f9.png', 'F1.png', 'f09.png'].sort(byName)).toEqual(['F1.png', 'f09.png', 'f9.png', 'f10.png']);
  });
});

describe('numbers as words', () => {
  test('put runs together', () => {
    expect(sayNumbers([3, 5, 6, 7, 10])).toBe('3, 5–7, 10');
    expect(sayNumbers([])).toBe('');
  });
});
