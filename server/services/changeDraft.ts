import type { EntityManager } from 'typeorm';
import { Draft } from '../entities/Draft.ts';
import type { Deps } from '../deps.ts';
import { AppError, notFound } from '../errors.ts';

/** Changes a draft while nobody else does: batches may arrive side by side. */
export function changeDraft<Answer>(
  deps: Deps,
  draftId: string,
  change: (manager: EntityManager, draft: Draft) => Promise<Answer>,
): Promise<Answer> {
  return deps.dataSource.transaction(async (manager) => {
    const draft = await manager.findOne(Draft, { where: { id: draftId }, lock: { mode: 'pessimistic_write' } });
    if (!draft) throw notFound('post');
    if (draft.status !== 'open') throw draftClosed();
    const answer = await change(manager, draft);
    await manager.update(Draft, { id: draftId }, { touchedAt: deps.now() });
    return answer;
  });
}

/** The refusal of a change to a draft that was posted. */
export function draftClosed(): AppError {
  return new AppError('draft_closed', 'This strip is posted already; nothing was posted twice.');
}
