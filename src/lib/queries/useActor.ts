import { useSuspenseQuery } from '@tanstack/react-query';
import type { Person } from '../../../shared/api/people.ts';
import type { Actor } from '../../../shared/policy/can.ts';
import { productionOptions } from './production.ts';
import { sessionOptions } from './session.ts';

/** Whoever is signed in, as an actor of this production for `can(…)`, and as a person. */
export function useActor(slug: string): Actor & { person: Person } {
  const { data: session } = useSuspenseQuery(sessionOptions());
  const { data: production } = useSuspenseQuery(productionOptions(slug));
  if (!session) throw new Error('A page of a production was shown without a session.');
  return { userId: session.person.id, role: production.myRole, person: session.person };
}
