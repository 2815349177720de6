import { feedContracts } from '../../shared/api/feed.ts';
import { productionContracts } from '../../shared/api/productions.ts';
import { shotContracts } from '../../shared/api/shots.ts';
import type { Deps } from '../deps.ts';
import { endpoint } from '../http/endpoint.ts';
import { readEvents } from '../services/events.service.ts';
import { readFeed } from '../services/feed.service.ts';
import { readProduction } from '../services/productions.service.ts';
import { readSheet, readShot } from '../services/shots.service.ts';

export const productionRoutes = (deps: Deps) => [
  endpoint(productionContracts.read, ({ user, params }) => readProduction(deps, user.id, params.slug)),
  endpoint(productionContracts.events, ({ user, params, query }) => readEvents(deps, user.id, params.slug, query)),
  endpoint(feedContracts.page, ({ user, params, query }) => readFeed(deps, user.id, params.slug, query)),
  endpoint(shotContracts.sheet, async ({ user, params }) => ({ shots: await readSheet(deps, user.id, params.slug) })),
  endpoint(shotContracts.read, ({ user, params }) => readShot(deps, user.id, params.slug, params.shotNumber)),
];
