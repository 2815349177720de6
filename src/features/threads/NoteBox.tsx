import { type FormEvent, type KeyboardEvent, useEffect, useId, useRef } from 'react';
import { Button } from '../../components/Button.tsx';
import type { Draft } from './useDraft.ts';

const MOST = 4000;
const WARN_AT = 3600;

interface NoteBoxProps {
  draft: Draft;
  /** What is being written, for the label: "Note on frame 1011". */
  label: string;
  placeholder: string;
  send: string;
  focused?: boolean;
  onSend: (body: string) => void;
  onLeave?: () => void;
}

/** Where a note or a reply is written. Ctrl and Enter sends; Escape leaves, and the words stay. */
export function NoteBox({ draft, label, placeholder, send, focused = false, onSend, onLeave }: NoteBoxProps) {
  const box = useRef<HTMLTextAreaElement>(null);
  const id = useId();
  useEffect(() => {
    if (!focused) return;
    const before = document.activeElement;
    box.current?.focus({ preventScroll: true });
    box.current?.form?.scrollIntoView({ block: 'nearest' });
    // Whoever came from a button goes on from there.
    return () => {
      if (before instanceof HTMLElement) before.focus({ preventScroll: true });
    };
  }, [focused]);

  const submit = (event?: FormEvent) => {
    event?.preventDefault();
    if (draft.text.trim().length === 0) return box.current?.focus();
    onSend(draft.hand().trim());
  };
  const handleKeys = (event: KeyboardEvent) => {
    if (event.key === 'Enter' && (event.ctrlKey || event.metaKey)) submit();
    else if (event.key === 'Escape' && onLeave) onLeave();
    else return;
    event.preventDefault();
    event.stopPropagation();
  };
  const left = MOST - draft.text.length;
  const active = focused || draft.text.length > 0;
  return (
    <form onSubmit={submit} className="flex scroll-mb-6 flex-wrap items-end gap-2 py-1.5">
      <label htmlFor={id} className="sr-only">
        {label}
      </label>
      <textarea
        ref={box}
        id={id}
        rows={active ? 3 : 1}
        maxLength={MOST}
        value={draft.text}
        placeholder={placeholder}
        onChange={(event) => draft.write(event.target.value)}
        onKeyDown={handleKeys}
        className="min-h-9 min-w-0 flex-1 basis-60 resize-none rounded-control border border-graphite bg-sheet px-3 py-1.5 text-base [field-sizing:content] max-h-60 touch:min-h-11"
      />
      <div className="flex items-center gap-2">
        {left <= MOST - WARN_AT && <span className="font-mono text-xs text-graphite">{left} left</span>}
        {onLeave && (
          <Button kind="quiet" onClick={onLeave}>
            Later
          </Button>
        )}
        {active && (
          <Button type="submit" kind="primary" title="Ctrl and Enter">
            {send}
          </Button>
        )}
      </div>
    </form>
  );
}
