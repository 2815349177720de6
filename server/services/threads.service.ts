import { randomUUID } from 'node:crypto';
import type { Note as WireNote, Thread as WireThread } from '../../shared/api/threads.ts';
import { Note } from '../entities/Note.ts';
import { Take } from '../entities/Take.ts';
import { Thread } from '../entities/Thread.ts';
import type { Deps } from '../deps.ts';
import { AppError } from '../errors.ts';
import { accessByTake, accessByThread, allow } from './access.ts';
import { countNotes } from './loadTakes.ts';
import { loadNote, loadThreads } from './loadThreads.ts';
import { type Recording, record } from './record.ts';

/** Every thread on a take, in frame order. */
export async function listThreads(deps: Deps, userId: string, takeId: string): Promise<WireThread[]> {
  const { manager } = deps.dataSource;
  const { production } = await accessByTake(manager, userId, takeId);
  return loadThreads(manager, production.id, { takeId });
}

/** Pins a note to a frame: a new thread. */
export async function pinNote(
  deps: Deps,
  userId: string,
  takeId: string,
  { frame, body }: { frame: number; body: string },
): Promise<WireThread> {
  const { actor, take, production } = await accessByTake(deps.dataSource.manager, userId, takeId);
  allow(actor, 'note:write');
  if (frame > take.frames) {
    throw new AppError('invalid_request', `This take has ${take.frames} frames.`, {
      fields: [{ path: 'frame', message: `This take has ${take.frames} frames.` }],
    });
  }
  return record(deps, production.id, userId, async (recording) => {
    const { manager } = recording;
    const threadId = randomUUID();
    await manager.insert(Thread, { id: threadId, takeId, frame });
    await insertNote(recording, { threadId, takeId, authorId: userId, body });
    const [thread] = await loadThreads(manager, production.id, { id: threadId });
    const noteCount = (await countNotes(manager, [takeId])).get(takeId)!;
    return { change: { kind: 'thread:pinned', payload: { thread: thread!, noteCount } }, answer: thread! };
  });
}

/** Replies in a thread. */
export async function replyInThread(deps: Deps, userId: string, threadId: string, body: string): Promise<WireNote> {
  const { actor, thread, production } = await accessByThread(deps.dataSource.manager, userId, threadId);
  allow(actor, 'note:write');
  const { takeId, frame } = thread;
  return record(deps, production.id, userId, async (recording) => {
    const { manager } = recording;
    const noteId = await insertNote(recording, { threadId, takeId, authorId: userId, body });
    const note = await loadNote(manager, production.id, noteId);
    const noteCount = (await countNotes(manager, [takeId])).get(takeId)!;
    return { change: { kind: 'note:added', payload: { takeId, frame, note, noteCount } }, answer: note };
  });
}

async function insertNote(
  { manager, seq, at }: Recording,
  { takeId, ...given }: { threadId: string; takeId: string; authorId: string; body: string },
): Promise<string> {
  const id = randomUUID();
  await manager.insert(Note, { id, ...given, writtenAt: at, seq });
  // The take shows how many notes it has, so it changed too.
  await manager.update(Take, { id: takeId }, { revision: seq });
  return id;
}
