import { useMutation, useQueryClient } from '@tanstack/react-query';
import { sessionContracts } from '../../../shared/api/session.ts';
import { call } from '../../lib/call.ts';
import { sessionOptions } from '../../lib/queries/session.ts';
import { socket } from '../../lib/socket.ts';

/**
 * Ends the session and forgets everything that was cached for this person.
 * @param leave goes to a page that needs no session; what is on screen now would ask for its data again
 */
export function useSignOut(leave: () => Promise<void> | void) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => {
      // The server ends this socket with the session; leaving first keeps that from looking like a lost line.
      socket.disconnect();
      return call(sessionContracts.signOut, {});
    },
    onSuccess: async () => {
      await leave();
      client.clear();
      client.setQueryData(sessionOptions().queryKey, null);
    },
    onError: () => socket.connect(),
  });
}
