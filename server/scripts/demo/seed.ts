import { randomUUID } from 'node:crypto';
import { rm } from 'node:fs/promises';
import path from 'node:path';
import { verify } from '@node-rs/argon2';
import { In } from 'typeorm';
import type { AnalysisPool } from '../../analysis/pool.ts';
import type { Deps } from '../../deps.ts';
import { Membership } from '../../entities/Membership.ts';
import { Production } from '../../entities/Production.ts';
import { Take } from '../../entities/Take.ts';
import { User } from '../../entities/User.ts';
import { createReadingQueue } from '../../services/readingQueue.ts';
import { hashPassword } from '../../services/session.service.ts';
import { takeFolder } from '../../storage/folders.ts';
import { type Cast, playStory, type StoryDeps } from './playStory.ts';
import { DEMO_PASSWORD, DEMO_PEOPLE, DEMO_PRODUCTION, type DemoPersonKey } from './people.ts';
import { STORY } from './story.ts';

export interface DemoSignIn {
  name: string;
  role: string;
  email: string;
  password: string;
}

export type SeedDeps = Pick<Deps, 'dataSource' | 'dataDir' | 'log'> & {
  analysis: Pick<AnalysisPool, 'analyse'>;
  announce?: ((sentence: string) => void) | undefined;
};

const EMAILS = Object.values(DEMO_PEOPLE).map(({ email }) => email);
const HOUR = 3_600_000;

/** Events that a whole story leaves: one for each step, and one more when a posted take is read. */
export const EVENTS_OF_STORY = STORY.length + STORY.filter(({ does }) => does === 'post').length;

/**
 * Fills an empty database with the demo production, through the same services as everyone else. A run that was broken
 * off is cleared away and begun again; any other database is left as it is. Answers the demo sign-ins that work.
 */
export async function seedDemo(deps: SeedDeps): Promise<DemoSignIn[]> {
  await clearUnfinished(deps);
  if (!(await deps.dataSource.manager.existsBy(User, {}))) await fill(deps);
  return signInsThatWork(deps);
}

async function fill(deps: SeedDeps): Promise<void> {
  const began = Date.now();
  deps.announce?.(`Filling the empty database with a demo production, “${DEMO_PRODUCTION.name}”. This happens once.`);
  const cast = await invite(deps, new Date(began - 240 * HOUR));
  const clock = { now: new Date(began) };
  const readings = followReadings();
  const parts = { ...deps, broadcast: readings.broadcast, now: () => clock.now };
  const queue = createReadingQueue(parts, { analysis: deps.analysis, lanes: 1 });
  const storyDeps: StoryDeps = { ...parts, readings: queue, clock, began, whenRead: readings.whenRead };
  const drawings = path.join(deps.dataDir, 'demo-drawings');
  try {
    await playStory(storyDeps, cast, drawings);
  } finally {
    await queue.close();
    await rm(drawings, { recursive: true, force: true });
  }
}

/** Makes the people and their production. */
async function invite({ dataSource }: SeedDeps, joinedAt: Date): Promise<Cast> {
  const passwordHash = await hashPassword(DEMO_PASSWORD);
  const productionId = randomUUID();
  const people = {} as Record<DemoPersonKey, string>;
  await dataSource.transaction(async (manager) => {
    await manager.insert(Production, { id: productionId, ...DEMO_PRODUCTION, tolerances: null, createdAt: joinedAt });
    for (const [key, { name, initials, email, role }] of Object.entries(DEMO_PEOPLE)) {
      const id = randomUUID();
      people[key as DemoPersonKey] = id;
      await manager.insert(User, { id, email, name, initials, passwordHash, createdAt: joinedAt });
      await manager.insert(Membership, { productionId, userId: id, role, joinedAt });
    }
  });
  return { slug: DEMO_PRODUCTION.slug, people };
}

/** Hears of readings where everyone else would: on the broadcast. Nobody else listens yet. */
function followReadings() {
  const read = new Set<string>();
  const waiting = new Map<string, () => void>();
  const broadcast: Deps['broadcast'] = {
    event(_productionId, _slug, event) {
      if (event.kind !== 'take:read') return;
      const { id } = event.payload.card.take;
      read.add(id);
      waiting.get(id)?.();
    },
    progress() {},
    endSession() {},
  };
  const whenRead = (takeId: string): Promise<void> =>
    new Promise((resolve) => {
      if (read.has(takeId)) resolve();
      else waiting.set(takeId, resolve);
    });
  return { broadcast, whenRead };
}

/** The server does not listen before the story is told, so a demo with fewer events was broken off. */
async function clearUnfinished({ dataSource, dataDir }: SeedDeps): Promise<void> {
  const { manager } = dataSource;
  const production = await manager.findOneBy(Production, { slug: DEMO_PRODUCTION.slug });
  if (!production || production.eventSeq >= EVENTS_OF_STORY) return;
  const members = await manager.find(Membership, {
    where: { productionId: production.id },
    relations: { user: true },
  });
  if (!members.every(({ user }) => EMAILS.includes(user.email))) return;
  const takes = await manager.find(Take, { where: { productionId: production.id }, select: { id: true } });
  await dataSource.transaction(async (transaction) => {
    await transaction.delete(Production, { id: production.id });
    await transaction.delete(User, { email: In(EMAILS) });
  });
  for (const { id } of takes) await rm(takeFolder(dataDir, id), { recursive: true, force: true });
}

/** Only those whose password is still the printed one. */
async function signInsThatWork({ dataSource }: SeedDeps): Promise<DemoSignIn[]> {
  const users = await dataSource.manager.findBy(User, { email: In(EMAILS) });
  const checked = await Promise.all(
    Object.values(DEMO_PEOPLE).map(async ({ name, role, email }) => {
      const user = users.find((candidate) => candidate.email === email);
      const works = user !== undefined && (await verify(user.passwordHash, DEMO_PASSWORD));
      return works ? [{ name, role, email, password: DEMO_PASSWORD }] : [];
    }),
  );
  return checked.flat();
}
