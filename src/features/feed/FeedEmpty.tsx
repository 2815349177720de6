import { Link } from 'react-router';
import type { FeedFilter } from '../../../shared/api/feed.ts';
import { buttonClass } from '../../components/Button.tsx';
import { EmptyState } from '../../components/EmptyState.tsx';
import { paths } from '../../lib/paths.ts';

const WORDS: Record<FeedFilter, { title: string; says: string; next: 'post' | 'everything' }> = {
  everything: {
    title: 'Nothing has been thrown yet',
    says: 'Every take that someone posts lands here with its reading, newest first. Post the first strip: a numbered set of frames, or one picture that holds them all.',
    next: 'post',
  },
  'waiting-on-me': {
    title: 'Nothing waits on you',
    says: 'Takes you should decide on, and your own that were sent back for another pass, gather here.',
    next: 'everything',
  },
  mine: {
    title: 'You have not posted yet',
    says: 'Your own takes gather here, each with what the reading and the others say. Post a strip to begin.',
    next: 'post',
  },
  'with-findings': {
    title: 'Nothing is off',
    says: 'Takes whose arc leaves the true one gather here. Right now there is none.',
    next: 'everything',
  },
};

/** What a tab of the feed is for, while nothing is in it, and the next step. */
export function FeedEmpty({ slug, filter }: { slug: string; filter: FeedFilter }) {
  const { title, says, next } = WORDS[filter];
  return (
    <EmptyState
      title={title}
      action={
        next === 'post' ? (
          <Link to={paths.post(slug)} className={buttonClass('primary')}>
            Post a strip
          </Link>
        ) : (
          <Link to={paths.feed(slug)} className={buttonClass()}>
            See everything
          </Link>
        )
      }
    >
      {says}
    </EmptyState>
  );
}
