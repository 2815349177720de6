import { useMutation, useMutationState, useQueryClient } from '@tanstack/react-query';
import type { Person } from '../../../shared/api/people.ts';
import { type StampBoard, type StampKind, stampContracts } from '../../../shared/api/stamps.ts';
import { call } from '../../lib/call.ts';
import { applyStamps } from '../../lib/queries/threads.ts';
import { withStamp } from './stampBoards.ts';

export interface StampTarget {
  slug: string;
  takeId: string;
  /** Null: the stamps of the take itself. */
  noteId: string | null;
}

interface Setting {
  kind: StampKind;
  on: boolean;
}

function send({ takeId, noteId }: StampTarget, { kind, on }: Setting): Promise<StampBoard> {
  if (noteId === null) {
    return call(on ? stampContracts.stampTake : stampContracts.unstampTake, { params: { takeId, kind } });
  }
  return call(on ? stampContracts.stampNote : stampContracts.unstampNote, { params: { noteId, kind } });
}

/**
 * Setting and taking off one's own stamps. The board shown is the newest that the server sent with what is still on its
 * way laid over it, so nothing has to be rolled back: when a call fails, its overlay goes with it.
 */
export function useStamps(target: StampTarget, me: Person, board: StampBoard) {
  const client = useQueryClient();
  const mutationKey = ['stamp', target.takeId, target.noteId];
  const { mutate, error } = useMutation({
    mutationKey,
    // One after the other: a quick second click may not overtake the first.
    scope: { id: mutationKey.join(' ') },
    mutationFn: (setting: Setting) => send(target, setting),
    onSuccess: (answer) =>
      applyStamps(client, target.slug, { takeId: target.takeId, noteId: target.noteId, board: answer }),
  });
  const underWay = useMutationState({
    filters: { mutationKey, exact: true, status: 'pending' },
    select: (mutation) => mutation.state.variables as Setting,
  });
  const shown = underWay.reduce((have, { kind, on }) => withStamp(have, kind, me, on), board);
  return { shown, set: (kind: StampKind, on: boolean) => mutate({ kind, on }), error };
}
