import { queryOptions } from '@tanstack/react-query';
import { draftContracts } from '../../../shared/api/drafts.ts';
import { call } from '../call.ts';

/** A post that is being put together. Every answer of an upload replaces it. */
export function draftOptions(draftId: string) {
  return queryOptions({
    queryKey: ['draft', draftId],
    queryFn: ({ signal }) => call(draftContracts.read, { params: { draftId }, signal }),
    staleTime: Number.POSITIVE_INFINITY,
  });
}
