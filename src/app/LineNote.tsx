import { Button } from '../components/Button.tsx';
import { useLineState } from '../lib/lineState.ts';

/** One quiet line while the live connection is away. */
export function LineNote() {
  const line = useLineState();
  if (line !== 'reconnecting' && line !== 'outdated') return null;
  return (
    <output className="fixed bottom-3 left-3 z-40 flex items-center gap-3 rounded-control border border-ink bg-sheet px-3 py-2 text-sm max-md:right-3 max-md:bottom-20">
      {line === 'reconnecting' ? (
        'Reconnecting. What you write is kept.'
      ) : (
        <>
          Spandrel has moved on since this page was opened.
          <Button size="small" onClick={() => window.location.reload()}>
            Load it anew
          </Button>
        </>
      )}
    </output>
  );
}
