import type { Role } from '../api/people.ts';

export interface Actor {
  userId: string;
  /** Role in the production that the thing belongs to; null for a stranger. */
  role: Role | null;
}

/** What a rule may look at. Only takes have an owner in this sense. */
export interface Thing {
  postedById?: string;
}

type Rule = (actor: Actor, thing: Thing) => boolean;

const member: Rule = (actor) => actor.role !== null;
const reviewer: Rule = (actor) => actor.role === 'mentor' || actor.role === 'owner';
const poster: Rule = (actor, thing) => member(actor, thing) && thing.postedById === actor.userId;

const RULES = {
  'production:read': member,
  'take:post': member,
  'take:readAgain': member,
  /** Whoever posted it, and those who keep the shots in order. */
  'take:move': (actor, thing) => poster(actor, thing) || reviewer(actor, thing) || actor.role === 'producer',
  /** Nobody clears their own. */
  'take:decide': (actor, thing) => reviewer(actor, thing) && thing.postedById !== actor.userId,
  'note:write': member,
  'stamp:set': member,
} satisfies Record<string, Rule>;

export type Verb = keyof typeof RULES;

/**
 * Whether someone may do something. Pure: the server enforces it, the client hides what it forbids.
 * A stranger to the production may do nothing.
 */
export function can(actor: Actor, verb: Verb, thing: Thing = {}): boolean {
  return actor.role !== null && RULES[verb](actor, thing);
}
