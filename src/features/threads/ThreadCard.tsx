import type { ReactNode } from 'react';
import type { Person } from '../../../shared/api/people.ts';
import type { Note, Thread } from '../../../shared/api/threads.ts';
import { shownFrame } from '../../../shared/reading/document.ts';
import { CrossGlyph } from '../../components/CrossGlyph.tsx';
import { IconButton } from '../../components/IconButton.tsx';
import type { Playhead } from '../../lib/playhead.ts';
import { NoteBox } from './NoteBox.tsx';
import { NoteItem } from './NoteItem.tsx';
import { PendingNoteItem } from './PendingNoteItem.tsx';
import { useDraft } from './useDraft.ts';
import type { NoteWriting, PendingNote } from './useNotes.ts';

interface ThreadCardProps {
  thread: Thread;
  pending: readonly PendingNote[];
  writing: NoteWriting;
  firstFrame: number;
  playhead: Playhead;
  me: Person;
  mayWrite: boolean;
  /** Draws the stamps under a note. */
  stamps: (note: Note) => ReactNode;
  /** "2 of 5", with the way to its neighbours. */
  place: ReactNode;
  onClose: () => void;
}

/** A thread: the note that was pinned, the replies, and the box for the next. */
export function ThreadCard(props: ThreadCardProps) {
  const { thread, pending, writing, firstFrame, playhead, me, mayWrite, stamps, place, onClose } = props;
  const draftName = `reply.${thread.id}`;
  const draft = useDraft(draftName);
  const shown = shownFrame(thread.frame, firstFrame);
  return (
    <section aria-label={`Thread on frame ${shown}`} className="px-3.5 pt-1 pb-1.5">
      <div className="float-right -mr-2 flex items-center gap-1">
        {place}
        <IconButton label="Fold this note" onClick={onClose} className="size-8! touch:size-11!">
          <CrossGlyph />
        </IconButton>
      </div>
      <div>
        {thread.notes.map((note, index) => (
          <NoteItem
            key={note.id}
            note={note}
            shownFrame={index === 0 ? shown : null}
            firstFrame={firstFrame}
            playhead={playhead}
            stamps={stamps(note)}
          />
        ))}
        {pending.map((note) => (
          <PendingNoteItem
            key={note.id}
            note={note}
            me={me}
            onRetry={() => writing.retry(note)}
            onTakeBack={() => {
              writing.forget(note);
              draft.write([note.body, draft.text].filter(Boolean).join('\n'));
            }}
          />
        ))}
      </div>
      {mayWrite && (
        <NoteBox
          draft={draft}
          label={`Reply on frame ${shown}`}
          placeholder="Reply…"
          send="Reply"
          onSend={(body) => writing.write({ threadId: thread.id, frame: thread.frame, body, draft: draftName })}
        />
      )}
    </section>
  );
}
