import type { StampBoard } from '../../shared/api/stamps.ts';
import type { NoteStamp } from '../entities/NoteStamp.ts';
import type { TakeStamp } from '../entities/TakeStamp.ts';
import { presentPerson } from './people.presenter.ts';

/** Kinds in the order they were first used, people in the order they stamped. */
export function presentStampBoard(revision: number, stamps: (NoteStamp | TakeStamp)[]): StampBoard {
  const board: StampBoard['stamps'] = [];
  for (const stamp of [...stamps].sort((a, b) => a.seq - b.seq)) {
    let row = board.find(({ kind }) => kind === stamp.kind);
    if (!row) board.push((row = { kind: stamp.kind, people: [] }));
    row.people.push(presentPerson(stamp.user));
  }
  return { revision, stamps: board };
}
