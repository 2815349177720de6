import type { EntityManager } from 'typeorm';
import { type Actor, can, type Thing, type Verb } from '../../shared/policy/can.ts';
import { Draft } from '../entities/Draft.ts';
import { Membership } from '../entities/Membership.ts';
import { Note } from '../entities/Note.ts';
import { Production } from '../entities/Production.ts';
import { Take } from '../entities/Take.ts';
import { Thread } from '../entities/Thread.ts';
import { AppError, notFound } from '../errors.ts';

/** Who asks, and in which production. */
export interface Access {
  production: Production;
  actor: Actor;
}

/** @throws {AppError} `not_allowed` with a sentence, unless the rules let the actor do it. */
export function allow(actor: Actor, verb: Verb, thing: Thing = {}): void {
  if (can(actor, verb, thing)) return;
  if (verb === 'take:decide' && actor.role !== null && thing.postedById === actor.userId) {
    throw new AppError('own_take', 'This take is yours; someone else decides on it.');
  }
  throw new AppError('not_allowed', actor.role === null ? 'You are not on this production.' : REFUSALS[verb]);
}

const REFUSALS: Record<Verb, string> = {
  'production:read': 'You are not on this production.',
  'take:post': 'You may not post here.',
  'take:readAgain': 'You may not have this take read again.',
  'take:move': 'Only whoever posted a take, a mentor, a producer or an owner moves it.',
  'take:decide': 'A mentor or an owner decides on takes.',
  'note:write': 'You may not write here.',
  'stamp:set': 'You may not stamp here.',
};

async function accessTo(manager: EntityManager, userId: string, production: Production): Promise<Access> {
  const membership = await manager.findOneBy(Membership, { productionId: production.id, userId });
  return { production, actor: { userId, role: membership?.role ?? null } };
}

/** @throws {AppError} `not_found` for a name nobody uses, `not_allowed` for a stranger. */
export async function accessBySlug(manager: EntityManager, userId: string, slug: string): Promise<Access> {
  const production = await manager.findOneBy(Production, { slug });
  if (!production) throw notFound('production');
  return refuseStranger(await accessTo(manager, userId, production));
}

/** @throws {AppError} `not_found` for an unknown take, `not_allowed` for a stranger to its production. */
export async function accessByTake(
  manager: EntityManager,
  userId: string,
  takeId: string,
): Promise<Access & { take: Take }> {
  const take = await manager.findOne(Take, { where: { id: takeId }, relations: { production: true } });
  if (!take) throw notFound('take');
  return { ...refuseStranger(await accessTo(manager, userId, take.production)), take };
}

/** @throws {AppError} `not_found` for an unknown thread, `not_allowed` for a stranger to its production. */
export async function accessByThread(
  manager: EntityManager,
  userId: string,
  threadId: string,
): Promise<Access & { thread: Thread }> {
  const thread = await manager.findOne(Thread, {
    where: { id: threadId },
    relations: { take: { production: true } },
  });
  if (!thread) throw notFound('thread');
  return { ...refuseStranger(await accessTo(manager, userId, thread.take.production)), thread };
}

/** @throws {AppError} `not_found` for an unknown note, `not_allowed` for a stranger to its production. */
export async function accessByNote(
  manager: EntityManager,
  userId: string,
  noteId: string,
): Promise<Access & { note: Note }> {
  const note = await manager.findOne(Note, {
    where: { id: noteId },
    relations: { thread: { take: { production: true } } },
  });
  if (!note) throw notFound('note');
  return { ...refuseStranger(await accessTo(manager, userId, note.thread.take.production)), note };
}

/** A draft belongs to whoever started it, also among the members of a production. */
export async function accessByDraft(
  manager: EntityManager,
  userId: string,
  draftId: string,
): Promise<Access & { draft: Draft }> {
  const draft = await manager.findOne(Draft, { where: { id: draftId }, relations: { production: true } });
  if (!draft) throw notFound('post');
  const access = refuseStranger(await accessTo(manager, userId, draft.production));
  if (draft.userId !== userId) throw new AppError('not_allowed', 'This post is being put together by someone else.');
  return { ...access, draft };
}

function refuseStranger(access: Access): Access {
  allow(access.actor, 'production:read');
  return access;
}

/** Whether someone may still see a production; for connections that stay open. */
export function isMember(manager: EntityManager, userId: string, productionId: string): Promise<boolean> {
  return manager.existsBy(Membership, { productionId, userId });
}
