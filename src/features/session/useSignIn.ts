import { useMutation, useQueryClient } from '@tanstack/react-query';
import { type SignIn, sessionContracts } from '../../../shared/api/session.ts';
import { call } from '../../lib/call.ts';
import { sessionOptions } from '../../lib/queries/session.ts';

/** Signs in and keeps who that is. */
export function useSignIn() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: SignIn) => call(sessionContracts.signIn, { body }),
    onSuccess: (session) => client.setQueryData(sessionOptions().queryKey, session),
  });
}
