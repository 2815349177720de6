import { useCallback, useEffect } from 'react';
import { Outlet, ScrollRestoration, useParams } from 'react-router';
import { useLiveProduction } from '../features/live/useLiveProduction.ts';
import { Header } from './Header.tsx';
import { KeyList } from './KeyList.tsx';
import { LineNote } from './LineNote.tsx';
import { RouteAnnouncer } from './RouteAnnouncer.tsx';
import { SessionEndedDialog } from './SessionEndedDialog.tsx';
import { setSessionEnded } from './sessionEnded.ts';

/** Around every page of a production: the header, the live line, the list of keys. */
export function AppFrame() {
  const slug = useParams().slug!;
  // Whoever comes in has passed the gate; an end before that belongs to someone who left.
  useEffect(() => setSessionEnded(false), []);
  useLiveProduction(
    slug,
    useCallback(() => setSessionEnded(true), []),
  );

  return (
    <>
      <a
        href="#main"
        className="fixed top-2 left-2 z-50 -translate-y-20 flex min-h-11 items-center rounded-control bg-ink px-3 font-semibold no-underline text-sheet focus:translate-y-0"
      >
        Skip to the page
      </a>
      <Header slug={slug} />
      <main id="main" tabIndex={-1} className="outline-none">
        <Outlet key={slug} />
      </main>
      <LineNote />
      <KeyList slug={slug} />
      <SessionEndedDialog />
      <RouteAnnouncer />
      <ScrollRestoration getKey={(location) => location.pathname} />
    </>
  );
}
