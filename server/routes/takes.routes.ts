import { takeContracts } from '../../shared/api/takes.ts';
import type { Deps } from '../deps.ts';
import { endpoint } from '../http/endpoint.ts';
import { findPicture, findThumbnail } from '../services/pictures.service.ts';
import { readAgain, readReading } from '../services/readings.service.ts';
import { decideTake, moveTake, readTake } from '../services/takes.service.ts';

export const takeRoutes = (deps: Deps) => [
  endpoint(takeContracts.read, ({ user, params }) =>
    readTake(deps, user.id, params.slug, params.shotNumber, params.takeNumber),
  ),
  endpoint(takeContracts.reading, ({ user, params }) => readReading(deps, user.id, params.takeId)),
  endpoint(takeContracts.readAgain, ({ user, params }) => readAgain(deps, user.id, params.takeId)),
  endpoint(takeContracts.picture, ({ user, params }) => findPicture(deps, user.id, params.takeId, params.frame)),
  endpoint(takeContracts.thumbnail, ({ user, params }) => findThumbnail(deps, user.id, params.takeId, params.frame)),
  endpoint(takeContracts.decide, ({ user, params, body }) => decideTake(deps, user.id, params.takeId, body)),
  endpoint(takeContracts.move, ({ user, params, body }) => moveTake(deps, user.id, params.takeId, body)),
];
