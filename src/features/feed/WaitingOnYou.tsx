import { useInfiniteQuery } from '@tanstack/react-query';
import { Link } from 'react-router';
import { Card } from '../../components/Card.tsx';
import { FrameTag } from '../../components/FrameTag.tsx';
import { TimeAgo } from '../../components/TimeAgo.tsx';
import { paths } from '../../lib/paths.ts';
import { feedOptions } from '../../lib/queries/feed.ts';

const SHOWN = 4;

/** The takes that wait on whoever looks, in the margin of the feed. */
export function WaitingOnYou({ slug, me }: { slug: string; me: string }) {
  const { data } = useInfiniteQuery(feedOptions(slug, 'waiting-on-me'));
  if (!data) return null;
  const cards = data.pages.flatMap((page) => page.cards);
  return (
    <Card className="px-4 py-3" aria-labelledby="waiting-on-you">
      <h2 id="waiting-on-you" className="text-md">
        Waiting on you
      </h2>
      {cards.length === 0 && <p className="mt-1 text-sm text-graphite">Nothing right now.</p>}
      <ul className="divide-y divide-rule">
        {cards.slice(0, SHOWN).map(({ take, poster, shotTitle }) => (
          <li key={take.id} className="py-2 text-sm">
            <Link to={paths.take(slug, take.shotNumber, take.number)} className="block no-underline hover:underline">
              <FrameTag>take {take.number}</FrameTag> <b className="font-semibold">{take.shotNumber}</b> {shotTitle}
              {take.postedBy.id === me ? ' needs another pass' : ` by ${poster.name} is up`}
            </Link>
            <TimeAgo at={take.decision?.decidedAt ?? take.postedAt} className="text-xs text-graphite" />
          </li>
        ))}
      </ul>
      {cards.length > SHOWN && (
        <Link to={`${paths.feed(slug)}?show=waiting-on-me`} className="text-sm">
          All {cards.length}
          {data.pages.at(-1)?.nextCursor ? ' and more' : ''}
        </Link>
      )}
    </Card>
  );
}
