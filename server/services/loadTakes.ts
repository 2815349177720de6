import { type EntityManager, In } from 'typeorm';
import type { Role } from '../../shared/api/people.ts';
import { Decision } from '../entities/Decision.ts';
import { Membership } from '../entities/Membership.ts';
import { Note } from '../entities/Note.ts';
import { Reading } from '../entities/Reading.ts';
import { Take } from '../entities/Take.ts';
import { TakeStamp } from '../entities/TakeStamp.ts';
import { notFound } from '../errors.ts';
import type { CardParts } from '../presenters/feed.presenter.ts';
import type { TakeParts } from '../presenters/takes.presenter.ts';
import { groupBy } from './groupBy.ts';

/** Takes with all that their wire shape shows, in the order of the ids. A handful of queries, however many takes. */
export async function loadTakes(manager: EntityManager, takeIds: string[]): Promise<TakeParts[]> {
  if (takeIds.length === 0) return [];
  const among = { takeId: In(takeIds) };
  const takes = await manager.find(Take, {
    where: { id: In(takeIds) },
    relations: { shot: true, postedBy: true },
  });
  const decisions = await manager.find(Decision, { where: among, relations: { by: true }, order: { seq: 'ASC' } });
  const readings = await manager.findBy(Reading, among);
  const stamps = await manager.find(TakeStamp, { where: among, relations: { user: true } });
  const counts = await countNotes(manager, takeIds);

  const takeById = new Map(takes.map((take) => [take.id, take]));
  const readingOf = new Map(readings.map((reading) => [reading.takeId, reading]));
  // Later decisions overwrite earlier ones.
  const decisionOf = new Map(decisions.map((decision) => [decision.takeId, decision]));
  const stampsOf = groupBy(stamps, ({ takeId }) => takeId);
  return takeIds.flatMap((id) => {
    const take = takeById.get(id);
    if (!take) return [];
    return {
      take,
      decision: decisionOf.get(id) ?? null,
      reading: readingOf.get(id) ?? null,
      stamps: stampsOf.get(id) ?? [],
      noteCount: counts.get(id) ?? 0,
    };
  });
}

/** @throws {AppError} `not_found` when there is no such take. */
export async function loadTake(manager: EntityManager, takeId: string): Promise<TakeParts> {
  const [parts] = await loadTakes(manager, [takeId]);
  if (!parts) throw notFound('take');
  return parts;
}

/** Takes as cards: with the poster's role and what was said last. */
export async function loadCards(manager: EntityManager, productionId: string, takeIds: string[]): Promise<CardParts[]> {
  const takes = await loadTakes(manager, takeIds);
  const roles = await loadRoles(manager, productionId);
  const talk = await loadTalk(manager, takeIds);
  return takes.map((parts) => ({
    ...parts,
    posterRole: roles.get(parts.take.postedById),
    talk: (talk.get(parts.take.id) ?? []).map((note) => ({ note, role: roles.get(note.authorId) })),
  }));
}

/** Role of every member by user id. */
export async function loadRoles(manager: EntityManager, productionId: string): Promise<Map<string, Role>> {
  const memberships = await manager.findBy(Membership, { productionId });
  return new Map(memberships.map(({ userId, role }) => [userId, role]));
}

/** How many notes each take has; takes without one are left out. */
export async function countNotes(manager: EntityManager, takeIds: string[]): Promise<Map<string, number>> {
  const rows = await manager
    .createQueryBuilder(Note, 'note')
    .innerJoin('note.thread', 'thread')
    .select('thread.takeId', 'takeId')
    .addSelect('COUNT(*)', 'count')
    .where('thread.takeId IN (:...takeIds)', { takeIds })
    .groupBy('thread.takeId')
    .getRawMany<{ takeId: string; count: string }>();
  return new Map(rows.map(({ takeId, count }) => [takeId, Number(count)]));
}

/** Of each take the note that was written last, after the one it answers when it is a reply. */
async function loadTalk(manager: EntityManager, takeIds: string[]): Promise<Map<string, Note[]>> {
  if (takeIds.length === 0) return new Map();
  const ranked = await manager.query<{ id: string }[]>(
    `SELECT id FROM (
       SELECT n.id, n.seq,
              ROW_NUMBER() OVER (PARTITION BY t.takeId ORDER BY n.seq DESC) AS fromLast,
              n.threadId = FIRST_VALUE(n.threadId) OVER (PARTITION BY t.takeId ORDER BY n.seq DESC) AS sameThread,
              ROW_NUMBER() OVER (PARTITION BY n.threadId ORDER BY n.seq DESC) AS fromLastOfThread
       FROM notes n JOIN threads t ON t.id = n.threadId
       WHERE t.takeId IN (${takeIds.map(() => '?').join(', ')})
     ) ranked WHERE fromLast = 1 OR (sameThread AND fromLastOfThread = 2)`,
    takeIds,
  );
  if (ranked.length === 0) return new Map();
  const notes = await manager.find(Note, {
    where: { id: In(ranked.map(({ id }) => id)) },
    relations: { author: true, thread: true },
    order: { seq: 'ASC' },
  });
  return groupBy(notes, (note) => note.thread.takeId);
}
