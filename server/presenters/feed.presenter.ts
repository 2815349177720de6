import type { FeedCard } from '../../shared/api/feed.ts';
import type { Role } from '../../shared/api/people.ts';
import type { Note } from '../entities/Note.ts';
import { presentMember } from './people.presenter.ts';
import { presentTake, type TakeParts } from './takes.presenter.ts';

const EXCERPT = 160;

export interface CardParts extends TakeParts {
  posterRole: Role | undefined;
  /** At most two, in the order they were written; `author` and `thread` loaded. */
  talk: { note: Note; role: Role | undefined }[];
}

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

/** The beginning of a note, cut between words. */
function excerptOf(body: string): string {
  const line = body.replaceAll(/\s+/g, ' ');
  const letters = [...line];
  if (letters.length <= EXCERPT) return line;
  const cut = letters.slice(0, EXCERPT).join('');
  const space = cut.lastIndexOf(' ');
  return `${space > EXCERPT / 2 ? cut.slice(0, space) : cut}…`;
}
