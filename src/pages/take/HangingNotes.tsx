import type { Person } from '../../../shared/api/people.ts';
import type { Take } from '../../../shared/api/takes.ts';
import { IconButton } from '../../components/IconButton.tsx';
import { StampRow } from '../../features/stamps/StampRow.tsx';
import { NewNoteCard } from '../../features/threads/NewNoteCard.tsx';
import { ThreadCard } from '../../features/threads/ThreadCard.tsx';
import { useDraft } from '../../features/threads/useDraft.ts';
import type { Playhead } from '../../lib/playhead.ts';
import type { Hanging, useThreads } from './useThreads.ts';

interface HangingNotesProps {
  slug: string;
  take: Take;
  me: Person;
  mayWrite: boolean;
  playhead: Playhead;
  hanging: NonNullable<Hanging>;
  talk: ReturnType<typeof useThreads>;
}

/** The open thread, or the note being written. */
export function HangingNotes({ slug, take, me, mayWrite, playhead, hanging, talk }: HangingNotesProps) {
  const draftName = `note.${take.id}`;
  const draft = useDraft(draftName);
  if (hanging.kind === 'new') {
    return (
      <NewNoteCard
        frame={hanging.frame}
        firstFrame={take.firstFrame}
        draft={draft}
        draftName={draftName}
        me={me}
        pending={hanging.pending}
        open={hanging.writing}
        writing={talk.writing}
        onOpen={() => talk.startNote(hanging.frame)}
        onSent={() => talk.noteSent(hanging.frame)}
        onLeave={talk.close}
      />
    );
  }
  const { thread, pending } = hanging;
  const { place, threads } = talk;
  return (
    <ThreadCard
      key={thread.id}
      thread={thread}
      pending={pending}
      writing={talk.writing}
      firstFrame={take.firstFrame}
      playhead={playhead}
      me={me}
      mayWrite={mayWrite}
      stamps={(note) => (
        <StampRow
          slug={slug}
          takeId={take.id}
          noteId={note.id}
          board={note.stamps}
          me={me}
          what={`the note by ${note.author.name}`}
        />
      )}
      place={
        threads.length > 1 && (
          <span className="flex items-center text-xs text-graphite">
            <IconButton
              label="Note before"
              className="size-8! touch:size-11!"
              disabled={place <= 0}
              onClick={() => talk.step(-1)}
            >
              ‹
            </IconButton>
            {place + 1} of {threads.length}
            <IconButton
              label="Next note"
              className="size-8! touch:size-11!"
              disabled={place >= threads.length - 1}
              onClick={() => talk.step(1)}
            >
              ›
            </IconButton>
          </span>
        )
      }
      onClose={talk.close}
    />
  );
}
