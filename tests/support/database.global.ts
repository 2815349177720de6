import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { TestProject } from 'vitest/node';
import { startMariadb } from '../../server/database/mariadb.ts';
import type { DatabaseConnection } from '../../server/env.ts';

declare module 'vitest' {
  interface ProvidedContext {
    /** The real MariaDB all tests share; each file makes databases of its own in it, see support/testDatabase.ts. */
    mariadb: DatabaseConnection;
  }
}

interface SharedDatabase {
  users: number;
  started: Promise<{ connection: DatabaseConnection; end(): Promise<void> }>;
}

// Every vitest project loads this file for itself; only the process is common to all of them.
const shared = globalThis as { spandrelTestDatabase?: SharedDatabase };

/** Starts one MariaDB for all projects of a run in a throw-away folder, and ends it with the last of them. */
export async function setup(project: TestProject): Promise<() => Promise<void>> {
  shared.spandrelTestDatabase ??= { users: 0, started: startThrowAway() };
  const mine = shared.spandrelTestDatabase;
  mine.users += 1;
  const { connection, end } = await mine.started;
  project.provide('mariadb', connection);
  return async () => {
    mine.users -= 1;
    if (mine.users > 0) return;
    delete shared.spandrelTestDatabase;
    await end();
  };
}

async function startThrowAway() {
  const folder = await mkdtemp(path.join(tmpdir(), 'spandrel-test-db-'));
  const remove = () => rm(folder, { recursive: true, force: true });
  try {
    const { connection, stop } = await startMariadb({
      dataDir: folder,
      password: 'only-on-the-loopback-of-a-test-run',
      furtherDatabases: 'spandrel\\_test\\_%',
      durable: false,
    });
    return { connection, end: () => stop().finally(remove) };
  } catch (error) {
    await remove();
    throw error;
  }
}
