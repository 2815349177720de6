import { useInfiniteQuery } from '@tanstack/react-query';
import { type ReactNode, useEffect, useRef } from 'react';
import type { FeedCard, FeedFilter } from '../../../shared/api/feed.ts';
import { Button } from '../../components/Button.tsx';
import { ErrorNote } from '../../components/ErrorNote.tsx';
import { sentenceOf } from '../../lib/ApiProblem.ts';
import { useKeys } from '../../lib/keys.ts';
import { feedOptions } from '../../lib/queries/feed.ts';
import { FeedCardView } from './FeedCardView.tsx';
import { FeedEmpty } from './FeedEmpty.tsx';
import { FeedSkeleton } from './FeedSkeleton.tsx';

export interface FeedListProps {
  slug: string;
  filter: FeedFilter;
  stampsOf: (card: FeedCard) => ReactNode;
}

/** The takes of one tab, newest first. Older pages come as one scrolls to them, or by the button. */
export function FeedList({ slug, filter, stampsOf }: FeedListProps) {
  const feed = useInfiniteQuery(feedOptions(slug, filter));
  const end = useRef<HTMLDivElement>(null);
  const list = useRef<HTMLDivElement>(null);
  useKeys('Feed', [
    { key: 'ArrowRight', says: 'To the next take', run: () => focusCard(list.current, 1) },
    { key: 'ArrowLeft', says: 'To the take before', run: () => focusCard(list.current, -1) },
  ]);
  const { hasNextPage, isFetchingNextPage, isFetchNextPageError, fetchNextPage } = feed;

  useEffect(() => {
    const element = end.current;
    if (!element || !hasNextPage || isFetchingNextPage || isFetchNextPageError) return;
    const observer = new IntersectionObserver(
      ([seen]) => {
        if (seen?.isIntersecting) void fetchNextPage();
      },
      { rootMargin: '600px' },
    );
    observer.observe(element);
    return () => observer.disconnect();
  }, [hasNextPage, isFetchingNextPage, isFetchNextPageError, fetchNextPage]);

  if (feed.isPending) return <FeedSkeleton />;
  if (feed.isError && !feed.data) {
    return (
      <ErrorNote action={<Button onClick={() => void feed.refetch()}>Try again</Button>}>
        {sentenceOf(feed.error)}
      </ErrorNote>
    );
  }
  const cards = feed.data.pages.flatMap((page) => page.cards);
  if (cards.length === 0) return <FeedEmpty slug={slug} filter={filter} />;

  return (
    <div ref={list} className="space-y-4.5">
      {cards.map((card) => (
        <FeedCardView key={card.take.id} slug={slug} card={card} stamps={stampsOf(card)} />
      ))}
      <div ref={end} className="text-center">
        {isFetchNextPageError && <ErrorNote className="mb-3 text-left">{sentenceOf(feed.error)}</ErrorNote>}
        {hasNextPage ? (
          <Button busy={isFetchingNextPage && 'Fetching older takes…'} onClick={() => void fetchNextPage()}>
            Older takes
          </Button>
        ) : (
          <p className="py-2 text-sm text-graphite">That is everything, back to the first.</p>
        )}
      </div>
    </div>
  );
}

/** Moves the focus to the title of the next card, or the one before; from outside the list to the first. */
function focusCard(list: HTMLElement | null, step: 1 | -1): void {
  const cards = [...(list?.querySelectorAll('article') ?? [])];
  const at = cards.findIndex((card) => card.contains(document.activeElement));
  const next = cards[at < 0 ? 0 : Math.min(cards.length - 1, Math.max(0, at + step))];
  next?.querySelector<HTMLElement>('h2 a')?.focus();
  next?.scrollIntoView({ block: 'nearest' });
}
