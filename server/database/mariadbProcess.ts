import { createWriteStream, renameSync, statSync } from 'node:fs';
import path from 'node:path';
import { createInterface } from 'node:readline';
import { spawnGuarded } from './guardedChild.ts';
import { findProgram } from './programs.ts';
import { StartupError, writeFault } from './startupError.ts';

const secondsToComeUp = 120;
const secondsToStop = 30;
const longestLog = 5 * 1024 * 1024;

/** A mariadbd that was launched: it becomes ready, and it ends. */
export interface MariadbProcess {
  /** Resolves when it takes connections; rejects with a StartupError when it ends or stays silent before that. */
  readonly ready: Promise<void>;
  /** Resolves when the process is gone; the value is the last line it wrote. */
  readonly ended: Promise<string>;
  /** Asks it to end cleanly and waits until it is gone; any number of calls is one stop. */
  stop(): Promise<void>;
}

/**
 * Launches mariadbd with the given flags and writes its log to `db.log` in `dataDir`.
 * @throws {StartupError} when MariaDB is not installed.
 */
export function launchMariadb(flags: string[], dataDir: string): MariadbProcess {
  const program = findProgram('mariadbd');
  if (!program) throw new StartupError('MariaDB is missing; install the Debian package mariadb-server-core.');
  const child = spawnGuarded(program, flags, { stdio: ['ignore', 'ignore', 'pipe'] });
  const logFile = path.join(dataDir, 'db.log');
  const log = openLog(logFile);
  let lastLine = 'it ended without a word';
  // The first error is the cause, those after it are what followed.
  let firstError: string | undefined;
  const lines = createInterface({ input: child.stderr! });
  lines.on('line', (line) => {
    log.write(`${line}\n`);
    const words = line.replace(/^[\d-]+ +[\d:]+ \d+ /, '').trim();
    if (words) lastLine = words;
    if (words.startsWith('[ERROR]')) firstError ??= words;
  });

  const ended = new Promise<string>((resolve) => {
    const end = () => {
      log.end();
      resolve(lastLine);
    };
    child.once('error', end).once('close', end);
  });

  const ready = new Promise<void>((resolve, reject) => {
    const fail = (reason: string) => {
      clearTimeout(deadline);
      const telling = reason.replace('[ERROR] ', '');
      const sentence = `The database did not come up: ${telling} (its log: ${logFile})`;
      reject(writeFault(telling, dataDir) ?? new StartupError(sentence));
    };
    const deadline = setTimeout(() => fail(`no answer within ${secondsToComeUp} s`), secondsToComeUp * 1000);
    lines.on('line', (line) => {
      if (!line.includes('ready for connections')) return;
      clearTimeout(deadline);
      resolve();
    });
    ended.then(() => fail(firstError ?? lastLine));
  });
  // Whoever stops it early never looks at `ready`, which is no reason to end the whole process.
  ready.catch(() => {});

  let stopping: Promise<void> | undefined;
  const stop = async () => {
    child.kill('SIGTERM');
    const patience = setTimeout(() => child.kill('SIGKILL'), secondsToStop * 1000);
    await ended;
    clearTimeout(patience);
  };
  return { ready, ended, stop: () => (stopping ??= stop()) };
}

/** Appends to the log; a long one is set aside first, so the two together stay small. */
function openLog(file: string) {
  const size = statSync(file, { throwIfNoEntry: false })?.size ?? 0;
  if (size > longestLog) renameSync(file, `${file}.1`);
  // A log that cannot be written must not take the database down with it.
  return createWriteStream(file, { flags: 'a', mode: 0o600 }).on('error', () => {});
}
