import type { StampBoard, StampKind } from '../../shared/api/stamps.ts';
import { Note } from '../entities/Note.ts';
import { NoteStamp } from '../entities/NoteStamp.ts';
import { Take } from '../entities/Take.ts';
import { TakeStamp } from '../entities/TakeStamp.ts';
import type { Deps } from '../deps.ts';
import { presentStampBoard } from '../presenters/stamps.presenter.ts';
import { accessByNote, accessByTake, allow } from './access.ts';
import { record } from './record.ts';

/** Puts a stamp on a note or takes it off. Asking for what is so already changes nothing and makes no event. */
export async function setNoteStamp(
  deps: Deps,
  userId: string,
  noteId: string,
  kind: StampKind,
  on: boolean,
): Promise<StampBoard> {
  const { actor, note, production } = await accessByNote(deps.dataSource.manager, userId, noteId);
  allow(actor, 'stamp:set');
  const { takeId } = note.thread;
  return record(deps, production.id, userId, async ({ manager, seq }) => {
    const mine = { noteId, userId, kind };
    const changed = (await manager.existsBy(NoteStamp, mine)) !== on;
    if (changed) {
      if (on) await manager.insert(NoteStamp, { ...mine, seq });
      else await manager.delete(NoteStamp, mine);
      await manager.update(Note, { id: noteId }, { stampsRevision: seq });
    }
    const { stampsRevision } = await manager.findOneByOrFail(Note, { id: noteId });
    const stamps = await manager.find(NoteStamp, { where: { noteId }, relations: { user: true } });
    const board = presentStampBoard(stampsRevision, stamps);
    return { change: changed ? { kind: 'stamps:changed', payload: { takeId, noteId, board } } : null, answer: board };
  });
}

/** Puts a stamp on a take or takes it off, as {@link setNoteStamp} does for a note. */
export async function setTakeStamp(
  deps: Deps,
  userId: string,
  takeId: string,
  kind: StampKind,
  on: boolean,
): Promise<StampBoard> {
  const { actor, production } = await accessByTake(deps.dataSource.manager, userId, takeId);
  allow(actor, 'stamp:set');
  return record(deps, production.id, userId, async ({ manager, seq }) => {
    const mine = { takeId, userId, kind };
    const changed = (await manager.existsBy(TakeStamp, mine)) !== on;
    if (changed) {
      if (on) await manager.insert(TakeStamp, { ...mine, seq });
      else await manager.delete(TakeStamp, mine);
      // The board is part of the take, so the take changed too.
      await manager.update(Take, { id: takeId }, { stampsRevision: seq, revision: seq });
    }
    const { stampsRevision } = await manager.findOneByOrFail(Take, { id: takeId });
    const stamps = await manager.find(TakeStamp, { where: { takeId }, relations: { user: true } });
    const board = presentStampBoard(stampsRevision, stamps);
    const payload = { takeId, noteId: null, board };
    return { change: changed ? { kind: 'stamps:changed', payload } : null, answer: board };
  });
}
