import type { ReactNode } from 'react';
import { Link } from 'react-router';
import type { Take } from '../../../shared/api/takes.ts';
import { StateChip } from '../../components/StateChip.tsx';
import { TimeAgo } from '../../components/TimeAgo.tsx';
import { fpsWords, holdWords } from '../../lib/fpsWords.ts';
import { paths } from '../../lib/paths.ts';

interface TakeHeadProps {
  slug: string;
  take: Take;
  title: string | null;
  /** Number of the shot's latest take. */
  latest: number;
  /** A phone: the menu stands beside the title, and `children` under the thumb. */
  narrow: boolean;
  /** What is seldom done to it; stands in the head of a phone too. */
  menu: ReactNode;
  children: ReactNode;
}

/** Which take this is, what became of it, and what can be done with it. */
export function TakeHead({ slug, take, title, latest, narrow, menu, children }: TakeHeadProps) {
  const hold = take.hold === null ? '' : `, ${holdWords(take.hold)}`;
  return (
    <div className="mb-3 flex flex-wrap items-center gap-x-3.5 gap-y-1.5 max-md:px-3.5">
      <title>{`${take.shotNumber} ${title ?? ''}, take ${take.number} · Spandrel`}</title>
      <Link
        to={paths.sheet(slug)}
        className="inline-flex items-center font-mono text-sm text-graphite no-underline hover:underline touch:-my-2 touch:min-h-11"
      >
        {take.shotNumber}
      </Link>
      <h1 className="text-2xl max-md:-order-2 max-md:w-[calc(100%-4rem)] max-md:text-[1.25rem]">
        {title ?? take.shotNumber}
      </h1>
      <StateChip state={take.review} />
      <span className="text-graphite">
        Take {take.number} · {fpsWords(take.fps)}
        {hold} · <TimeAgo at={take.postedAt} />
      </span>
      {latest > take.number && (
        <Link
          to={paths.take(slug, take.shotNumber, latest)}
          className="inline-flex items-center font-semibold touch:-my-2 touch:min-h-11"
        >
          Take {latest} is newer
        </Link>
      )}
      {narrow ? (
        <div className="-order-1 ml-auto">{menu}</div>
      ) : (
        <div className="ml-auto flex flex-wrap items-center gap-2">
          {menu}
          {children}
        </div>
      )}
    </div>
  );
}
