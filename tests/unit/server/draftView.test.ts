import { describe, expect, test } from 'vitest';
import type { Draft } from '../../../server/entities/Draft.ts';
import type { DraftPicture } from '../../../server/entities/DraftPicture.ts';
import { viewDraft } from '../../../server/services/draftView.ts';

const draft = (given: Partial<Draft> = {}): Draft => ({ grid: null, refused: [], ...given }) as Draft;

function picture(name: string, width = 960, height = 540): DraftPicture {
  return { draftId: 'd', name, file: 'f.png', format: 'png', width, height } as DraftPicture;
}

const grid = {
  columns: 4,
  rows: 1,
  cellWidth: 240,
  cellHeight: 540,
  gutterX: 0,
  gutterY: 0,
  marginX: 0,
  marginY: 0,
  count: 4,
};

describe('a draft as a whole', () => {
  test('without pictures is not ready and has nothing to say', () => {
    expect(viewDraft(draft(), [])).toMatchObject({ pictures: [], ready: false, warnings: [], firstFrame: null });
  });

  test('orders its frames by number, not by letters', () => {
    const { pictures } = viewDraft(draft(), [picture('t10.png'), picture('t9.png'), picture('t11.png')]);
    expect(pictures.map(({ number }) => number)).toEqual([9, 10, 11]);
  });

  test('keeps the size that most have and refuses the others by name', () => {
    const view = viewDraft(draft(), [picture('t1.png', 64, 36), picture('t2.png'), picture('t3.png')]);
    expect(view.pictures.map((each) => each.picture.name)).toEqual(['t2.png', 't3.png']);
    expect(view.refused).toEqual([
      { name: 't1.png', reason: '“t1.png” is 64 × 36 px; the other frames are 960 × 540 px.' },
    ]);
    expect(view).toMatchObject({ firstFrame: 2, missingFrames: [] });
  });

  test('lets the earlier picture decide between two sizes that are equally common', () => {
    const { refused } = viewDraft(draft(), [picture('t2.png', 64, 36), picture('t1.png')]);
    expect(refused.map(({ name }) => name)).toEqual(['t2.png']);
  });

  test('says a gap of one and of several in its own grammar', () => {
    const names = (...numbers: number[]) => numbers.map((number) => picture(`t${number}.png`));
    expect(viewDraft(draft(), names(1, 3)).warnings).toEqual([
      'Frame 2 is missing between the files. Add it if you can.',
    ]);
    expect(viewDraft(draft(), names(1, 4)).warnings).toEqual([
      'Frames 2–3 are missing between the files. Add them if you can.',
    ]);
  });

  test('says when two files carry the same number', () => {
    const { warnings, ready } = viewDraft(draft(), [picture('t1.png'), picture('t01.png')]);
    expect(warnings).toEqual(['More than one file carries the number 1; take out the ones that do not belong.']);
    expect(ready).toBe(true);
  });

  test('names a file without a number among numbered ones, which hides gaps', () => {
    const numbered = [picture('t1.png'), picture('t2.png'), picture('t4.png')];
    expect(viewDraft(draft(), [...numbered, picture('cover.png')]).warnings).toEqual([
      '“cover.png” carries no frame number like the rest; take it out if it does not belong.',
    ]);
    const [more] = viewDraft(draft(), [...numbered, picture('cover.png'), picture('end.png')]).warnings;
    expect(more).toBe(
      '“cover.png” and one more carry no frame number like the rest; take them out if they do not belong.',
    );
    expect(viewDraft(draft(), [picture('a.png'), picture('b.png')]).warnings).toEqual([]);
  });

  test('takes a single picture for a strip only when it is cut', () => {
    expect(viewDraft(draft(), [picture('strip 7.png')])).toMatchObject({ ready: false, firstFrame: null });
    expect(viewDraft(draft({ grid }), [picture('strip 7.png')])).toMatchObject({ ready: true, warnings: [] });
    expect(viewDraft(draft({ grid: { ...grid, count: 1 } }), [picture('strip 7.png')]).ready).toBe(false);
  });

  test('asks to look at a cut that was more guess than find', () => {
    const unsure = draft({ grid: { ...grid, confidence: 0.2 } });
    expect(viewDraft(unsure, [picture('strip.png')]).warnings).toEqual([expect.stringContaining('look at the cut')]);
  });
});
