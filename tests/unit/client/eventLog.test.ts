import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { ProductionEvent } from '../../../shared/api/events.ts';
import { createEventLog } from '../../../src/lib/eventLog.ts';
import { buildEvent } from '../../support/wire.ts';

/** A server's log as a list, and what a client showed of it. */
function follow(count: number, seen = 0, pageSize = 200) {
  const stored = Array.from({ length: count }, (_, index) => buildEvent(index + 1));
  const shown: number[] = [];
  const asked: number[] = [];
  const log = createEventLog({
    seen,
    apply: (event) => shown.push(event.seq),
    fetchAfter: async (seq) => {
      asked.push(seq);
      return { events: stored.slice(seq, seq + pageSize), newest: stored.length };
    },
  });
  return { stored, shown, asked, log, add: (event: ProductionEvent) => stored.push(event) };
}

const upTo = (last: number, first = 1) => Array.from({ length: last - first + 1 }, (_, index) => index + first);

describe('a production followed by its numbers', () => {
  test('shows events that arrive in order at once', () => {
    const { log, stored, shown, asked } = follow(3);
    for (const event of stored) log.receive(event);
    expect(shown).toEqual([1, 2, 3]);
    expect(asked).toEqual([]);
  });

  test('shows an event once however often it arrives', () => {
    const { log, stored, shown } = follow(2);
    for (const event of [...stored, ...stored]) log.receive(event);
    expect(shown).toEqual([1, 2]);
  });

  test('keeps an early event back until the one before it came', () => {
    const { log, stored, shown } = follow(3);
    log.receive(stored[2]!);
    expect(shown).toEqual([]);
    log.receive(stored[0]!);
    expect(shown).toEqual([1]);
    log.receive(stored[1]!);
    expect(shown).toEqual([1, 2, 3]);
  });

  test('fetches what is missing after a gap, from the last number it showed', async () => {
    const { log, stored, shown, asked } = follow(9);
    log.receive(stored[0]!);
    log.receive(stored[8]!);
    await log.catchUp(9);
    expect(asked).toEqual([1]);
    expect(shown).toEqual(upTo(9));
  });

  test('starts after what is on screen already', async () => {
    const { log, shown } = follow(6, 4);
    await log.catchUp(6);
    expect(shown).toEqual([5, 6]);
    expect(log.seen).toBe(6);
  });

  test('asks for page after page when it was away for long', async () => {
    const { log, shown, asked } = follow(12, 0, 5);
    await log.catchUp(12);
    expect(asked).toEqual([0, 5, 10]);
    expect(shown).toEqual(upTo(12));
  });

  test('asks nothing when it is at the newest', async () => {
    const { log, asked } = follow(5, 5);
    await log.catchUp(5);
    expect(asked).toEqual([]);
  });

  test('lets an event that arrives while it catches up take its place in the row', async () => {
    const { log, stored, shown, add } = follow(3);
    const caughtUp = log.catchUp(3);
    const late = buildEvent(4);
    add(late);
    log.receive(late);
    await caughtUp;
    expect(shown).toEqual([1, 2, 3, 4]);
    expect(stored).toHaveLength(4);
  });

  test('does two catch-ups at a time as one', async () => {
    const { log, shown, asked } = follow(4);
    await Promise.all([log.catchUp(3), log.catchUp(4)]);
    expect(asked).toEqual([0]);
    expect(shown).toEqual(upTo(4));
  });

  test('tells of a fetch that failed, and goes on from where it was when asked again', async () => {
    const stored = upTo(4).map(buildEvent);
    const shown: number[] = [];
    let down = true;
    const log = createEventLog({
      seen: 1,
      apply: (event) => shown.push(event.seq),
      fetchAfter: async (seq) => {
        if (down) throw new Error('The line is down.');
        return { events: stored.slice(seq), newest: 4 };
      },
    });
    await expect(log.catchUp(4)).rejects.toThrow('The line is down.');
    expect(shown).toEqual([]);
    down = false;
    await log.catchUp(4);
    expect(shown).toEqual([2, 3, 4]);
  });

  test('ends when the server has nothing to say, instead of asking for ever', async () => {
    let asked = 0;
    const log = createEventLog({
      seen: 0,
      apply: () => {},
      fetchAfter: async () => {
        asked += 1;
        return { events: [], newest: 3 };
      },
    });
    await log.catchUp(3);
    expect(asked).toBe(1);
  });

  test('whatever arrives, is lost, repeated or reordered, every number is shown once and in order', async () => {
    await fc.assert(
      fc.asyncProperty(
        fc.integer({ min: 1, max: 30 }),
        fc.array(fc.integer({ min: 1, max: 30 }), { maxLength: 60 }),
        fc.integer({ min: 1, max: 7 }),
        async (count, arrivals, pageSize) => {
          const { log, stored, shown } = follow(count, 0, pageSize);
          for (const seq of arrivals) if (seq <= count) log.receive(stored[seq - 1]!);
          await log.catchUp(count);
          expect(shown).toEqual(upTo(count));
        },
      ),
    );
  });
});
