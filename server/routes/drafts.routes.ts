import { draftContracts } from '../../shared/api/drafts.ts';
import type { Deps } from '../deps.ts';
import { endpoint } from '../http/endpoint.ts';
import { receivePictures } from '../http/receivePictures.ts';
import { addPictures, intakeFolder } from '../services/draftPictures.service.ts';
import { cutStrip, discardDraft, readDraft, removePicture, startDraft } from '../services/drafts.service.ts';
import { postDraft } from '../services/postDraft.ts';

export const draftRoutes = (deps: Deps) => [
  endpoint(draftContracts.start, ({ user, params }) => startDraft(deps, user.id, params.slug)),
  endpoint(draftContracts.read, ({ user, params }) => readDraft(deps, user.id, params.draftId)),
  endpoint(draftContracts.addPictures, async ({ user, params, req, res }) => {
    const folder = await intakeFolder(deps, user.id, params.draftId);
    const files = await receivePictures(req, res, { field: draftContracts.addPictures.files!, folder });
    return addPictures(deps, user.id, params.draftId, files);
  }),
  endpoint(draftContracts.removePicture, ({ user, params }) =>
    removePicture(deps, user.id, params.draftId, params.name),
  ),
  endpoint(draftContracts.cut, ({ user, params, body }) => cutStrip(deps, user.id, params.draftId, body.grid)),
  endpoint(draftContracts.post, ({ user, params, body }) => postDraft(deps, user.id, params.draftId, body)),
  endpoint(draftContracts.discard, ({ user, params }) => discardDraft(deps, user.id, params.draftId)),
];
