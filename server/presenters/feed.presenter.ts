import { excerptOf, type FeedCard } from '../../shared/api/feed.ts';
import type { Role } from '../../shared/api/people.ts';
import type { Note } from '../entities/Note.ts';
import { presentMember } from './people.presenter.ts';
import { presentTake, type TakeParts } from './takes.presenter.ts';

export interface CardParts extends TakeParts {
  posterRole: Role | undefined;
  /** At most two, in the order they were written; `author` and `thread` loaded. */
  talk: { note: Note; role: Role | undefined }[];
}

/** A take as a card of the feed. */
export function presentFeedCard(parts: CardParts): FeedCard {
  const { take } = parts;
  return {
    take: presentTake(parts),
    poster: presentMember(take.postedBy, parts.posterRole),
    shotTitle: take.shot.title,
    talk: parts.talk.map(({ note, role }) => ({
      noteId: note.id,
      author: presentMember(note.author, role),
      frame: note.thread.frame,
      excerpt: excerptOf(note.body),
    })),
  };
}
