import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { MAX_FRAMES, MAX_PICTURE_BYTES, MAX_PICTURES_PER_BATCH } from '../../../shared/api/drafts.ts';
import { gridSchema } from '../../../shared/finding/grid.ts';
import { nextBatch, sortOut } from '../../../src/features/posting/batches.ts';
import { cellsOf, firstCut, gridProblem, withField } from '../../../src/features/posting/gridEdit.ts';
import { EMPTY_POST, postFormSchema, postOf, shotOf } from '../../../src/features/posting/postValues.ts';
import { parseFrameRate } from '../../../src/lib/frameRates.ts';
import { buildShot, buildTake } from '../../support/wire.ts';

const file = (name: string, size = 1000) => ({ name, size });

describe('files on their way', () => {
  test('go in batches of as many as one request takes, and all of them go', () => {
    let queue = Array.from({ length: 48 }, (_, index) => file(`f${index}.png`));
    const sizes: number[] = [];
    while (queue.length > 0) {
      const batch = nextBatch(queue);
      sizes.push(batch.length);
      queue = queue.slice(batch.length);
    }
    expect(sizes).toEqual([MAX_PICTURES_PER_BATCH, MAX_PICTURES_PER_BATCH, MAX_PICTURES_PER_BATCH]);
  });

  test('go in smaller batches when they are big, and one by one when they are huge', () => {
    const big = Array.from({ length: 4 }, (_, index) => file(`f${index}.png`, 30 * 1024 * 1024));
    expect(nextBatch(big)).toHaveLength(2);
    expect(nextBatch([file('one.png', 200 * 1024 * 1024), file('two.png')])).toHaveLength(1);
  });

  test('are taken in the order of their numbers', () => {
    const { usable } = sortOut([file('kite_10.png'), file('kite_9.png'), file('kite_1.png')], 0);
    expect(usable.map(({ name }) => name)).toEqual(['kite_1.png', 'kite_9.png', 'kite_10.png']);
  });

  test('that cannot be used are named with the reason, and the rest is kept', () => {
    const { usable, refused } = sortOut(
      [file('a_1.png'), file('a_2.png', 0), file('a_3.png', MAX_PICTURE_BYTES + 1), file('.DS_Store')],
      0,
    );
    expect(usable.map(({ name }) => name)).toEqual(['a_1.png']);
    expect(refused.map(({ name }) => name)).toEqual(['.DS_Store', 'a_2.png', 'a_3.png']);
    expect(refused.find(({ name }) => name === 'a_2.png')?.reason).toContain('empty');
    expect(refused.find(({ name }) => name === 'a_3.png')?.reason).toContain('40 MB');
  });

  test('stop at the most frames a strip can hold, counting those that are there', () => {
    const files = Array.from({ length: 10 }, (_, index) => file(`f${index}.png`));
    const { usable, refused } = sortOut(files, MAX_FRAMES - 4);
    expect(usable).toHaveLength(4);
    expect(refused).toHaveLength(6);
    expect(refused[0]?.reason).toContain('2,000 frames');
  });
});

