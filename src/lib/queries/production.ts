import { queryOptions, skipToken } from '@tanstack/react-query';
import type { Person } from '../../../shared/api/people.ts';
import { productionContracts } from '../../../shared/api/productions.ts';
import { call } from '../call.ts';

/** Everything cached of a production lies under this key. */
export const productionKey = (slug: string) => ['production', slug] as const;

/** A production and its people. */
export function productionOptions(slug: string) {
  return queryOptions({
    queryKey: [...productionKey(slug), 'about'],
    queryFn: ({ signal }) => call(productionContracts.read, { params: { slug }, signal }),
  });
}

/** Who has the production open now. Filled by the socket only. */
export function hereOptions(slug: string) {
  return queryOptions<Person[]>({
    queryKey: [...productionKey(slug), 'here'],
    queryFn: skipToken,
    staleTime: 'static',
  });
}

/**
 * Number of the last event whose effect is in the cache. It outlives the page, so that whoever comes back to a production
 * starts from what the cache holds and not from what the server says now.
 */
export function seenOptions(slug: string) {
  return queryOptions<number>({
    queryKey: [...productionKey(slug), 'seen'],
    queryFn: skipToken,
    staleTime: 'static',
    gcTime: Number.POSITIVE_INFINITY,
  });
}
