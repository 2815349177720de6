import type { ReactNode } from 'react';
import type { Note } from '../../../shared/api/threads.ts';
import { FrameTag } from '../../components/FrameTag.tsx';
import { InkRing } from '../../components/InkRing.tsx';
import { TimeAgo } from '../../components/TimeAgo.tsx';
import type { Playhead } from '../../lib/playhead.ts';
import { frameMentions } from './frameMentions.ts';

interface NoteItemProps {
  note: Note;
  /** The production's number of the thread's frame, on its first note. */
  shownFrame: number | null;
  firstFrame: number;
  playhead: Playhead;
  stamps: ReactNode;
}

/** The words of a note; frames it names light up and lead there. */
export function NoteWords({ body, firstFrame, playhead }: { body: string; firstFrame: number; playhead: Playhead }) {
  const pieces = frameMentions(body, firstFrame, firstFrame + playhead.frames - 1);
  return (
    <p className="whitespace-pre-wrap [overflow-wrap:anywhere]">
      {pieces.map((piece, index) => {
        const { text, frame } = piece;
        if (frame === null) return text;
        const inStrip = frame - firstFrame + 1;
        return (
          <button
            // The same frame may be named twice, and a note never changes once it is written.
            key={`${index}-${text}`}
            type="button"
            title={`Go to frame ${text}`}
            className="underline decoration-graphite decoration-dotted underline-offset-3 hover:decoration-solid"
            onClick={() => playhead.choose(inStrip)}
            onPointerEnter={() => playhead.point(inStrip)}
            onPointerLeave={() => playhead.point(null)}
          >
            {text}
          </button>
        );
      })}
    </p>
  );
}

export function NoteItem({ note, shownFrame, firstFrame, playhead, stamps }: NoteItemProps) {
  return (
    <article
      id={`note-${note.id}`}
      aria-label={`Note by ${note.author.name}`}
      className="grid animate-settle grid-cols-[32px_minmax(0,1fr)] gap-2 border-t border-rule py-1.5 first:border-t-0"
    >
      <InkRing person={note.author} named className="mt-px self-start" />
      <div>
        <p>
          <b className="font-semibold">{note.author.name}</b>{' '}
          <span className="ml-0.5 text-xs text-graphite">
            {note.author.role} · <TimeAgo at={note.writtenAt} />
          </span>{' '}
          {shownFrame !== null && <FrameTag className="ml-0.5">{shownFrame}</FrameTag>}
        </p>
        <NoteWords body={note.body} firstFrame={firstFrame} playhead={playhead} />
        {stamps}
      </div>
    </article>
  );
}
