import type { Person } from '../../../shared/api/people.ts';
import { Button } from '../../components/Button.tsx';
import { InkRing } from '../../components/InkRing.tsx';
import type { PendingNote } from './useNotes.ts';

interface PendingNoteItemProps {
  note: PendingNote;
  me: Person;
  onRetry: () => void;
  onTakeBack: () => void;
}

/** A note that is on its way, or that did not arrive: then it says why, and what to do. */
export function PendingNoteItem({ note, me, onRetry, onTakeBack }: PendingNoteItemProps) {
  return (
    <article
      aria-label={note.failed ? 'Your note, not sent' : 'Your note, on its way'}
      className="grid grid-cols-[32px_minmax(0,1fr)] gap-2 border-t border-rule py-1.5 first:border-t-0"
    >
      <InkRing person={me} named className="mt-px self-start" />
      <div>
        <p>
          <b className="font-semibold">{me.name}</b>{' '}
          <span className="ml-0.5 text-xs text-graphite">{note.failed ? 'not sent' : 'sending…'}</span>
        </p>
        <p className={`[overflow-wrap:anywhere] whitespace-pre-wrap ${note.failed ? '' : 'text-graphite'}`}>
          {note.body}
        </p>
        {note.failed && (
          <div
            role="alert"
            className="mt-1 flex flex-wrap items-center gap-2 rounded-control border border-ink px-2.5 py-1.5 text-sm"
          >
            <span className="min-w-0 flex-1">{note.failed}</span>
            <Button size="small" kind="quiet" onClick={onTakeBack}>
              Back to the box
            </Button>
            <Button size="small" onClick={onRetry}>
              Send again
            </Button>
          </div>
        )}
      </div>
    </article>
  );
}
