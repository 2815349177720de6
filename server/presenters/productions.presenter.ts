import type { Role } from '../../shared/api/people.ts';
import type { Production as WireProduction } from '../../shared/api/productions.ts';
import { DEFAULT_TOLERANCES } from '../../shared/reading/tolerances.ts';
import type { Membership } from '../entities/Membership.ts';
import type { Production } from '../entities/Production.ts';
import { presentMembership } from './people.presenter.ts';

/** A production as one of its members sees it. `user` of each membership is loaded. */
export function presentProduction(production: Production, memberships: Membership[], myRole: Role): WireProduction {
  return {
    id: production.id,
    slug: production.slug,
    name: production.name,
    myRole,
    members: memberships.map(presentMembership),
    tolerances: production.tolerances ?? DEFAULT_TOLERANCES,
    eventSeq: production.eventSeq,
  };
}
