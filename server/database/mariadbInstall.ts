import { spawn } from 'node:child_process';
import { readdir, rename, rm } from 'node:fs/promises';
import { userInfo } from 'node:os';
import path from 'node:path';
import { findProgram } from './programs.ts';
import { StartupError, writeFault } from './startupError.ts';

/** MariaDB refuses to run as root unless it is told that root is meant; any other user must not name one. */
export function userFlags(): string[] {
  return process.getuid?.() === 0 ? ['--user=root'] : [];
}

/**
 * Makes an empty database folder `db` below `dataDir` if there is none. It is built under another name and renamed
 * when whole, so a start that dies half-way leaves nothing that looks like a database.
 * @throws {StartupError} when MariaDB is missing, the disk is full or the folder cannot be written.
 */
export async function installDatabaseFolder(dataDir: string, signal?: AbortSignal): Promise<string> {
  const folder = path.join(dataDir, 'db');
  const entries = await readdir(dataDir);
  await Promise.all(
    entries
      .filter((entry) => entry.startsWith('db.making-'))
      .map((entry) => rm(path.join(dataDir, entry), { recursive: true })),
  );
  if (entries.includes('db')) return folder;
  const draft = path.join(dataDir, `db.making-${process.pid}`);
  try {
    await runInstaller(draft, dataDir, signal);
    await rename(draft, folder);
  } catch (error) {
    await rm(draft, { recursive: true, force: true });
    throw writeFault(error, dataDir) ?? error;
  }
  return folder;
}

async function runInstaller(folder: string, dataDir: string, signal?: AbortSignal): Promise<void> {
  const installer = findProgram('mariadb-install-db');
  if (!installer) throw new StartupError('MariaDB is missing; install the Debian package mariadb-server-core.');
  signal?.throwIfAborted();
  const args = [
    '--no-defaults',
    ...userFlags(),
    `--datadir=${folder}`,
    // Administration goes through the socket as the system user that owns the files; nobody can sign in as root over TCP.
    '--auth-root-authentication-method=socket',
    `--auth-root-socket-user=${userInfo().username}`,
    '--skip-test-db',
    // It would look up the names of this machine, which a bare one has none of, and which nothing here needs.
    '--force',
    '--innodb-log-file-size=48M',
  ];
  // Its own process group, because the installer is a script whose children must go with it.
  const child = spawn(installer, args, { detached: true, stdio: ['ignore', 'pipe', 'pipe'] });
  let output = '';
  child.stdout.on('data', (chunk) => (output += chunk));
  child.stderr.on('data', (chunk) => (output += chunk));
  const end = () => child.pid && process.kill(-child.pid, 'SIGKILL');
  signal?.addEventListener('abort', end, { once: true });
  const code = await new Promise((resolve, reject) => child.once('error', reject).once('close', resolve));
  signal?.removeEventListener('abort', end);
  signal?.throwIfAborted();
  if (code === 0) return;
  const lines = output.trim().split('\n');
  // The first error is the cause, those after it are what followed.
  const telling = lines.find((line) => line.includes('[ERROR]')) ?? lines[0] ?? '';
  throw (
    writeFault(output, dataDir) ?? new StartupError(`The database could not be made in ${dataDir}: ${telling.trim()}`)
  );
}
