import { useMutation, useQueryClient } from '@tanstack/react-query';
import { draftContracts, type Post } from '../../../shared/api/drafts.ts';
import type { Grid } from '../../../shared/finding/grid.ts';
import { call } from '../../lib/call.ts';
import { draftOptions } from '../../lib/queries/draft.ts';
import { applyTake } from '../../lib/queries/take.ts';

/** Posts a draft as the next take of its shot. */
export function usePost(slug: string, draftId: string | null) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Post) => call(draftContracts.post, { params: { draftId: draftId! }, body }),
    // The draft stays in the cache until the page is left: asking for it once more would answer that it is closed.
    onSuccess: (take) => applyTake(client, slug, take),
  });
}

/** Changes of a draft that are on their way: nothing is posted before they arrived. */
export const draftChanges = (draftId: string | null) => ['draft-changes', draftId] as const;

/** Corrects how the strip picture is cut; one correction after the other, so that the last one stands. */
export function useCut(draftId: string | null) {
  const client = useQueryClient();
  return useMutation({
    mutationKey: draftChanges(draftId),
    scope: { id: `cut ${draftId}` },
    mutationFn: (grid: Grid | null) => call(draftContracts.cut, { params: { draftId: draftId! }, body: { grid } }),
    onSuccess: (draft) => client.setQueryData(draftOptions(draft.id).queryKey, draft),
  });
}

/** Takes one picture out of the draft. */
export function useRemovePicture(draftId: string | null) {
  const client = useQueryClient();
  return useMutation({
    mutationKey: draftChanges(draftId),
    scope: { id: `pictures ${draftId}` },
    mutationFn: (name: string) => call(draftContracts.removePicture, { params: { draftId: draftId!, name } }),
    onSuccess: (draft) => client.setQueryData(draftOptions(draft.id).queryKey, draft),
  });
}
