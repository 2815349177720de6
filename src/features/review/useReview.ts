import { useMutation, useQueryClient } from '@tanstack/react-query';
import { type Decision, takeContracts } from '../../../shared/api/takes.ts';
import { call } from '../../lib/call.ts';
import { applyTake } from '../../lib/queries/take.ts';

/** Decides on a take: clears it, asks for another pass, or waives what is off. */
export function useDecide(slug: string, takeId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Pick<Decision, 'state' | 'remark'>) => call(takeContracts.decide, { params: { takeId }, body }),
    onSuccess: (take) => applyTake(client, slug, take),
  });
}

/** Moves a take to another shot, where it becomes the next take. */
export function useMove(slug: string, takeId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: { shotNumber: string; shotTitle?: string }) =>
      call(takeContracts.move, { params: { takeId }, body }),
    onSuccess: (take) => applyTake(client, slug, take),
  });
}
