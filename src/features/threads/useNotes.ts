import { useMutation, useMutationState, useQueryClient } from '@tanstack/react-query';
import { type Note, type Thread, threadContracts } from '../../../shared/api/threads.ts';
import { call } from '../../lib/call.ts';
import { sentenceOf } from '../../lib/ApiProblem.ts';
import { applyNote, applyThread } from '../../lib/queries/threads.ts';
import { settleDraft } from './useDraft.ts';

interface Written {
  /** The thread it answers; null for one that is pinned anew. */
  threadId: string | null;
  frame: number;
  body: string;
  /** The draft it was written in, which is kept until it has arrived. */
  draft: string;
}

/** A note that someone here wrote and that the server has not taken yet. */
export interface PendingNote extends Written {
  id: number;
  /** Why it was not taken; null while it is on its way. */
  failed: string | null;
}

const key = (takeId: string) => ['write-note', takeId] as const;

/** Notes of this take that are on their way or failed, oldest first. They live as long as the page. */
export function usePendingNotes(takeId: string): PendingNote[] {
  return useMutationState({
    filters: {
      mutationKey: key(takeId),
      predicate: ({ state }) => state.status === 'pending' || state.status === 'error',
    },
    select: (mutation): PendingNote => ({
      id: mutation.mutationId,
      ...(mutation.state.variables as Written),
      failed: mutation.state.status === 'error' ? sentenceOf(mutation.state.error) : null,
    }),
  });
}

export interface NoteWriting {
  /** Writes a note: pins it to a frame, or answers a thread. `usePendingNotes` shows its text at once. */
  write: (written: Written) => void;
  retry: (note: PendingNote) => void;
  /** Gives up on a note that did not arrive. */
  forget: (note: PendingNote) => void;
}

/** How notes are written on a take. `onPinned` is told the thread that a new note became. */
export function useWriteNote(takeId: string, onPinned: (threadId: string) => void): NoteWriting {
  const client = useQueryClient();
  const { mutate } = useMutation({
    mutationKey: key(takeId),
    // A note that did not arrive may not be thrown away while its page is open.
    gcTime: Number.POSITIVE_INFINITY,
    mutationFn: async ({ threadId, frame, body }: Written): Promise<{ thread: Thread } | { note: Note }> =>
      threadId === null
        ? { thread: await call(threadContracts.pin, { params: { takeId }, body: { frame, body } }) }
        : { note: await call(threadContracts.reply, { params: { threadId }, body: { body } }) },
    onSuccess: (answer, { draft, body }) => {
      settleDraft(draft, body);
      if ('note' in answer) return applyNote(client, takeId, answer.note);
      applyThread(client, answer.thread);
      onPinned(answer.thread.id);
    },
  });
  const forget = (note: PendingNote) => {
    const cache = client.getMutationCache();
    const mutation = cache.getAll().find((one) => one.mutationId === note.id);
    if (mutation) cache.remove(mutation);
  };
  return {
    write: mutate,
    retry: (note) => {
      forget(note);
      mutate({ threadId: note.threadId, frame: note.frame, body: note.body, draft: note.draft });
    },
    forget,
  };
}
