import { queryOptions } from '@tanstack/react-query';
import { sessionContracts, type Session } from '../../../shared/api/session.ts';
import { ApiProblem } from '../ApiProblem.ts';
import { call } from '../call.ts';

/** Who is signed in, or null. */
export function sessionOptions() {
  return queryOptions({
    queryKey: ['session'],
    queryFn: async ({ signal }): Promise<Session | null> => {
      try {
        return await call(sessionContracts.read, { signal });
      } catch (error) {
        if (error instanceof ApiProblem && error.status === 401) return null;
        throw error;
      }
    },
    staleTime: 5 * 60_000,
  });
}
