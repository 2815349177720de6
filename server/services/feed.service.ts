import type { SelectQueryBuilder } from 'typeorm';
import type { FeedFilter, FeedPage } from '../../shared/api/feed.ts';
import type { Actor } from '../../shared/policy/can.ts';
import { Take } from '../entities/Take.ts';
import type { Deps } from '../deps.ts';
import { AppError } from '../errors.ts';
import { presentFeedCard } from '../presenters/feed.presenter.ts';
import { accessBySlug } from './access.ts';
import { loadCards } from './loadTakes.ts';

/** Takes of a production, newest first. The cursor is the event number that posted the last card of a page. */
export async function readFeed(
  deps: Deps,
  userId: string,
  slug: string,
  { filter, cursor, limit }: { filter: FeedFilter; cursor?: string | undefined; limit: number },
): Promise<FeedPage> {
  const { manager } = deps.dataSource;
  const { production, actor } = await accessBySlug(manager, userId, slug);
  const query = manager
    .createQueryBuilder(Take, 'take')
    .select(['take.id', 'take.postedSeq'])
    .where('take.productionId = :productionId', { productionId: production.id })
    .orderBy('take.postedSeq', 'DESC')
    .limit(limit + 1);
  if (cursor !== undefined) query.andWhere('take.postedSeq < :before', { before: parseCursor(cursor) });
  narrow(query, filter, actor);
  const found = await query.getMany();
  const page = found.slice(0, limit);
  const cards = await loadCards(
    manager,
    production.id,
    page.map(({ id }) => id),
  );
  const more = found.length > limit;
  return { cards: cards.map(presentFeedCard), nextCursor: more ? String(page.at(-1)!.postedSeq) : null };
}

function parseCursor(cursor: string): number {
  if (/^\d{1,10}$/.test(cursor)) return Number(cursor);
  throw new AppError('invalid_request', 'This page of the feed does not exist; start from the top.', {
    fields: [{ path: 'cursor', message: 'Take the cursor from the page before.' }],
  });
}

const IS_LATEST = `NOT EXISTS (
  SELECT 1 FROM takes newer WHERE newer.shotId = take.shotId AND newer.number > take.number)`;

function narrow(query: SelectQueryBuilder<Take>, filter: FeedFilter, actor: Actor): void {
  const me = { me: actor.userId };
  if (filter === 'mine') query.andWhere('take.postedById = :me', me);
  if (filter === 'with-findings') {
    query.andWhere('EXISTS (SELECT 1 FROM readings r WHERE r.takeId = take.id AND r.findingCount > 0)');
  }
  if (filter === 'waiting-on-me') {
    // My own take that needs another pass waits on me; so does everyone else's new take when I decide on takes.
    const decides = actor.role === 'mentor' || actor.role === 'owner';
    const toDecide = `take.review = 'waiting' AND take.postedById <> :me`;
    const toDraw = `take.review = 'another-pass' AND take.postedById = :me`;
    query.andWhere(IS_LATEST).andWhere(decides ? `((${toDecide}) OR (${toDraw}))` : toDraw, me);
  }
}
