import { type LoaderFunctionArgs, useParams, useSearchParams } from 'react-router';
import { type FeedFilter, feedFilterSchema } from '../../shared/api/feed.ts';
import { PageHead } from '../components/PageHead.tsx';
import { Tabs } from '../components/Tabs.tsx';
import { FeedList } from '../features/feed/FeedList.tsx';
import { ThroughCard } from '../features/feed/ThroughCard.tsx';
import { WaitingOnYou } from '../features/feed/WaitingOnYou.tsx';
import { StampRow } from '../features/stamps/StampRow.tsx';
import { paths } from '../lib/paths.ts';
import { feedOptions } from '../lib/queries/feed.ts';
import { sheetOptions } from '../lib/queries/shots.ts';
import { useActor } from '../lib/queries/useActor.ts';
import { queryClientContext } from '../lib/routerContext.ts';
import { useMediaQuery } from '../lib/useMediaQuery.ts';
import { warm } from '../lib/warm.ts';

const TABS: { filter: FeedFilter; label: string }[] = [
  { filter: 'everything', label: 'Everything' },
  { filter: 'waiting-on-me', label: 'Waiting on me' },
  { filter: 'mine', label: 'Mine' },
  { filter: 'with-findings', label: 'With findings' },
];

const filterOf = (search: URLSearchParams): FeedFilter =>
  feedFilterSchema.catch('everything').parse(search.get('show') ?? 'everything');

export function loader({ params, request, context }: LoaderFunctionArgs) {
  const client = context.get(queryClientContext);
  const slug = params.slug!;
  const filter = filterOf(new URL(request.url).searchParams);
  warm(client.infiniteQuery(feedOptions(slug, filter)), client.query(sheetOptions(slug)));
  return null;
}

export function FeedPage() {
  const slug = useParams().slug!;
  const [search] = useSearchParams();
  const filter = filterOf(search);
  const actor = useActor(slug);
  const wide = useMediaQuery('(min-width: 64rem)');
  const address = (one: FeedFilter) => (one === 'everything' ? paths.feed(slug) : `${paths.feed(slug)}?show=${one}`);

  return (
    <div className="mx-auto max-w-[90rem] px-3.5 py-3.5 lg:px-7">
      <PageHead title="Feed">
        <Tabs
          label="Which takes"
          tabs={TABS.map((tab) => ({ to: address(tab.filter), label: tab.label, current: tab.filter === filter }))}
          className="max-w-full"
        />
      </PageHead>
      <div className="grid grid-cols-[minmax(0,1fr)] gap-6 lg:grid-cols-[15rem_minmax(0,1fr)] xl:grid-cols-[18.75rem_minmax(0,1fr)]">
        {wide && (
          <aside className="space-y-3" aria-label="Where things stand">
            <WaitingOnYou slug={slug} me={actor.userId} />
            <ThroughCard slug={slug} />
          </aside>
        )}
        <FeedList
          slug={slug}
          filter={filter}
          stampsOf={({ take, poster }) => (
            <StampRow
              slug={slug}
              takeId={take.id}
              noteId={null}
              board={take.stamps}
              me={actor.person}
              what={`take ${take.number} of ${take.shotNumber} by ${poster.name}`}
            />
          )}
        />
      </div>
    </div>
  );
}
