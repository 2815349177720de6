import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { type RunningServer, type StartOptions, startServer } from '../../server/main.ts';
import { createTestDatabase, type TestDatabase } from './testDatabase.ts';

/** The real server on a port of its own, with a database and a data folder of its own. */
export interface TestServer extends RunningServer {
  dataDir: string;
  /** Ends this run and starts the next on the same database and folder. */
  restart(): Promise<void>;
  /** Ends the server and removes its database and folder. */
  remove(): Promise<void>;
}

/** Starts the real server. Call `remove` when the file is done. */
export async function createTestServer(env: Partial<StartOptions['env']> = {}): Promise<TestServer> {
  const dataDir = await mkdtemp(path.join(tmpdir(), 'spandrel-test-'));
  const database = await createTestDatabase();
  const start = () => startOn(database, { DATA_DIR: dataDir, ...env });
  let running: RunningServer;
  try {
    running = await start();
  } catch (error) {
    await removeAll(database, dataDir);
    throw error;
  }
  return {
    dataDir,
    get url() {
      return running.url;
    },
    get deps() {
      return running.deps;
    },
    get live() {
      return running.live;
    },
    get sessions() {
      return running.sessions;
    },
    get address() {
      return running.address;
    },
    get demoSignIns() {
      return running.demoSignIns;
    },
    close: () => running.close(),
    async restart() {
      await running.close();
      running = await start();
    },
    async remove() {
      await running.close();
      await removeAll(database, dataDir);
    },
  };
}

function startOn(database: TestDatabase, env: Partial<StartOptions['env']>): Promise<RunningServer> {
  const { drop: _drop, ...connection } = database;
  return startServer({
    env: {
      HOST: '127.0.0.1',
      PORT: 0,
      DATA_DIR: '',
      LOG_LEVEL: 'silent',
      DEMO: false,
      SESSION_SECRET: 'only for the sessions of a test run, forty letters',
      ...env,
    },
    database: connection,
  });
}

async function removeAll(database: TestDatabase, dataDir: string): Promise<void> {
  await database.drop();
  await rm(dataDir, { recursive: true, force: true });
}
