import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';
import { ApiProblem } from '../lib/ApiProblem.ts';

const MINUTE_MS = 60_000;

/**
 * The one cache. The socket keeps it fresh, so nothing is stale within a minute, and a refusal (4xx) is an answer that
 * asking again does not change.
 */
export function createQueryClient(onSignInRequired: () => void): QueryClient {
  const onError = (error: unknown) => {
    if (error instanceof ApiProblem && error.code === 'sign_in_required') onSignInRequired();
  };
  return new QueryClient({
    queryCache: new QueryCache({ onError }),
    mutationCache: new MutationCache({ onError }),
    defaultOptions: {
      queries: {
        staleTime: MINUTE_MS,
        retry: (failures, error) => !(error instanceof ApiProblem && isAnswer(error)) && failures < 2,
        refetchOnWindowFocus: false,
      },
    },
  });
}

const isAnswer = (problem: ApiProblem) => problem.status >= 400 && problem.status < 500;
