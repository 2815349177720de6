import type { Session } from '../../shared/api/session.ts';
import type { Membership } from '../entities/Membership.ts';
import { type PersonParts, presentPerson } from './people.presenter.ts';

/** Who is signed in. `production` of each membership is loaded. */
export function presentSession(person: PersonParts, memberships: Membership[]): Session {
  return {
    person: presentPerson(person),
    productions: memberships.map(({ production, role }) => ({ slug: production.slug, name: production.name, role })),
  };
}
