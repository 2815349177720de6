import { randomUUID } from 'node:crypto';
import { link, mkdir, readFile, rename, rm, statfs, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { startTimeOf } from '../../database/processTable.ts';
import { StartupError, writeFault } from '../../database/startupError.ts';

const leastFreeBytes = 300 * 1024 * 1024;

/**
 * Makes the data folder if need be, checks that there is room in it, and takes it for this process.
 * @returns what gives it back.
 * @throws {StartupError} when another run uses it, it cannot be written, or the disk is nearly full.
 */
export async function takeDataFolder(dataDir: string): Promise<() => Promise<void>> {
  try {
    await mkdir(dataDir, { recursive: true, mode: 0o700 });
    const { bavail, bsize } = await statfs(dataDir);
    if (bavail * bsize < leastFreeBytes) {
      const free = Math.floor((bavail * bsize) / 1024 / 1024);
      throw new StartupError(
        `The disk that holds ${dataDir} has ${free} MB free and Spandrel needs 300 MB; free some space or point DATA_DIR elsewhere.`,
      );
    }
    return await takeLock(dataDir);
  } catch (error) {
    throw error instanceof StartupError ? error : (writeFault(error, dataDir) ?? error);
  }
}

interface Holder {
  pid: number;
  startTime: string;
}

async function takeLock(dataDir: string): Promise<() => Promise<void>> {
  const lock = path.join(dataDir, 'in-use');
  const mine = `${lock}.${randomUUID()}`;
  const holder: Holder = { pid: process.pid, startTime: startTimeOf(process.pid) ?? '' };
  await writeFile(mine, JSON.stringify(holder), { flush: true });
  try {
    // A link either is there or is not: of two starts at the same moment one gets it, and it is never half written.
    while (!(await linked(mine, lock))) await removeStale(lock, dataDir);
  } finally {
    await rm(mine, { force: true });
  }
  return () => rm(lock, { force: true });
}

async function linked(from: string, to: string): Promise<boolean> {
  try {
    await link(from, to);
    return true;
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'EEXIST') return false;
    throw error;
  }
}

/** Takes away the lock of a run that is no longer there. Moving it first makes sure that only one start does so. */
async function removeStale(lock: string, dataDir: string): Promise<void> {
  refuseLiving(await readFile(lock, 'utf8').catch(() => ''), dataDir);
  const aside = `${lock}.${randomUUID()}`;
  await rename(lock, aside).catch((error: NodeJS.ErrnoException) => {
    if (error.code !== 'ENOENT') throw error;
  });
  try {
    // Between the look and the move another start may have taken the folder; then its lock goes back where it was.
    refuseLiving(await readFile(aside, 'utf8').catch(() => ''), dataDir);
  } catch (error) {
    await linked(aside, lock);
    throw error;
  } finally {
    await rm(aside, { force: true });
  }
}

function refuseLiving(text: string, dataDir: string): void {
  const { pid, startTime } = parseHolder(text);
  if (pid > 0 && startTimeOf(pid) === startTime) {
    throw new StartupError(
      `${dataDir} is in use by another run of Spandrel (process ${pid}); stop that one or choose another DATA_DIR.`,
    );
  }
}

function parseHolder(text: string): Holder {
  try {
    return JSON.parse(text) as Holder;
  } catch {
    // An unreadable lock was cut off by a crash, so nobody holds it.
    return { pid: 0, startTime: '' };
  }
}
