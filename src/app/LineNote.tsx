import type { ReactNode } from 'react';
import { Link } from 'react-router';
import { Button } from '../components/Button.tsx';
import { useLineState } from '../lib/lineState.ts';
import type { LineState } from '../lib/liveProduction.ts';

const NOTES: Partial<Record<LineState, ReactNode>> = {
  reconnecting: 'Reconnecting. What you write is kept.',
  outdated: (
    <>
      Spandrel has moved on since this page was opened.
      <Button size="small" onClick={() => window.location.reload()}>
        Load it anew
      </Button>
    </>
  ),
  closed: (
    <span>
      This production is no longer open to you; its owner can say why. <Link to="/">Go to your own</Link>
    </span>
  ),
};

/** One quiet line while the live connection is away. */
export function LineNote() {
  const note = NOTES[useLineState()];
  if (!note) return null;
  return (
    <output className="fixed bottom-3 left-3 z-40 flex items-center gap-3 rounded-control border border-ink bg-sheet px-3 py-2 text-sm max-md:right-3 max-md:bottom-20">
      {note}
    </output>
  );
}
