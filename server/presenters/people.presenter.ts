import type { Member, Person, Role } from '../../shared/api/people.ts';
import type { Membership } from '../entities/Membership.ts';

/** What a person needs to be shown; a `User` has it, and so does whoever is signed in. */
export type PersonParts = Pick<Person, 'id' | 'name' | 'initials'>;

/** A person without their address and password. */
export function presentPerson(user: PersonParts): Person {
  return { id: user.id, name: user.name, initials: user.initials };
}

/** Someone who left the production keeps what they wrote; they are shown as an animator. */
export function presentMember(user: PersonParts, role: Role | undefined): Member {
  return { ...presentPerson(user), role: role ?? 'animator' };
}

/** A member with their role. `user` is loaded. */
export function presentMembership(membership: Membership): Member {
  return presentMember(membership.user, membership.role);
}
