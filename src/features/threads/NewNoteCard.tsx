import type { Person } from '../../../shared/api/people.ts';
import { shownFrame } from '../../../shared/reading/document.ts';
import { FrameTag } from '../../components/FrameTag.tsx';
import { NoteBox } from './NoteBox.tsx';
import { PendingNoteItem } from './PendingNoteItem.tsx';
import type { Draft } from './useDraft.ts';
import type { NoteWriting, PendingNote } from './useNotes.ts';

interface NewNoteCardProps {
  frame: number;
  firstFrame: number;
  draft: Draft;
  draftName: string;
  me: Person;
  /** Notes for this frame that are on their way or failed. */
  pending: readonly PendingNote[];
  /** The box is open; else only what is pending shows. */
  open: boolean;
  writing: NoteWriting;
  onOpen: () => void;
  onSent: () => void;
  onLeave: () => void;
}

/** A new note that hangs from the chosen frame while it is written. */
export function NewNoteCard(props: NewNoteCardProps) {
  const { frame, firstFrame, draft, draftName, me, pending, open, writing, onOpen, onSent, onLeave } = props;
  const shown = shownFrame(frame, firstFrame);
  return (
    <section aria-label="New note" className="px-3.5 pt-2 pb-1.5">
      <h2 className="flex items-center gap-2 font-sans text-sm font-semibold">
        New note <FrameTag>{shown}</FrameTag>
      </h2>
      {pending.map((note) => (
        <PendingNoteItem
          key={note.id}
          note={note}
          me={me}
          onRetry={() => writing.retry(note)}
          onTakeBack={() => {
            writing.forget(note);
            draft.write([note.body, draft.text].filter(Boolean).join('\n'));
            onOpen();
          }}
        />
      ))}
      {open && (
        <NoteBox
          draft={draft}
          label={`Note on frame ${shown}`}
          placeholder="What do you see on this frame?"
          send="Pin it here"
          focused
          onLeave={onLeave}
          onSend={(body) => {
            writing.write({ threadId: null, frame, body, draft: draftName });
            onSent();
          }}
        />
      )}
    </section>
  );
}
