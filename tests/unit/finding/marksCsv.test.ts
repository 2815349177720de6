import { describe, expect, it } from 'vitest';
import { MarksCsvError, parseMarksCsv } from '../../../shared/finding/marksCsv.ts';

describe('a CSV of marks', () => {
  it('gives one track a thing, frames ascending', () => {
    expect(parseMarksCsv('frame,x,y,radius,object\n1002,3,4,,B\n1001,1,2,9.5,A\n1001,5,6,,B\n')).toEqual([
      {
        object: 'B',
        marks: [
          { frame: 1001, x: 5, y: 6, origin: 'import' },
          { frame: 1002, x: 3, y: 4, origin: 'import' },
        ],
      },
      { object: 'A', marks: [{ frame: 1001, x: 1, y: 2, radius: 9.5, origin: 'import' }] },
    ]);
  });

  it('may have no header, other line ends, semicolons and columns in any order', () => {
    expect(parseMarksCsv('1;10;20\r\n2;11;21\r\n')[0].marks).toHaveLength(2);
    expect(parseMarksCsv('\uFEFFy,x,frame\n20,10,1')[0].marks[0]).toMatchObject({ frame: 1, x: 10, y: 20 });
  });

  it('has no mark where a row leaves x and y out', () => {
    expect(parseMarksCsv('frame,x,y\n1,5,5\n2,,\n3,6,6')[0].marks.map((mark) => mark.frame)).toEqual([1, 3]);
  });

  it.each([
    ['no rows', '', 'no rows'],
    ['only a header', 'frame,x,y\n', 'No row has a mark'],
    ['wrong columns', 'time,px,py\n1,2,3', 'time, px, py'],
    ['two columns', '1,2\n', '2 columns'],
    ['a value that is no number', 'frame,x,y\n1,NaN,3', 'Line 2 has “NaN” for x'],
    ['an infinite value', 'frame,x,y\n1,2,Infinity', 'Line 2 has “Infinity” for y'],
    ['half a frame', 'frame,x,y\n1.5,2,3', 'frame 1.5'],
    ['a frame twice', 'frame,x,y\n7,2,3\n7,2,4', 'Line 3 gives frame 7 a second mark'],
    ['a negative radius', 'frame,x,y,radius\n1,2,3,-4', 'radius below zero'],
    ['a million rows', '1,2,3\n'.repeat(1_000_000), 'the most is 100,000'],
  ])('with %s is refused with a sentence', (_, text, part) => {
    expect(() => parseMarksCsv(text)).toThrow(MarksCsvError);
    expect(() => parseMarksCsv(text)).toThrow(part);
  });
});
