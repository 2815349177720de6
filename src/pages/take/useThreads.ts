import { useQuery } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';
import type { Person } from '../../../shared/api/people.ts';
import type { Take } from '../../../shared/api/takes.ts';
import type { Thread } from '../../../shared/api/threads.ts';
import type { Pin } from '../../features/score/NotesLane.tsx';
import { latestThread, neighbourThread, notYetThere, pinWords } from '../../features/threads/threadPins.ts';
import { type PendingNote, usePendingNotes, useWriteNote } from '../../features/threads/useNotes.ts';
import type { Playhead } from '../../lib/playhead.ts';
import { threadsOptions } from '../../lib/queries/threads.ts';

/** What hangs below the score. */
export type Hanging =
  | { kind: 'thread'; thread: Thread; pending: PendingNote[] }
  | { kind: 'new'; frame: number; writing: boolean; pending: PendingNote[] }
  | null;

type Open = { thread: string } | { new: number; writing: boolean } | 'latest' | 'nothing';

const NONE: Thread[] = [];

/**
 * The threads of a take, which of them hangs open, and the note that is being written. `frameAsked`: the address names a
 * frame.
 */
export function useThreads(take: Take, me: Person, playhead: Playhead, frameAsked: boolean) {
  const query = useQuery(threadsOptions(take.id));
  const threads = query.data?.threads ?? NONE;
  const pending = notYetThere(usePendingNotes(take.id), threads, me.id);
  const [open, setOpen] = useState<Open>('latest');
  const writing = useWriteNote(take.id, (thread) => setOpen({ thread }));

  // Whoever comes without a frame lands where the talk is; news that arrive later move nobody.
  const landed = useRef(false);
  const landing = latestThread(threads)?.frame;
  useEffect(() => {
    if (!query.isSuccess || landed.current) return;
    landed.current = true;
    if (landing !== undefined && !frameAsked && playhead.frame() === 1) playhead.choose(landing);
  }, [query.isSuccess, landing, frameAsked, playhead]);

  const hanging = hangingOf(open, threads, pending, playhead);
  const openId = hanging?.kind === 'thread' ? hanging.thread.id : null;
  const openThread = (thread: Thread | undefined) => {
    if (!thread) return;
    setOpen({ thread: thread.id });
    playhead.choose(thread.frame);
  };
  const newPins = pending.filter((note) => note.threadId === null);
  const pins: Pin[] = [
    ...threads.map((thread) => ({ key: thread.id, frame: thread.frame, words: pinWords(thread) })),
    ...newPins.map((note) => ({
      key: `new-${note.frame}`,
      frame: note.frame,
      words: note.failed ? 'You, not sent' : 'You, sending…',
    })),
  ].toSorted((a, b) => a.frame - b.frame);

  return {
    query,
    threads,
    pins,
    writing,
    hanging,
    isWriting: hanging?.kind === 'new' && hanging.writing,
    openPin: openId ?? (hanging?.kind === 'new' ? `new-${hanging.frame}` : null),
    togglePin: (key: string) => {
      const fresh = newPins.find((note) => `new-${note.frame}` === key);
      if (fresh) setOpen({ new: fresh.frame, writing: false });
      else if (key === openId) setOpen('nothing');
      else openThread(threads.find((thread) => thread.id === key));
    },
    step: (by: 1 | -1) => openThread(neighbourThread(threads, openId, by)),
    place: openId === null ? -1 : threads.findIndex((thread) => thread.id === openId),
    startNote: (frame: number) => setOpen({ new: frame, writing: true }),
    noteSent: (frame: number) => setOpen({ new: frame, writing: false }),
    close: () => setOpen('nothing'),
  };
}

function hangingOf(open: Open, threads: Thread[], pending: PendingNote[], playhead: Playhead): Hanging {
  if (open === 'nothing') return null;
  if (typeof open === 'object' && 'new' in open) {
    const own = pending.filter((note) => note.threadId === null && note.frame === open.new);
    return open.writing || own.length > 0
      ? { kind: 'new', frame: open.new, writing: open.writing, pending: own }
      : null;
  }
  const thread =
    open === 'latest'
      ? (threads.find((one) => one.frame === playhead.frame()) ?? latestThread(threads))
      : threads.find((one) => one.id === open.thread);
  if (!thread) return null;
  return { kind: 'thread', thread, pending: pending.filter((note) => note.threadId === thread.id) };
}
