import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { availableParallelism } from 'node:os';
import { createAnalysisPool } from './analysis/pool.ts';
import { createApp } from './app.ts';
import { createDataSource } from './data-source.ts';
import type { Deps } from './deps.ts';
import type { DatabaseConnection, Env } from './env.ts';
import { createLog } from './log.ts';
import { createPassport } from './http/passport.ts';
import { createSessions, type Sessions } from './http/sessions.ts';
import { createBroadcast, type LiveServer } from './realtime/broadcast.ts';
import { createLiveServer, openLiveServer } from './realtime/liveServer.ts';
import { type DemoSignIn, seedDemo } from './scripts/demo/seed.ts';
import { createReadingQueue } from './services/readingQueue.ts';
import { reopenDrafts, sweepDaily } from './services/sweep.ts';

export interface RunningServer {
  url: string;
  demoSignIns: DemoSignIn[];
  /** For scripts and tests that work with the services directly. */
  deps: Deps;
  live: LiveServer;
  sessions: Sessions;
  /** Where it listens, whatever people type to reach it. */
  address: AddressInfo;
  /** Ends sockets, requests, readings and the connections to the database, in this order. */
  close(): Promise<void>;
}

export interface StartOptions {
  env: Pick<Env, 'HOST' | 'PORT' | 'DATA_DIR' | 'PUBLIC_ORIGIN' | 'LOG_LEVEL' | 'DEMO'> & { SESSION_SECRET: string };
  database: DatabaseConnection;
  /** Tells whoever started the server what takes long. */
  announce?: (sentence: string) => void;
}

const CLOSING_PATIENCE = 2_000;

/**
 * Boots the server: data source, migrations, the demo where the database is empty, app, sockets, listen; then goes on
 * with readings an earlier run left. Whatever fails, everything that was opened before is closed again.
 */
export async function startServer({ env, database, announce }: StartOptions): Promise<RunningServer> {
  const opened: (() => Promise<unknown>)[] = [];
  const closeAll = async () => {
    const failures: unknown[] = [];
    for (const close of opened.splice(0).reverse()) await close().catch((error: unknown) => failures.push(error));
    if (failures.length > 0) throw new AggregateError(failures, 'The server did not close in order.');
  };
  try {
    const log = createLog(env.LOG_LEVEL);
    const dataSource = await createDataSource(database).initialize();
    opened.push(() => dataSource.destroy());
    await dataSource.runMigrations();
    const secure = env.PUBLIC_ORIGIN?.startsWith('https:') ?? false;
    const sessions = createSessions({ database, secret: env.SESSION_SECRET, secure });
    opened.push(() => sessions.close());
    const analysis = createAnalysisPool();
    opened.push(() => analysis.close());

    const io = createLiveServer(env.PUBLIC_ORIGIN);
    const parts = { dataSource, dataDir: env.DATA_DIR, broadcast: createBroadcast(io), log, now: () => new Date() };
    const demoSignIns = env.DEMO ? await seedDemo({ ...parts, analysis, announce }) : [];
    const lanes = Math.max(1, availableParallelism() - 1);
    const readings = createReadingQueue(parts, { analysis, lanes });
    opened.push(() => readings.close());
    const deps: Deps = { ...parts, readings };
    await reopenDrafts(deps);
    opened.push(sweepDaily(deps));
    const passport = createPassport(deps);
    const app = createApp(deps, { sessions, passport, publicOrigin: env.PUBLIC_ORIGIN });

    const server = createServer(app);
    io.attach(server);
    const stopRechecks = openLiveServer(io, { deps, sessions, passport });
    await new Promise<void>((resolve, reject) => {
      server.once('error', reject);
      server.listen(env.PORT, env.HOST, resolve);
    });
    opened.push(async () => {
      stopRechecks();
      // Requests under way get a moment; idle connections and sockets end at once.
      const patience = setTimeout(() => server.closeAllConnections(), CLOSING_PATIENCE);
      await io.close();
      clearTimeout(patience);
    });
    await readings.resume();
    const address = server.address() as AddressInfo;
    return {
      url: env.PUBLIC_ORIGIN ?? urlOf(env.HOST, address),
      address,
      live: io,
      sessions,
      demoSignIns,
      deps,
      close: closeAll,
    };
  } catch (error) {
    await closeAll();
    throw error;
  }
}

function urlOf(host: string, { port }: AddressInfo): string {
  const name = host === '0.0.0.0' || host === '::' ? '127.0.0.1' : host;
  return `http://${name.includes(':') ? `[${name}]` : name}:${port}`;
}
