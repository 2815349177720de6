import type { ReactNode } from 'react';
import { Link } from 'react-router';
import type { FeedCard } from '../../../shared/api/feed.ts';
import { pictureUrl } from '../../../shared/api/takes.ts';
import { InkRing } from '../../components/InkRing.tsx';
import { SketchPicture } from '../../components/SketchPicture.tsx';
import { StateChip } from '../../components/StateChip.tsx';
import { TimeAgo } from '../../components/TimeAgo.tsx';
import { paths } from '../../lib/paths.ts';
import { CardReading } from './CardReading.tsx';
import { CardTalk } from './CardTalk.tsx';

export interface FeedCardViewProps {
  slug: string;
  card: FeedCard;
  /** The row of stamps, from whoever owns stamping. */
  stamps: ReactNode;
}

/** One take of the feed: who posted it, what the reading says with its evidence, the picture, the talk, the stamps. */
export function FeedCardView({ slug, card, stamps }: FeedCardViewProps) {
  const { take, poster, shotTitle } = card;
  const address = paths.take(slug, take.shotNumber, take.number);
  const sketch = take.sketch;

  return (
    <article
      aria-labelledby={`card-${take.id}`}
      className="overflow-hidden rounded-card border border-rule bg-sheet motion-safe:animate-settle"
    >
      <header className="flex flex-wrap items-center gap-x-3 gap-y-1.5 px-4.5 py-2.5">
        <InkRing person={poster} named />
        <div className="min-w-0 flex-1">
          <p>
            <b className="font-semibold">{poster.name}</b>{' '}
            <span className="text-xs whitespace-nowrap text-graphite">
              {poster.role} · <TimeAgo at={take.postedAt} />
            </span>
          </p>
          <h2 id={`card-${take.id}`} className="text-base leading-snug font-normal">
            <Link to={address} className="inline-block no-underline hover:underline touch:-my-2.75 touch:py-2.75">
              <span className="mr-1 font-mono text-graphite">{take.shotNumber}</span>{' '}
              <span className="text-[1rem] font-bold">{shotTitle}</span>
            </Link>
          </h2>
        </div>
        <div className="flex items-center gap-3 max-sm:w-full max-sm:pl-9.5">
          <span className="text-graphite">Take {take.number}</span>
          <StateChip state={take.review} />
        </div>
      </header>
      <div className="grid border-t border-rule md:grid-cols-[16.875rem_minmax(0,1fr)]">
        <CardReading
          take={take}
          className="px-4.5 py-3 max-md:border-t max-md:border-rule md:border-r md:border-rule"
        />
        <Link
          to={address}
          tabIndex={-1}
          aria-hidden="true"
          className="relative block h-56 bg-surround max-md:order-first md:h-full md:min-h-68 xl:min-h-76"
        >
          {sketch ? (
            <SketchPicture sketch={sketch} src={pictureUrl(take.id, 1)} className="absolute inset-0" />
          ) : (
            <img
              src={pictureUrl(take.id, 1)}
              alt=""
              loading="lazy"
              className="absolute inset-0 size-full object-contain"
            />
          )}
        </Link>
      </div>
      <CardTalk slug={slug} card={card} />
      <footer className="flex flex-wrap items-center gap-x-4 gap-y-1 border-t border-rule px-4.5 py-1.5">
        <div className="min-w-0 flex-1">{stamps}</div>
        {sketch?.caution && <p className="max-w-prose text-xs text-graphite">{sketch.caution}</p>}
      </footer>
    </article>
  );
}
