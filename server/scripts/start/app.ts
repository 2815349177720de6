import { openGivenDatabase } from '../../database/givenDatabase.ts';
import { startMariadb } from '../../database/mariadb.ts';
import { readOrMakeSecrets } from '../../database/secrets.ts';
import { StartupError } from '../../database/startupError.ts';
import { type DatabaseConnection, type Env, readEnv } from '../../env.ts';
import { checkAddress, listenFault } from './address.ts';
import { type Cleanup, createCleanup } from './cleanup.ts';
import { ensureClientBuilt } from './clientBuild.ts';
import { takeDataFolder } from './dataFolder.ts';
import { ensurePrograms, ffmpeg, mariadb } from './debian.ts';
import { closeWithin, greet } from './serve.ts';

interface Run {
  root: string;
  stop: AbortController;
}

/** Starts everything, serves until told to stop, and ends everything. Answers with the exit code. */
export async function main({ root, stop }: Run): Promise<number> {
  let exitCode = 0;
  const report = (error: unknown) => {
    exitCode = 1;
    console.error(error instanceof StartupError ? error.message : error);
  };
  // Whatever goes wrong unseen, the database is closed in order before this process ends.
  for (const event of ['uncaughtException', 'unhandledRejection'] as const) {
    process.on(event, (error) => {
      // What was under way when it was told to stop fails for want of its database, and says nothing new.
      if (stop.signal.aborted) return;
      report(error);
      stop.abort();
    });
  }
  const cleanup = createCleanup(report);
  try {
    await serve(root, stop, cleanup, report);
  } finally {
    await cleanup.run();
  }
  return exitCode;
}

async function serve(root: string, stop: AbortController, cleanup: Cleanup, report: (error: unknown) => void) {
  const { signal } = stop;
  const settings = readEnv(process.env);
  cleanup.add(await takeDataFolder(settings.DATA_DIR));
  await checkAddress(settings.HOST, settings.PORT);
  await ensurePrograms(settings.DATABASE_URL ? [ffmpeg] : [mariadb, ffmpeg], signal);
  const { sessionSecret, databasePassword } = await readOrMakeSecrets(settings.DATA_DIR);
  const env = { ...settings, SESSION_SECRET: settings.SESSION_SECRET ?? sessionSecret };

  const [database, { startServer }] = await together([
    openDatabase(settings, databasePassword, stop, cleanup, report),
    import('../../main.ts'),
    ensureClientBuilt(root, signal),
  ]);
  signal.throwIfAborted();
  const server = await unlessStopped(startServer({ env, database, announce: console.log }), signal).catch((error) => {
    // Another program may have taken the port since it was checked.
    throw listenFault(error, env.HOST, env.PORT);
  });
  cleanup.add(() => closeWithin(server.close(), 10_000));
  greet(server);
  await new Promise((resolve) => signal.addEventListener('abort', resolve, { once: true }));
  console.log('Stopping.');
}

/** The owner's own database when DATABASE_URL names one, otherwise a MariaDB of ours that ends with this run. */
async function openDatabase(
  { DATABASE_URL, DATA_DIR }: Env,
  password: string,
  stop: AbortController,
  cleanup: Cleanup,
  report: (error: unknown) => void,
): Promise<DatabaseConnection> {
  if (DATABASE_URL) return openGivenDatabase(DATABASE_URL);
  const running = await startMariadb({ dataDir: DATA_DIR, password, signal: stop.signal });
  let asked = false;
  cleanup.add(() => {
    asked = true;
    return running.stop();
  });
  running.ended.then((lastLine) => {
    if (asked) return;
    report(new StartupError(`The database ended by itself: ${lastLine} (its log: ${DATA_DIR}/db.log)`));
    stop.abort();
  });
  return running.connection;
}

/** Filling the demo takes a while; a Ctrl-C does not wait for it. The next start clears away what was broken off. */
function unlessStopped<T>(work: Promise<T>, signal: AbortSignal): Promise<T> {
  const stopped = new Promise<never>((_, reject) =>
    signal.addEventListener('abort', () => reject(signal.reason), { once: true }),
  );
  return Promise.race([work, stopped]);
}

/** Like Promise.all, but lets every part come to its end, so that none starts something after the others gave up. */
async function together<T extends readonly unknown[]>(parts: readonly [...{ [K in keyof T]: Promise<T[K]> }]) {
  const results = await Promise.allSettled(parts);
  for (const result of results) if (result.status === 'rejected') throw result.reason;
  return results.map((result) => (result as PromiseFulfilledResult<unknown>).value) as unknown as T;
}
