import { useQueryClient } from '@tanstack/react-query';
import { useNavigate, useRevalidator } from 'react-router';
import { Dialog } from '../components/Dialog.tsx';
import { SignInForm } from '../features/session/SignInForm.tsx';
import { paths } from '../lib/paths.ts';
import { sessionOptions } from '../lib/queries/session.ts';
import { socket } from '../lib/socket.ts';
import { setSessionEnded, useSessionEnded } from './sessionEnded.ts';

/**
 * Signing in again over the page one was on, so that nothing written there is lost. Someone else who signs in here
 * starts afresh.
 */
export function SessionEndedDialog() {
  const open = useSessionEnded();
  const client = useQueryClient();
  const navigate = useNavigate();
  const revalidator = useRevalidator();
  const before = client.getQueryData(sessionOptions().queryKey)?.person.id;

  return (
    <Dialog
      open={open}
      onClose={() => {
        setSessionEnded(false);
        client.clear();
        void navigate(paths.signIn());
      }}
      title="You are signed out"
    >
      <p className="mb-4 text-graphite">
        The session ended, perhaps in another window. Sign in to go on; what you wrote on this page is still here.
      </p>
      <SignInForm
        onSignedIn={(session) => {
          setSessionEnded(false);
          if (session.person.id !== before) {
            window.location.assign('/');
            return;
          }
          // The server closed the old socket with the old session.
          socket.disconnect().connect();
          void client.invalidateQueries({ predicate: (query) => query.state.status === 'error' });
          void revalidator.revalidate();
        }}
      />
    </Dialog>
  );
}
