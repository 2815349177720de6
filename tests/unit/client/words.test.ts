import { describe, expect, test } from 'vitest';
import { addressOf } from '../../../src/lib/call.ts';
import { ago, day } from '../../../src/lib/dateWords.ts';
import { bySequence, summarise, summarySentences } from '../../../src/lib/sheetSummary.ts';
import { buildFinding, buildShot, buildSketch, buildTake, OTIS } from '../../support/wire.ts';

describe('how long ago', () => {
  const now = Date.parse('2026-12-01T12:00:00Z');
  test.each([
    ['2026-12-01T11:59:30Z', 'just now'],
    ['2026-12-01T11:20:00Z', '40 min'],
    ['2026-12-01T10:00:00Z', '2 h'],
    ['2026-11-30T09:00:00Z', '1 d 3 h'],
    ['2026-11-29T12:00:00Z', '2 d'],
    ['2026-11-05T12:00:00Z', '5 Nov'],
    ['2025-11-05T12:00:00Z', '5 Nov 2025'],
  ])('%s reads “%s”', (at, words) => {
    expect(ago(at, now)).toBe(words);
  });

  test('a clock that runs ahead of the server reads as now', () => {
    expect(ago('2026-12-01T12:00:20Z', now)).toBe('just now');
    expect(day('2026-12-01T12:00:00Z', now)).toBe('1 Dec');
  });
});

describe('the sheet in a sentence', () => {
  const decided = (state: 'cleared' | 'another-pass' | 'waived', at: string, title?: string) =>
    buildTake({
      review: state,
      decision: { state, remark: '', by: OTIS, decidedAt: at },
      sketch: buildSketch({ findings: title ? [buildFinding({ title })] : [] }),
    });
  const shots = [
    buildShot({
      number: '010-0010',
      takes: [
        decided('another-pass', '2026-11-20T09:00:00.000Z', 'Apex sits late'),
        decided('cleared', '2026-11-22T09:00:00.000Z'),
      ],
    }),
    buildShot({ number: '010-0020', takes: [decided('waived', '2026-11-21T09:00:00.000Z', 'Hangs near the top')] }),
    buildShot({ number: '020-0010', takes: [decided('another-pass', '2026-11-23T09:00:00.000Z', 'Apex sits late')] }),
    buildShot({ number: '020-0020', takes: [buildTake()] }),
    buildShot({ number: '020-0030', takes: [buildTake()] }),
  ];

  test('counts cleared and waived as through, and says what waits', () => {
    const summary = summarise(shots);
    expect(summary).toMatchObject({ total: 5, through: 2, waiting: 2, anotherPass: 1 });
    expect(summarySentences(summary)).toEqual([
      '2 of 5 are through.',
      'Two wait for a look, one went back for another pass.',
    ]);
  });

  test('names what sends takes back most', () => {
    expect(summarise(shots).comesBack).toEqual({ title: 'Apex sits late', times: 2 });
    expect(summarise([buildShot()]).comesBack).toBeNull();
  });

  test('steps up in the order of the decisions', () => {
    expect(summarise(shots).steps).toEqual([
      { at: '2026-11-21T09:00:00.000Z', through: 1 },
      { at: '2026-11-22T09:00:00.000Z', through: 2 },
    ]);
  });

  test('says so when all are through, when one is, and when there is none', () => {
    expect(summarySentences(summarise(shots.slice(0, 2)))).toEqual(['All 2 are through.']);
    expect(summarySentences(summarise([shots[0]!, shots[3]!]))).toEqual([
      '1 of 2 is through.',
      'One waits for a look.',
    ]);
    expect(summarySentences(summarise([]))).toEqual(['No shots yet.']);
  });

  test('groups its rows by sequence with their own count', () => {
    expect(bySequence(shots).map(({ sequence, through, shots: rows }) => [sequence, through, rows.length])).toEqual([
      ['010', 2, 2],
      ['020', 0, 3],
    ]);
  });
});

describe('an address of the API', () => {
  test('is filled in and safe, and leaves out what was not asked', () => {
    expect(addressOf('/drafts/:draftId/pictures/:name', { draftId: 'd1', name: 'kite 10/a.png' })).toBe(
      '/api/drafts/d1/pictures/kite%2010%2Fa.png',
    );
    expect(
      addressOf('/productions/:slug/feed', { slug: 'yard' }, { filter: 'mine', cursor: undefined, limit: 5 }),
    ).toBe('/api/productions/yard/feed?filter=mine&limit=5');
  });
});
