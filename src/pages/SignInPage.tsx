import { useQueryClient } from '@tanstack/react-query';
import { useNavigate, useSearchParams } from 'react-router';
import type { Session } from '../../shared/api/session.ts';
import { BrandMark } from '../components/BrandMark.tsx';
import { SignInDrawing } from '../features/session/SignInDrawing.tsx';
import { SignInForm } from '../features/session/SignInForm.tsx';
import { sessionOptions } from '../lib/queries/session.ts';

/** Only an address of this site: `//elsewhere` would leave it. */
const isOurs = (next: string | null): next is string => next !== null && /^\/(?![/\\])/.test(next);

export function SignInPage() {
  const navigate = useNavigate();
  const client = useQueryClient();
  const [search] = useSearchParams();

  const handleSignedIn = (session: Session) => {
    const next = search.get('next');
    // Whatever someone else had cached in this browser goes.
    client.clear();
    client.setQueryData(sessionOptions().queryKey, session);
    void navigate(isOurs(next) ? next : '/', { replace: true });
  };

  return (
    <main className="grid min-h-dvh lg:grid-cols-[minmax(0,1fr)_minmax(24rem,34rem)]">
      <title>Sign in · Spandrel</title>
      <SignInDrawing />
      <section className="flex flex-col justify-center bg-sheet px-6 py-10 lg:border-l lg:border-rule lg:px-14">
        <div className="mx-auto w-full max-w-sm">
          <p className="mb-8 flex items-center gap-2 font-display text-lg font-bold">
            <BrandMark /> Spandrel
          </p>
          <h1 className="text-3xl">Sign in</h1>
          <p className="mt-2 mb-6 text-graphite">
            The critique room for things in flight. Post a strip, see where the arc leaves the true one, talk about it
            on the picture.
          </p>
          <SignInForm onSignedIn={handleSignedIn} />
        </div>
      </section>
    </main>
  );
}
