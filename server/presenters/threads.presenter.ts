import type { Role } from '../../shared/api/people.ts';
import type { Note as WireNote, Thread as WireThread } from '../../shared/api/threads.ts';
import type { Note } from '../entities/Note.ts';
import type { NoteStamp } from '../entities/NoteStamp.ts';
import type { Thread } from '../entities/Thread.ts';
import { presentMember } from './people.presenter.ts';
import { presentStampBoard } from './stamps.presenter.ts';

/** A note with `author` loaded, and the author's role in the production. */
export interface NoteParts {
  note: Note;
  role: Role | undefined;
  stamps: NoteStamp[];
}

/** A note with its stamps. */
export function presentNote({ note, role, stamps }: NoteParts): WireNote {
  return {
    id: note.id,
    threadId: note.threadId,
    author: presentMember(note.author, role),
    body: note.body,
    writtenAt: note.writtenAt.toISOString(),
    stamps: presentStampBoard(note.stampsRevision, stamps),
  };
}

/** Notes are given in the order they were written. */
export function presentThread(thread: Thread, notes: NoteParts[]): WireThread {
  return { id: thread.id, takeId: thread.takeId, frame: thread.frame, notes: notes.map(presentNote) };
}
