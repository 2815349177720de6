import type { Person } from '../../../shared/api/people.ts';
import { STAMP_KINDS, type StampBoard, type StampKind } from '../../../shared/api/stamps.ts';

/** Whether someone's stamp of a kind is on a board. */
export function hasStamped(board: StampBoard, kind: StampKind, personId: string): boolean {
  return board.stamps.some((stamp) => stamp.kind === kind && stamp.people.some((person) => person.id === personId));
}

/**
 * The board as it will be once someone's stamp is set or taken off. The revision stays: only the server makes a newer one.
 */
export function withStamp(board: StampBoard, kind: StampKind, person: Person, on: boolean): StampBoard {
  if (hasStamped(board, kind, person.id) === on) return board;
  const known = board.stamps.some((stamp) => stamp.kind === kind);
  const stamps = known
    ? board.stamps.map((stamp) =>
        stamp.kind === kind
          ? { ...stamp, people: on ? [...stamp.people, person] : stamp.people.filter((one) => one.id !== person.id) }
          : stamp,
      )
    : [...board.stamps, { kind, people: [person] }];
  return { ...board, stamps: stamps.filter((stamp) => stamp.people.length > 0) };
}

/** The five kinds: those on the board in the order they were first used, then the rest. */
export function kindsInOrder(board: StampBoard): StampKind[] {
  const used = board.stamps.map((stamp) => stamp.kind);
  return [...used, ...STAMP_KINDS.filter((kind) => !used.includes(kind))];
}
