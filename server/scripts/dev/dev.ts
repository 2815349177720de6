import path from 'node:path';
import { createServer } from 'vite';
import { probePort } from '../../database/freePort.ts';
import { spawnGuarded } from '../../database/guardedChild.ts';
import { startMariadb } from '../../database/mariadb.ts';
import { readOrMakeSecrets } from '../../database/secrets.ts';
import { readEnv } from '../../env.ts';
import { checkAddress } from '../start/address.ts';
import { createCleanup } from '../start/cleanup.ts';
import { takeDataFolder } from '../start/dataFolder.ts';
import { ensurePrograms, ffmpeg, mariadb } from '../start/debian.ts';

/** The database, the server restarting on every change, and the client with hot reload; one Ctrl-C ends all three. */
export async function main({ root, stop }: { root: string; stop: AbortController }): Promise<number> {
  const { signal } = stop;
  let exitCode = 0;
  const cleanup = createCleanup((error) => {
    exitCode = 1;
    console.error(error);
  });
  try {
    const env = readEnv(process.env);
    cleanup.add(await takeDataFolder(env.DATA_DIR));
    await checkAddress(env.HOST, env.PORT);
    await ensurePrograms([mariadb, ffmpeg], signal);
    const { databasePassword } = await readOrMakeSecrets(env.DATA_DIR);
    const database = await startMariadb({ dataDir: env.DATA_DIR, password: databasePassword, signal });
    cleanup.add(() => database.stop());

    // The config of vite passes /api and the socket on to this port.
    const apiPort = process.env.API_PORT ?? String(await probePort('127.0.0.1'));
    process.env.API_PORT = apiPort;
    const vite = await createServer({ root, server: { host: env.HOST, port: env.PORT, strictPort: true } });
    cleanup.add(() => vite.close());
    await vite.listen();
    const { user, password, host, port, database: name } = database.connection;
    const server = startServerProcess(root, {
      HOST: '127.0.0.1',
      PORT: apiPort,
      DATABASE_URL: `mysql://${user}:${password}@${host}:${port}/${name}`,
      CLIENT_URL: `http://${env.HOST}:${env.PORT}`,
    });
    cleanup.add(server.stop);
    const aborted = new Promise<void>((resolve) => signal.addEventListener('abort', () => resolve(), { once: true }));
    if (!signal.aborted) await Promise.race([aborted, server.ended]);
    if (!signal.aborted) exitCode = 1;
  } finally {
    await cleanup.run();
  }
  return exitCode;
}

function startServerProcess(root: string, env: Record<string, string>) {
  const tsx = path.join(root, 'node_modules/tsx/dist/cli.mjs');
  // Files that only a worker thread loads are not seen by tsx, so both folders are named.
  const watched = ['--include', 'server/**/*.ts', '--include', 'shared/**/*.ts'];
  const args = [tsx, 'watch', '--clear-screen=false', ...watched, 'server/scripts/dev/serve.ts'];
  const child = spawnGuarded(process.execPath, args, {
    cwd: root,
    env: { ...process.env, ...env },
    stdio: ['ignore', 'inherit', 'inherit'],
  });
  const ended = new Promise<void>((resolve) => child.once('close', () => resolve()).once('error', () => resolve()));
  return {
    ended,
    stop: () => {
      child.kill('SIGTERM');
      return ended;
    },
  };
}
