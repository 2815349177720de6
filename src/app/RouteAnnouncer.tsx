import { useEffect, useState } from 'react';
import { useLocation } from 'react-router';

/** Says the new page's title to screen readers, which a change of address inside one document does not do. */
export function RouteAnnouncer() {
  const { pathname } = useLocation();
  const [said, setSaid] = useState('');

  useEffect(() => {
    // The page sets its title while it renders; one frame later it is there.
    const frame = requestAnimationFrame(() => setSaid(document.title));
    return () => cancelAnimationFrame(frame);
  }, [pathname]);

  return (
    <output className="sr-only" aria-live="polite">
      {said}
    </output>
  );
}
