import { hash, verify } from '@node-rs/argon2';
import type { SignIn } from '../../shared/api/session.ts';
import type { Session } from '../../shared/api/session.ts';
import { Membership } from '../entities/Membership.ts';
import { User } from '../entities/User.ts';
import type { Deps } from '../deps.ts';
import { AppError } from '../errors.ts';
import type { PersonParts } from '../presenters/people.presenter.ts';
import { presentSession } from '../presenters/session.presenter.ts';

/** OWASP password storage cheat sheet, argon2id with 19 MiB, from memory. */
const ARGON2ID = { algorithm: 2, memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

/** A hash nobody knows the password of: an unknown address costs the same time as a wrong password. */
const nobody = hash(crypto.randomUUID(), ARGON2ID);

/** Hash of a password as it is stored. */
export function hashPassword(password: string): Promise<string> {
  return hash(password, ARGON2ID);
}

/** The person behind an address and a password. @throws {AppError} `wrong_sign_in`, the same for both. */
export async function verifySignIn(deps: Deps, { email, password }: SignIn): Promise<User> {
  const user = await deps.dataSource.manager.findOneBy(User, { email });
  const matches = await verify(user?.passwordHash ?? (await nobody), password);
  if (!user || !matches) throw new AppError('wrong_sign_in', 'This address and password do not belong together.');
  return user;
}

/** The person a session names; null when they are gone. */
export async function findPerson(deps: Deps, userId: string): Promise<PersonParts | null> {
  return deps.dataSource.manager.findOne(User, {
    where: { id: userId },
    select: { id: true, name: true, initials: true },
  });
}

/** Who is signed in, and on which productions. */
export async function readSession(deps: Deps, person: PersonParts): Promise<Session> {
  const memberships = await deps.dataSource.manager.find(Membership, {
    where: { userId: person.id },
    relations: { production: true },
    order: { production: { name: 'ASC' } },
  });
  return presentSession(person, memberships);
}
