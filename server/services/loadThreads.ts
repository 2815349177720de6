import { type EntityManager, In } from 'typeorm';
import type { Note as WireNote, Thread as WireThread } from '../../shared/api/threads.ts';
import { Note } from '../entities/Note.ts';
import { NoteStamp } from '../entities/NoteStamp.ts';
import { Thread } from '../entities/Thread.ts';
import { presentNote, presentThread } from '../presenters/threads.presenter.ts';
import { groupBy } from './groupBy.ts';
import { loadRoles } from './loadTakes.ts';

/** Threads with their notes and stamps, in frame order, then in the order they were pinned. */
export async function loadThreads(
  manager: EntityManager,
  productionId: string,
  which: { takeId: string } | { id: string },
): Promise<WireThread[]> {
  const threads = await manager.findBy(Thread, which);
  const ids = threads.map(({ id }) => id);
  const notes = await manager.find(Note, {
    where: { threadId: In(ids) },
    relations: { author: true },
    order: { seq: 'ASC' },
  });
  const stamps = await stampsOfNotes(manager, notes);
  const roles = await loadRoles(manager, productionId);
  const parts = notes.map((note) => ({ note, role: roles.get(note.authorId), stamps: stamps.get(note.id) ?? [] }));
  const notesOf = groupBy(parts, ({ note }) => note.threadId);
  const pinned = (thread: Thread) => notesOf.get(thread.id)?.[0]?.note.seq ?? 0;
  return threads
    .sort((a, b) => a.frame - b.frame || pinned(a) - pinned(b))
    .map((thread) => presentThread(thread, notesOf.get(thread.id) ?? []));
}

/** One note with its stamps. It is there: whoever calls has just written it. */
export async function loadNote(manager: EntityManager, productionId: string, noteId: string): Promise<WireNote> {
  const note = await manager.findOneOrFail(Note, { where: { id: noteId }, relations: { author: true } });
  const stamps = await stampsOfNotes(manager, [note]);
  const roles = await loadRoles(manager, productionId);
  return presentNote({ note, role: roles.get(note.authorId), stamps: stamps.get(noteId) ?? [] });
}

async function stampsOfNotes(manager: EntityManager, notes: Note[]): Promise<Map<string, NoteStamp[]>> {
  const where = { noteId: In(notes.map(({ id }) => id)) };
  return groupBy(await manager.find(NoteStamp, { where, relations: { user: true } }), ({ noteId }) => noteId);
}
