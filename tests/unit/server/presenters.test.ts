import { describe, expect, test } from 'vitest';
import type { Note } from '../../../server/entities/Note.ts';
import type { Take } from '../../../server/entities/Take.ts';
import type { TakeStamp } from '../../../server/entities/TakeStamp.ts';
import type { User } from '../../../server/entities/User.ts';
import { presentFeedCard } from '../../../server/presenters/feed.presenter.ts';
import { presentPerson } from '../../../server/presenters/people.presenter.ts';
import { presentSketch } from '../../../server/presenters/sketch.presenter.ts';
import { presentStampBoard } from '../../../server/presenters/stamps.presenter.ts';
import type { Reading } from '../../../shared/reading/document.ts';
import { buildFinding, buildReading } from '../../support/readings.ts';

const person = (id: string) =>
  ({ id, name: `Name ${id}`, initials: 'N', email: 'a@b.test', passwordHash: 'h' }) as User;

test('a person goes out without address and password', () => {
  expect(presentPerson(person('1'))).toEqual({ id: '1', name: 'Name 1', initials: 'N' });
});

test('a stamp board lists kinds in the order they were first used', () => {
  const stamp = (kind: TakeStamp['kind'], who: string, seq: number) => ({ kind, seq, user: person(who) }) as TakeStamp;
  const stamps = [stamp('lovely', 'b', 9), stamp('agree', 'a', 7), stamp('lovely', 'a', 3)];
  const board = presentStampBoard(9, stamps);
  expect(board.stamps.map(({ kind, people }) => [kind, people.map(({ id }) => id)])).toEqual([
    ['lovely', ['a', 'b']],
    ['agree', ['a']],
  ]);
});

describe('the excerpt of a note on a card', () => {
  const take = { postedBy: person('1'), postedAt: new Date(0), shot: { number: '1', title: 'T' } } as unknown as Take;
  const excerpt = (body: string) => {
    const note = { id: 'n', author: person('1'), body, thread: { frame: 3 } } as unknown as Note;
    const parts = { take, decision: null, reading: null, stamps: [], noteCount: 1, posterRole: undefined };
    return presentFeedCard({ ...parts, talk: [{ note, role: 'mentor' }] }).talk[0]!.excerpt;
  };

  test('is the note itself when it is short, on one line', () => {
    expect(excerpt('Two\n lines.')).toBe('Two lines.');
  });

  test('ends between words', () => {
    const short = excerpt('word '.repeat(60));
    expect(short).toMatch(/word…$/);
    expect(short.length).toBeLessThanOrEqual(161);
  });

  test('does not cut a letter of two halves', () => {
    expect(excerpt('🪁'.repeat(200))).toBe(`${'🪁'.repeat(160)}…`);
  });
});

describe('the sketch of a reading', () => {
  test('has every mark, arc and finding, to a tenth of a pixel', () => {
    const reading: Reading = buildReading({ findings: [buildFinding()] });
    const sketch = presentSketch(reading);
    const [thing] = reading.objects;
    expect(sketch.marks).toHaveLength(thing!.marks.length);
    for (const mark of sketch.marks) expect(mark.x * 10).toBeCloseTo(Math.round(mark.x * 10), 9);
    expect(sketch.arcs.map(({ flight }) => flight)).toEqual(thing!.flights.map(({ id }) => id));
    expect(sketch.findings.map(({ id }) => id)).toEqual(reading.findings.map(({ id }) => id));
    expect(sketch.findings).toHaveLength(1);
    expect(sketch.findings[0]).not.toHaveProperty('mend');
  });

  test('is no motion where nothing was found, and read where anything was', () => {
    const reading = buildReading();
    expect(presentSketch({ ...reading, objects: [] }).outcome).toBe('no-motion');
    const [thing] = reading.objects;
    const objects = [{ ...thing!, outcome: 'too-few-marks' as const }, thing!];
    expect(presentSketch({ ...reading, objects }).outcome).toBe('read');
  });
});
