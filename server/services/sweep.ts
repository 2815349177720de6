import { readdir, rm, stat } from 'node:fs/promises';
import path from 'node:path';
import { type EntityTarget, In, LessThan } from 'typeorm';
import { Draft } from '../entities/Draft.ts';
import { Take } from '../entities/Take.ts';
import type { Deps } from '../deps.ts';
import { codeOf } from '../errors.ts';
import { draftFolder, takeFolder } from '../storage/folders.ts';

const HOUR = 60 * 60 * 1000;
const DAY = 24 * HOUR;

/** A post nobody touched for a week is thrown away. */
const DRAFT_LIFE = 7 * DAY;
/** A folder without a row may belong to a post that is being made right now; after an hour it does not. */
const FOLDER_LIFE = HOUR;

type SweepDeps = Pick<Deps, 'dataSource' | 'dataDir' | 'log'>;

/** Throws old drafts away, and folders whose draft or take is not there: what a crash between two steps leaves. */
export async function sweep(deps: SweepDeps): Promise<void> {
  const { manager } = deps.dataSource;
  await manager.delete(Draft, { touchedAt: LessThan(new Date(Date.now() - DRAFT_LIFE)) });
  await manager.delete(Draft, { status: 'posted', touchedAt: LessThan(new Date(Date.now() - DAY)) });
  await sweepFolders(deps, Draft, draftFolder(deps.dataDir, ''));
  await sweepFolders(deps, Take, takeFolder(deps.dataDir, ''));
}

/** A run that ended in the middle of a post leaves the draft locked; nothing posts before the server listens. */
export async function reopenDrafts({ dataSource }: SweepDeps): Promise<void> {
  await dataSource.manager.update(Draft, { status: 'posting' }, { status: 'open' });
}

/** Sweeps now and every day. Answers with what ends it, once a sweep under way is done. */
export function sweepDaily(deps: SweepDeps): () => Promise<void> {
  const run = () => sweep(deps).catch((error: unknown) => deps.log.error({ err: error }, 'sweeping failed'));
  let sweeping = run();
  const timer = setInterval(() => (sweeping = run()), DAY).unref();
  return () => {
    clearInterval(timer);
    return sweeping;
  };
}

async function sweepFolders(
  { dataSource }: SweepDeps,
  entity: EntityTarget<{ id: string }>,
  folder: string,
): Promise<void> {
  const names = await namesIn(folder);
  if (names.length === 0) return;
  const rows = await dataSource.manager.find(entity, { where: { id: In(names) }, select: { id: true } });
  const known = new Set(rows.map(({ id }) => id));
  for (const name of names.filter((each) => !known.has(each))) {
    const stray = path.join(folder, name);
    const { mtimeMs } = await stat(stray);
    if (Date.now() - mtimeMs > FOLDER_LIFE) await rm(stray, { recursive: true, force: true });
  }
}

/** Only names that we give; anything else in there is not ours to remove. */
async function namesIn(folder: string): Promise<string[]> {
  const uuid = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/;
  try {
    return (await readdir(folder)).filter((name) => uuid.test(name));
  } catch (error) {
    if (codeOf(error) === 'ENOENT') return [];
    throw error;
  }
}
