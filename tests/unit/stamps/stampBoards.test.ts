import { describe, expect, it } from 'vitest';
import { hasStamped, kindsInOrder, withStamp } from '../../../src/features/stamps/stampBoards.ts';

const noor = { id: '00000000-0000-4000-8000-000000000001', name: 'Noor', initials: 'NH' };
const ines = { id: '00000000-0000-4000-8000-000000000002', name: 'Ines', initials: 'IO' };
const board = { revision: 7, stamps: [{ kind: 'on-it' as const, people: [noor] }] };

describe('a stamp that is on its way', () => {
  it('joins those of its kind, or opens a kind of its own at the end', () => {
    expect(withStamp(board, 'on-it', ines, true).stamps[0]!.people).toEqual([noor, ines]);
    expect(withStamp(board, 'agree', ines, true).stamps.map((stamp) => stamp.kind)).toEqual(['on-it', 'agree']);
  });

  it('is taken off without leaving an empty kind', () => {
    expect(withStamp(board, 'on-it', noor, false).stamps).toEqual([]);
  });

  it('changes nothing when it is said twice', () => {
    const once = withStamp(board, 'lovely', ines, true);
    expect(withStamp(once, 'lovely', ines, true)).toBe(once);
    expect(withStamp(board, 'lovely', ines, false)).toBe(board);
  });

  it('never claims to be newer than what the server sent', () => {
    expect(withStamp(board, 'agree', ines, true).revision).toBe(7);
  });
});

describe('the row of stamps', () => {
  it('shows the used kinds in the order of their first use, then the others', () => {
    const two = withStamp(board, 'agree', ines, true);
    expect(kindsInOrder(two)).toEqual(['on-it', 'agree', 'lovely', 'good-weight', 'unsure']);
    expect(hasStamped(two, 'agree', ines.id)).toBe(true);
    expect(hasStamped(two, 'agree', noor.id)).toBe(false);
  });
});
