import { stampContracts } from '../../shared/api/stamps.ts';
import { threadContracts } from '../../shared/api/threads.ts';
import type { Deps } from '../deps.ts';
import { endpoint } from '../http/endpoint.ts';
import { setNoteStamp, setTakeStamp } from '../services/stamps.service.ts';
import { listThreads, pinNote, replyInThread } from '../services/threads.service.ts';

export const threadRoutes = (deps: Deps) => [
  endpoint(threadContracts.list, async ({ user, params }) => ({
    threads: await listThreads(deps, user.id, params.takeId),
  })),
  endpoint(threadContracts.pin, ({ user, params, body }) => pinNote(deps, user.id, params.takeId, body)),
  endpoint(threadContracts.reply, ({ user, params, body }) => replyInThread(deps, user.id, params.threadId, body.body)),
  endpoint(stampContracts.stampNote, ({ user, params }) =>
    setNoteStamp(deps, user.id, params.noteId, params.kind, true),
  ),
  endpoint(stampContracts.unstampNote, ({ user, params }) =>
    setNoteStamp(deps, user.id, params.noteId, params.kind, false),
  ),
  endpoint(stampContracts.stampTake, ({ user, params }) =>
    setTakeStamp(deps, user.id, params.takeId, params.kind, true),
  ),
  endpoint(stampContracts.unstampTake, ({ user, params }) =>
    setTakeStamp(deps, user.id, params.takeId, params.kind, false),
  ),
];
