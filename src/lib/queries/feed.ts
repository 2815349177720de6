import { type InfiniteData, infiniteQueryOptions, type QueryClient } from '@tanstack/react-query';
import { excerptOf, type FeedCard, type FeedFilter, type FeedPage, feedContracts } from '../../../shared/api/feed.ts';
import type { Note } from '../../../shared/api/threads.ts';
import type { Take } from '../../../shared/api/takes.ts';
import { call } from '../call.ts';
import { newerCard, newerTake } from './newer.ts';
import { productionKey } from './production.ts';
import { sessionOptions } from './session.ts';

type Feed = InfiniteData<FeedPage, string | undefined>;

const feedKey = (slug: string) => [...productionKey(slug), 'feed'] as const;

/** Takes of the production, newest first, page by page. */
export function feedOptions(slug: string, filter: FeedFilter) {
  return infiniteQueryOptions({
    queryKey: [...feedKey(slug), filter],
    queryFn: ({ pageParam, signal }) =>
      call(feedContracts.page, { params: { slug }, query: { filter, cursor: pageParam }, signal }),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (last) => last.nextCursor ?? undefined,
    structuralSharing: (have, got) => newerFeed(have as Feed | undefined, got as Feed),
  });
}

/** Keeps each card at its newest when a fetch brings an older state than the socket did. */
function newerFeed(have: Feed | undefined, got: Feed): Feed {
  if (!have) return got;
  const had = new Map(have.pages.flatMap((page) => page.cards).map((card) => [card.take.id, card]));
  return mapCards(got, (card) => {
    const before = had.get(card.take.id);
    return before ? newerCard(before, card) : card;
  });
}

function mapCards(feed: Feed, change: (card: FeedCard) => FeedCard): Feed {
  return { ...feed, pages: feed.pages.map((page) => ({ ...page, cards: page.cards.map(change) })) };
}

/** Puts a card's newer state into every list that shows it. A card that belongs at the top of a list and is not there joins it. */
export function applyFeedCard(client: QueryClient, slug: string, card: FeedCard): void {
  const me = client.getQueryData(sessionOptions().queryKey)?.person.id;
  for (const [key, have] of client.getQueriesData<Feed>({ queryKey: feedKey(slug) })) {
    if (!have) continue;
    const filter = key[3] as FeedFilter;
    const shown = have.pages.some((page) => page.cards.some((one) => one.take.id === card.take.id));
    if (shown) {
      client.setQueryData<Feed>(
        key,
        mapCards(have, (one) => (one.take.id === card.take.id ? newerCard(one, card) : one)),
      );
    } else if (belongs(filter, card.take, me) && !isBelowWhatIsLoaded(have, card)) {
      client.setQueryData<Feed>(key, insert(have, card));
    }
  }
  // What waits on whom is the server's rule; asking again is the only right answer.
  void client.invalidateQueries({ queryKey: [...feedKey(slug), 'waiting-on-me'] });
}

/** Puts a take's newer state into the cards that show it; never adds a card. */
export function applyTakeToFeed(client: QueryClient, slug: string, take: Take): void {
  patchCards(client, slug, take.id, (card) => ({ ...card, take: newerTake(card.take, take) }));
}

/** Changes the cards of one take wherever they are shown. */
export function patchCards(client: QueryClient, slug: string, takeId: string, change: (card: FeedCard) => FeedCard) {
  client.setQueriesData<Feed>(
    { queryKey: feedKey(slug) },
    (have) => have && mapCards(have, (card) => (card.take.id === takeId ? change(card) : card)),
  );
}

/** Hangs what was said last from the cards of its take, with what it answers. Older talk than the card has is dropped. */
export function applyTalk(
  client: QueryClient,
  slug: string,
  takeId: string,
  frame: number,
  notes: Note[],
  noteCount: number,
): void {
  patchCards(client, slug, takeId, (card) => {
    if (noteCount <= card.take.noteCount) return card;
    const said = notes.map((note) => ({ noteId: note.id, author: note.author, frame, excerpt: excerptOf(note.body) }));
    const answered = card.talk.filter((one) => one.frame === frame && said.every((note) => note.noteId !== one.noteId));
    return { ...card, talk: [...answered, ...said].slice(-2), take: { ...card.take, noteCount } };
  });
}

function belongs(filter: FeedFilter, take: Take, me: string | undefined): boolean {
  if (filter === 'mine') return take.postedBy.id === me;
  if (filter === 'with-findings') return (take.sketch?.findings.length ?? 0) > 0;
  return filter === 'everything';
}

function isBelowWhatIsLoaded(feed: Feed, card: FeedCard): boolean {
  const last = feed.pages.at(-1);
  const lowest = last?.cards.at(-1);
  return last?.nextCursor != null && lowest !== undefined && card.take.postedAt < lowest.take.postedAt;
}

function insert(feed: Feed, card: FeedCard): Feed {
  let placed = false;
  const pages = feed.pages.map((page, index) => {
    if (placed) return page;
    const at = page.cards.findIndex((one) => one.take.postedAt < card.take.postedAt);
    const isLast = index === feed.pages.length - 1;
    if (at < 0 && !isLast) return page;
    placed = true;
    return { ...page, cards: page.cards.toSpliced(at < 0 ? page.cards.length : at, 0, card) };
  });
  return { ...feed, pages };
}
