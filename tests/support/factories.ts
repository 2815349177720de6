import { randomUUID } from 'node:crypto';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { Role } from '../../shared/api/people.ts';
import type { Take } from '../../shared/api/takes.ts';
import type { Thread } from '../../shared/api/threads.ts';
import type { Deps } from '../../server/deps.ts';
import { Membership } from '../../server/entities/Membership.ts';
import { Production } from '../../server/entities/Production.ts';
import { User } from '../../server/entities/User.ts';
import { type PostGiven, postTake } from '../../server/services/posting.service.ts';
import { hashPassword } from '../../server/services/session.service.ts';
import { pinNote } from '../../server/services/threads.service.ts';
import { drawToss } from './pictures.ts';

/** Everyone built here signs in with it; hashing is slow on purpose, so it is done once. */
export const PASSWORD = 'a kite over the yard';
const passwordHash = hashPassword(PASSWORD);

let count = 0;

/** What the services work with, without the queue: a take that is built here is not read unless a test asks. */
function quiet(deps: Deps): Deps {
  return { ...deps, readings: { add() {}, resume: async () => {}, close: async () => {} } };
}

export async function buildUser(deps: Deps, given: Partial<User> = {}): Promise<User> {
  count += 1;
  const user = deps.dataSource.manager.create(User, {
    id: randomUUID(),
    email: `member${count}@spandrel.test`,
    name: `Member ${count}`,
    initials: `M${count % 10}`,
    passwordHash: await passwordHash,
    ...given,
  });
  await deps.dataSource.manager.insert(User, user);
  return user;
}

export async function buildProduction(deps: Deps, given: Partial<Production> = {}): Promise<Production> {
  count += 1;
  const id = randomUUID();
  await deps.dataSource.manager.insert(Production, {
    id,
    slug: `production-${count}`,
    name: `Production ${count}`,
    ...given,
  });
  return deps.dataSource.manager.findOneByOrFail(Production, { id });
}

/** Someone on a production; both are made when they are not given. */
export async function buildMember(
  deps: Deps,
  given: { production?: Production; user?: User; role?: Role } = {},
): Promise<{ user: User; production: Production; role: Role }> {
  const production = given.production ?? (await buildProduction(deps));
  const user = given.user ?? (await buildUser(deps));
  const role = given.role ?? 'animator';
  await deps.dataSource.manager.insert(Membership, { productionId: production.id, userId: user.id, role });
  return { user, production, role };
}

export interface TakeGiven {
  production?: Production;
  /** Who posts it; a new animator when left out. */
  user?: User;
  shotNumber?: string;
  frames?: number;
  post?: Partial<PostGiven>;
  /** Has it read by the real engine. */
  read?: boolean;
}

/** A posted take with small drawn frames on disk, through the service that posts for real. */
export async function buildTake(
  deps: Deps,
  given: TakeGiven = {},
): Promise<{ take: Take; user: User; production: Production }> {
  const production = given.production ?? (await buildProduction(deps));
  const user = given.user ?? (await buildMember(deps, { production })).user;
  const folder = await mkdtemp(path.join(tmpdir(), 'spandrel-strip-'));
  try {
    const strip = await drawToss(folder, { frames: given.frames ?? 3 });
    const post: PostGiven = {
      shotNumber: given.shotNumber ?? '010-0010',
      shotTitle: 'A ball crosses the yard',
      fps: { num: 24, den: 1 },
      hold: null,
      firstFrame: 1001,
      changed: 'Opened the gaps out of the hand.',
      intended: 'It should feel heavy.',
      ...given.post,
    };
    const take = await postTake(given.read ? deps : quiet(deps), user.id, production.slug, strip, post);
    return { take, user, production };
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}

/** A thread on a take, which is posted when it is not given. */
export async function buildThread(
  deps: Deps,
  given: { take?: Take; user?: User; production?: Production; frame?: number; body?: string } = {},
): Promise<{ thread: Thread; takeId: string; user: User; production: Production }> {
  const posted =
    given.take && given.user && given.production
      ? { take: given.take, user: given.user, production: given.production }
      : await buildTake(deps, given);
  const { frame = 1, body = 'The gaps close too early.' } = given;
  const thread = await pinNote(deps, posted.user.id, posted.take.id, { frame, body });
  return { thread, takeId: posted.take.id, user: posted.user, production: posted.production };
}
