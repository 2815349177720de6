import { type QueryClient, queryOptions } from '@tanstack/react-query';
import type { StampBoard } from '../../../shared/api/stamps.ts';
import { type Note, type Thread, threadContracts } from '../../../shared/api/threads.ts';
import { call } from '../call.ts';
import { newerBoard } from './newer.ts';
import { patchTake } from './take.ts';

type Threads = { threads: Thread[] };

/** Every thread on a take, in frame order. */
export function threadsOptions(takeId: string) {
  return queryOptions({
    queryKey: ['threads', takeId],
    queryFn: ({ signal }) => call(threadContracts.list, { params: { takeId }, signal }),
    structuralSharing: (have, got) => newerThreads(have as Threads | undefined, got as Threads),
  });
}

function newerThreads(have: Threads | undefined, got: Threads): Threads {
  return have ? { threads: have.threads.reduce(withThread, got.threads) } : got;
}

const byFrame = (threads: Thread[]) =>
  threads.toSorted(
    (a, b) => a.frame - b.frame || (a.notes[0]?.writtenAt ?? '').localeCompare(b.notes[0]?.writtenAt ?? ''),
  );

function withNote(notes: Note[], note: Note): Note[] {
  const known = notes.find((one) => one.id === note.id);
  if (!known) return [...notes, note].sort((a, b) => a.writtenAt.localeCompare(b.writtenAt));
  const stamps = newerBoard(known.stamps, note.stamps);
  return stamps === known.stamps ? notes : notes.map((one) => (one.id === note.id ? { ...one, stamps } : one));
}

function withThread(threads: Thread[], thread: Thread): Thread[] {
  const known = threads.find((one) => one.id === thread.id);
  if (!known) return byFrame([...threads, thread]);
  const notes = thread.notes.reduce(withNote, known.notes);
  return notes === known.notes ? threads : threads.map((one) => (one.id === thread.id ? { ...one, notes } : one));
}

/** Puts a thread on its take, or its newer notes into the one that is there. Safe to repeat. */
export function applyThread(client: QueryClient, thread: Thread): void {
  client.setQueryData(
    threadsOptions(thread.takeId).queryKey,
    (have) => have && { threads: withThread(have.threads, thread) },
  );
}

/** Puts a reply under its thread. Safe to repeat. */
export function applyNote(client: QueryClient, takeId: string, note: Note): void {
  client.setQueryData(
    threadsOptions(takeId).queryKey,
    (have) =>
      have && {
        threads: have.threads.map((thread) =>
          thread.id === note.threadId ? { ...thread, notes: withNote(thread.notes, note) } : thread,
        ),
      },
  );
}

/** Counts the notes of a take upwards wherever it is shown. */
export function applyNoteCount(client: QueryClient, slug: string, takeId: string, noteCount: number): void {
  patchTake(client, slug, takeId, (take) => (take.noteCount < noteCount ? { ...take, noteCount } : take));
}

/** Replaces the stamps of a note, or of the take itself when `noteId` is null, if the board is newer. Safe to repeat. */
export function applyStamps(
  client: QueryClient,
  slug: string,
  { takeId, noteId, board }: { takeId: string; noteId: string | null; board: StampBoard },
): void {
  if (noteId === null) {
    patchTake(client, slug, takeId, (take) => ({ ...take, stamps: newerBoard(take.stamps, board) }));
    return;
  }
  client.setQueryData(
    threadsOptions(takeId).queryKey,
    (have) =>
      have && {
        threads: have.threads.map((thread) => ({
          ...thread,
          notes: thread.notes.map((note) =>
            note.id === noteId ? { ...note, stamps: newerBoard(note.stamps, board) } : note,
          ),
        })),
      },
  );
}
