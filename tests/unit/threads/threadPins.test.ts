import { describe, expect, it } from 'vitest';
import { latestThread, neighbourThread, notYetThere, pinWords } from '../../../src/features/threads/threadPins.ts';
import { BRITTA, buildNote, buildThread, OTIS } from '../../support/wire.ts';

const early = buildThread({ frame: 3, notes: [buildNote({ writtenAt: '2026-11-30T10:00:00.000Z' })] });
const late = buildThread({
  frame: 9,
  notes: [
    buildNote({ writtenAt: '2026-11-29T10:00:00.000Z' }),
    buildNote({ author: BRITTA, writtenAt: '2026-11-30T12:00:00.000Z' }),
  ],
});

describe('a pin', () => {
  it('says who wrote first and how many answered', () => {
    expect(pinWords(early)).toBe('Otis');
    expect(pinWords(late)).toBe('Otis +1');
  });
});

describe('the open thread', () => {
  it('is the one in which something was said last', () => {
    expect(latestThread([early, late])).toBe(late);
    expect(latestThread([])).toBeUndefined();
  });

  it('has its neighbours along the strip and none beyond the ends', () => {
    expect(neighbourThread([early, late], early.id, 1)).toBe(late);
    expect(neighbourThread([early, late], late.id, 1)).toBeUndefined();
    expect(neighbourThread([early, late], null, 1)).toBe(early);
    expect(neighbourThread([early, late], null, -1)).toBe(late);
  });
});

describe('a note on its way', () => {
  const mine = { threadId: null, frame: 3, body: 'The hand lets go on 1003.' };

  it('steps aside once the socket brought it, before its own answer did', () => {
    expect(notYetThere([mine], [early], OTIS.id)).toEqual([]);
    expect(notYetThere([{ ...mine, threadId: early.id }], [early], OTIS.id)).toEqual([]);
  });

  it('stays while only someone else, another frame or other words are there', () => {
    expect(notYetThere([mine], [early], BRITTA.id)).toEqual([mine]);
    expect(notYetThere([{ ...mine, frame: 4 }], [early], OTIS.id)).toHaveLength(1);
    expect(notYetThere([{ ...mine, body: 'Other words.' }], [early], OTIS.id)).toHaveLength(1);
  });
});
