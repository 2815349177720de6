import { type QueryClient, queryOptions, skipToken } from '@tanstack/react-query';
import { type ReadingProgress, type Take, takeContracts } from '../../../shared/api/takes.ts';
import { call } from '../call.ts';
import { applyTakeToFeed, patchCards } from './feed.ts';
import { newerTake } from './newer.ts';
import { productionKey } from './production.ts';
import { applyTakeToShots, patchTakeInShots } from './shots.ts';

const takesKey = (slug: string) => [...productionKey(slug), 'take'] as const;

/**
 * One take of a shot, under its address. After a take moved, the old address holds it with its new `shotNumber` and
 * `number`: whoever shows it then goes to the new address.
 */
export function takeOptions(slug: string, shotNumber: string, takeNumber: number) {
  return queryOptions({
    queryKey: [...takesKey(slug), shotNumber, takeNumber],
    queryFn: ({ signal }) => call(takeContracts.read, { params: { slug, shotNumber, takeNumber }, signal }),
    structuralSharing: (have, got) =>
      have && (have as Take).id === (got as Take).id ? newerTake(have as Take, got as Take) : (got as Take),
  });
}

/** The reading of a take as a document. Ask only once the take's reading status is `read`. */
export function readingOptions(takeId: string) {
  return queryOptions({
    queryKey: ['reading', takeId],
    queryFn: ({ signal }) => call(takeContracts.reading, { params: { takeId }, signal }),
    staleTime: Number.POSITIVE_INFINITY,
  });
}

/** How far the reading of a take is. Filled by the socket only; null or undefined when nothing runs. */
export function progressOptions(takeId: string) {
  return queryOptions<ReadingProgress | null>({
    queryKey: ['reading-progress', takeId],
    queryFn: skipToken,
    staleTime: 'static',
  });
}

/** Puts a take's newer state everywhere it is shown: its page, its shot, the sheet, the feed. Safe to repeat. */
export function applyTake(client: QueryClient, slug: string, take: Take): void {
  client.setQueriesData<Take>({ queryKey: takesKey(slug) }, (have) =>
    have?.id === take.id ? newerTake(have, take) : have,
  );
  client.setQueryData(takeOptions(slug, take.shotNumber, take.number).queryKey, (have) =>
    have?.id === take.id ? have : take,
  );
  applyTakeToShots(client, slug, take);
  applyTakeToFeed(client, slug, take);
  if (take.reading.status === 'read' || take.reading.status === 'failed') {
    client.setQueryData(progressOptions(take.id).queryKey, null);
  }
}

/** Notes how far a reading is. Whoever shows it looks at the take's status first, so late news does no harm. */
export function applyProgress(client: QueryClient, progress: ReadingProgress): void {
  client.setQueryData(progressOptions(progress.takeId).queryKey, progress);
}

/** Changes one take wherever it is shown, by its id: for what is counted on a take and is not part of its revision. */
export function patchTake(client: QueryClient, slug: string, takeId: string, change: (take: Take) => Take): void {
  client.setQueriesData<Take>({ queryKey: takesKey(slug) }, (have) => (have?.id === takeId ? change(have) : have));
  patchTakeInShots(client, slug, takeId, change);
  patchCards(client, slug, takeId, (card) => ({ ...card, take: change(card.take) }));
}
