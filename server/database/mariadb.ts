import { mkdir, readFile, rm, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { createConnection } from 'mysql2/promise';
import type { DatabaseConnection } from '../env.ts';
import { probePort } from './freePort.ts';
import { installDatabaseFolder, userFlags } from './mariadbInstall.ts';
import { launchMariadb, type MariadbProcess } from './mariadbProcess.ts';
import { commandLineOf, goneWithin } from './processTable.ts';
import { StartupError, writeFault } from './startupError.ts';

const portAttempts = 4;
const orphanPatience = 30_000;

export interface MariadbOptions {
  /** Folder that holds the database folder `db`, its log and its pid file; made when missing. */
  dataDir: string;
  /** Password of the application's account: letters, digits, `-` and `_` only. */
  password: string;
  /** Pattern of further databases the account may create, for tests; `_` and `%` as in SQL's LIKE. */
  furtherDatabases?: string;
  /** False for a throw-away database: a crash of the machine may lose it, writes are faster. */
  durable?: boolean;
  /** Gives up starting; nothing half-started stays behind. */
  signal?: AbortSignal;
}

/** A MariaDB of our own: how to reach it, and how it ends. */
export interface RunningMariadb {
  readonly connection: DatabaseConnection;
  /** Resolves when the server is gone for any reason; the value is the last line it wrote. */
  readonly ended: Promise<string>;
  /** Ends the server cleanly and waits until it is gone; any number of calls is one stop. */
  stop(): Promise<void>;
}

/**
 * Starts a MariaDB on a free port of 127.0.0.1 with its files below `dataDir`, makes the database and the account,
 * and answers when it takes connections. If this process dies, the server ends itself cleanly.
 * @throws {StartupError} when it does not come up, with the telling line and the log file.
 */
export async function startMariadb(options: MariadbOptions): Promise<RunningMariadb> {
  const { dataDir, password, furtherDatabases, signal } = options;
  const accounts = path.join(dataDir, 'db-accounts.sql');
  try {
    await mkdir(dataDir, { recursive: true, mode: 0o700 });
    await endOrphan(dataDir);
    await installDatabaseFolder(dataDir, signal);
    await writeFile(accounts, accountStatements(password, furtherDatabases), { mode: 0o600 });
    return await comeUp(options, accounts);
  } catch (error) {
    signal?.throwIfAborted();
    throw error instanceof StartupError ? error : (writeFault(error, dataDir) ?? error);
  } finally {
    // Best effort: where the folder could not be made, the removal fails too and would hide the cause.
    await rm(accounts, { force: true }).catch(() => {});
  }
}

async function comeUp(options: MariadbOptions, accounts: string): Promise<RunningMariadb> {
  for (let attempt = 1; ; attempt += 1) {
    options.signal?.throwIfAborted();
    const port = await probePort('127.0.0.1');
    const server = launchMariadb(serverFlags(options, port, accounts), options.dataDir);
    const giveUp = () => void server.stop();
    options.signal?.addEventListener('abort', giveUp, { once: true });
    try {
      return await firstConnection(server, port, options.password);
    } catch (error) {
      await server.stop();
      // Another program may take the port between the look and the start.
      if (attempt === portAttempts || !/Address already in use/.test(String(error))) throw error;
    } finally {
      options.signal?.removeEventListener('abort', giveUp);
    }
  }
}

async function firstConnection(server: MariadbProcess, port: number, password: string): Promise<RunningMariadb> {
  await server.ready;
  const connection = { host: '127.0.0.1', port, user: 'spandrel', password, database: 'spandrel' };
  await (await createConnection(connection)).end();
  return { connection, ended: server.ended, stop: server.stop };
}

/** One statement a line, as an init file must be. The account is made anew, so that secrets and database always agree. */
function accountStatements(password: string, furtherDatabases?: string): string {
  if (!/^[\w-]+$/.test(password)) throw new TypeError('The database password may hold letters, digits, - and _ only.');
  const granted = furtherDatabases ? ['spandrel', furtherDatabases] : ['spandrel'];
  return [
    'CREATE DATABASE IF NOT EXISTS spandrel CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci;',
    `CREATE OR REPLACE USER 'spandrel'@'127.0.0.1' IDENTIFIED BY '${password}';`,
    ...granted.map((pattern) => `GRANT ALL ON \`${pattern}\`.* TO 'spandrel'@'127.0.0.1';`),
    '',
  ].join('\n');
}

/** A run that was killed outright may have left its server on the way down; two servers on one folder would ruin it. */
async function endOrphan(dataDir: string): Promise<void> {
  const pid = Number(await readFile(path.join(dataDir, 'db.pid'), 'utf8').catch(() => ''));
  if (!pid || !commandLineOf(pid).includes(`--datadir=${path.join(dataDir, 'db')}`)) return;
  process.kill(pid, 'SIGTERM');
  if (!(await goneWithin(pid, orphanPatience))) {
    throw new StartupError(`The database of an earlier run does not end; stop it with: kill ${pid}`);
  }
}

function serverFlags({ dataDir, durable = true }: MariadbOptions, port: number, accounts: string): string[] {
  return [
    '--no-defaults',
    ...userFlags(),
    `--datadir=${path.join(dataDir, 'db')}`,
    `--pid-file=${path.join(dataDir, 'db.pid')}`,
    // Relative to the database folder: a socket's path may have 107 bytes, and DATA_DIR may lie deeper than that.
    '--socket=db.sock',
    `--port=${port}`,
    '--bind-address=127.0.0.1',
    `--init-file=${accounts}`,
    '--skip-name-resolve',
    '--skip-log-bin',
    '--local-infile=OFF',
    '--character-set-server=utf8mb4',
    '--collation-server=utf8mb4_unicode_ci',
    '--default-time-zone=+00:00',
    '--sql-mode=STRICT_ALL_TABLES,ONLY_FULL_GROUP_BY,NO_ZERO_IN_DATE,NO_ZERO_DATE,ERROR_FOR_DIVISION_BY_ZERO,NO_ENGINE_SUBSTITUTION',
    '--innodb-buffer-pool-size=128M',
    '--innodb-log-file-size=48M',
    '--performance-schema=OFF',
    '--max-connections=100',
    '--max-allowed-packet=64M',
    ...(durable
      ? ['--innodb-flush-log-at-trx-commit=1']
      : ['--innodb-flush-log-at-trx-commit=0', '--innodb-doublewrite=OFF', '--innodb-flush-method=nosync']),
  ];
}
