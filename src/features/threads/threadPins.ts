import type { Thread } from '../../../shared/api/threads.ts';

const firstName = (name: string) => name.split(' ')[0] ?? name;

/** A thread in a few words for its pin: who wrote first, and how many notes answer: "Tomasz +1". */
export function pinWords(thread: Thread): string {
  const first = thread.notes[0];
  const answers = thread.notes.length - 1;
  return `${first ? firstName(first.author.name) : ''}${answers > 0 ? ` +${answers}` : ''}`;
}

/** The thread in which something was written last; undefined when there is none. */
export function latestThread(threads: readonly Thread[]): Thread | undefined {
  const last = (thread: Thread) => thread.notes.at(-1)?.writtenAt ?? '';
  return threads.reduce<Thread | undefined>(
    (best, thread) => (!best || last(thread) > last(best) ? thread : best),
    undefined,
  );
}

/** The neighbour of a thread along the strip; from none, the first or the last. Undefined at the ends. */
export function neighbourThread(threads: readonly Thread[], openId: string | null, by: 1 | -1): Thread | undefined {
  const at = threads.findIndex((thread) => thread.id === openId);
  if (at === -1) return by === 1 ? threads[0] : threads.at(-1);
  return threads[at + by];
}

/**
 * Pending notes that are not there yet: the socket may bring a note before the answer to its own post does, and it should
 * not be seen twice for that moment.
 */
export function notYetThere<P extends { threadId: string | null; frame: number; body: string }>(
  pending: readonly P[],
  threads: readonly Thread[],
  authorId: string,
): P[] {
  return pending.filter(({ threadId, frame, body }) => {
    const places = threads.filter((thread) => (threadId === null ? thread.frame === frame : thread.id === threadId));
    return !places.some((thread) => thread.notes.some((note) => note.author.id === authorId && note.body === body));
  });
}