describe('the cut of a strip picture', () => {
  const picture = { width: 1000, height: 300 };
  const cut = {
    columns: 5,
    rows: 2,
    cellWidth: 200,
    cellHeight: 150,
    gutterX: 0,
    gutterY: 0,
    marginX: 0,
    marginY: 0,
    count: 10,
  };

  test('shares the room anew on the side that changed, and leaves the other', () => {
    const next = withField(cut, 'columns', 4, picture);
    expect(next).toMatchObject({ columns: 4, cellWidth: 250, cellHeight: 150, count: 8 });
    expect(withField(next, 'gutterX', 8, picture)).toMatchObject({ cellWidth: 244, cellHeight: 150 });
    expect(withField(next, 'marginY', 10, picture)).toMatchObject({ cellHeight: 140, cellWidth: 250 });
  });

  test('keeps a count of fewer frames than cells, as far as they fit', () => {
    const nine = withField(cut, 'count', 9, picture);
    expect(withField(nine, 'columns', 6, picture).count).toBe(9);
    expect(withField(nine, 'columns', 4, picture).count).toBe(8);
  });

  test('says what is wrong with it', () => {
    expect(gridProblem(cut, picture)).toBeNull();
    expect(gridProblem(withField(cut, 'columns', Number.NaN, picture), picture)).toBe('Write whole numbers.');
    expect(gridProblem(withField(cut, 'columns', 0, picture), picture)).toContain('1 to 500');
    expect(gridProblem(withField(cut, 'gutterX', 400, picture), picture)).toContain('No room');
    expect(gridProblem({ ...cut, count: 11 }, picture)).toContain('1 to 10 frames');
    expect(gridProblem({ ...cut, cellWidth: 201 }, picture)).toContain('beyond the picture');
  });

  test('reads its cells row by row and leaves the last ones empty', () => {
    const cells = cellsOf({ ...cut, gutterX: 4, marginX: 2, cellWidth: 190, count: 9 });
    expect(cells[1]).toEqual({ index: 1, x: 196, y: 0, used: true });
    expect(cells[5]).toMatchObject({ x: 2, y: 150 });
    expect(cells.map((cell) => cell.used)).toEqual([...Array(9).fill(true), false]);
  });

  test('that has no problem is one the server takes, whatever was changed', () => {
    const side = fc.integer({ min: 1, max: 4000 });
    const change = fc.tuple(
      fc.constantFrom(
        'columns',
        'rows',
        'gutterX',
        'gutterY',
        'marginX',
        'marginY',
        'count',
      ) as fc.Arbitrary<'columns'>,
      fc.integer({ min: -5, max: 600 }),
    );
    fc.assert(
      fc.property(side, side, fc.array(change, { maxLength: 6 }), (width, height, changes) => {
        const grid = changes.reduce(
          (have, [field, value]) => withField(have, field, value, { width, height }),
          firstCut({ width, height }),
        );
        if (gridProblem(grid, { width, height }) !== null) return;
        expect(gridSchema.safeParse(grid).success).toBe(true);
        const last = cellsOf(grid).at(-1)!;
        expect(last.x + grid.cellWidth).toBeLessThanOrEqual(width);
        expect(last.y + grid.cellHeight).toBeLessThanOrEqual(height);
      }),
    );
  });
});

describe('a frame rate', () => {
  test.each([
    ['24', 24, 1],
    ['12.5', 25, 2],
    ['24000/1001', 24000, 1001],
    // Common practice, no source: these decimals always mean the fraction over 1001.
    ['23.976', 24000, 1001],
    ['29.97', 30000, 1001],
    ['59,94', 60000, 1001],
    [' 30/2 ', 15, 1],
  ])('%s is %i over %i', (text, num, den) => {
    expect(parseFrameRate(text)).toEqual({ num, den });
  });

  test.each(['', 'fast', '0', '241', '24/0', '-24', '1e3', '24fps'])('“%s” is none', (text) => {
    expect(parseFrameRate(text)).toBeNull();
  });
});

describe('the shot of a post', () => {
  const shots = [buildShot({ number: '020-0140a', takes: [buildTake({ number: 1 }), buildTake({ number: 3 })] })];
  const errorsOf = (values: Partial<typeof EMPTY_POST>) => {
    const parsed = postFormSchema(shots).safeParse({ ...EMPTY_POST, firstFrame: '1', ...values });
    return parsed.success ? [] : parsed.error.issues.map((issue) => issue.path[0]);
  };

  test('is found however its letters are written', () => {
    expect(shotOf(shots, ' 020-0140A ')).toBe(shots[0]);
    expect(shotOf(shots, '')).toBeUndefined();
  });

  test('needs a title only when it is new', () => {
    expect(errorsOf({ shotNumber: '020-0140A' })).toEqual([]);
    expect(errorsOf({ shotNumber: '020-0150' })).toEqual(['shotTitle']);
    expect(errorsOf({ shotNumber: '020-0150', shotTitle: 'Kite' })).toEqual([]);
  });

  test('says which field is wrong', () => {
    expect(errorsOf({ shotNumber: '', shotTitle: 'Kite' })).toEqual(['shotNumber']);
    expect(errorsOf({ shotNumber: '020 0150', shotTitle: 'Kite' })).toEqual(['shotNumber']);
    expect(errorsOf({ shotNumber: '020-0150', shotTitle: 'Kite', firstFrame: 'one' })).toEqual(['firstFrame']);
    expect(errorsOf({ shotNumber: '020-0150', shotTitle: 'Kite', rate: 'other', otherRate: '0' })).toEqual([
      'otherRate',
    ]);
  });

  test('goes out with exact values', () => {
    expect(
      postOf(
        {
          ...EMPTY_POST,
          shotNumber: '020-0140A',
          shotTitle: 'left over',
          rate: '24000/1001',
          hold: '2',
          firstFrame: '1001',
          changed: ' Apex moved. ',
        },
        shots,
      ),
    ).toEqual({
      shotNumber: '020-0140a',
      shotTitle: undefined,
      fps: { num: 24000, den: 1001 },
      hold: 2,
      firstFrame: 1001,
      changed: 'Apex moved.',
      intended: '',
    });
  });
});
