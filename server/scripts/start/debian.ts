import { spawn } from 'node:child_process';
import { findProgram } from '../../database/programs.ts';
import { StartupError } from '../../database/startup-error.ts';

/** A program Spandrel calls, and the Debian packages that bring it. */
interface Program {
  name: string;
  program: string;
  packages: string[];
}

export const mariadb: Program = {
  name: 'MariaDB',
  program: 'mariadb-install-db',
  // The server without the service: its data and its life belong to Spandrel. The installer calls a tool of the client's package.
  packages: ['mariadb-server-core', 'mariadb-client-core'],
};
export const ffmpeg: Program = { name: 'ffmpeg', program: 'ffmpeg', packages: ['ffmpeg'] };
export const chromium: Program = { name: 'Chromium', program: 'chromium', packages: ['chromium'] };

/**
 * Installs the missing ones among the programs, as root or through sudo where it asks for no password.
 * @throws {StartupError} naming the command to run when that is not possible.
 */
export async function ensurePrograms(programs: Program[], signal: AbortSignal): Promise<void> {
  const missing = programs.filter(({ program }) => !findProgram(program));
  if (missing.length === 0) return;
  const names = new Intl.ListFormat('en').format(missing.map(({ name }) => name));
  const are = missing.length > 1 ? 'are' : 'is';
  const packages = missing.flatMap((program) => program.packages);
  const install = ['install', '-y', '--no-install-recommends', ...packages];
  const byHand = `apt-get update && apt-get ${install.join(' ')}`;
  if (!findProgram('apt-get')) {
    throw new StartupError(
      `${names} ${are} missing and this system has no apt-get; install what matches ${packages.join(' ')}.`,
    );
  }
  const root = process.getuid?.() === 0;
  if (!root && (await run(['sudo', '-n', 'true'], 'ignore').catch(() => 1)) !== 0) {
    throw new StartupError(`${names} ${are} missing; run this once as root, then start again: ${byHand}`);
  }
  console.log(`Installing ${names} from Debian's packages.`);
  signal.throwIfAborted();
  // Lists may be missing or old on a fresh machine. A failed refresh may still leave lists good enough to install from.
  await aptGet(['update'], root);
  const code = await aptGet(install, root);
  signal.throwIfAborted();
  if (code !== 0 || missing.some(({ program }) => !findProgram(program))) {
    throw new StartupError(`${names} could not be installed; apt-get says why above. By hand, as root: ${byHand}`);
  }
}

/**
 * Runs in a process group of its own: a Ctrl-C half-way would leave dpkg to be repaired by hand, so it finishes first.
 */
function aptGet(args: string[], root: boolean): Promise<number> {
  const command = ['apt-get', '-qq', '-o', 'DPkg::Lock::Timeout=120', '-o', 'Dpkg::Use-Pty=0', ...args];
  const settings = ['DEBIAN_FRONTEND=noninteractive'];
  return run(root ? ['env', ...settings, ...command] : ['sudo', '-n', 'env', ...settings, ...command], 'inherit');
}

function run([program = '', ...args]: string[], output: 'ignore' | 'inherit'): Promise<number> {
  // apt's chatter belongs to the log of the terminal, not to the output of the command that was asked for.
  const stdio: ('ignore' | 'inherit' | number)[] =
    output === 'inherit' ? ['ignore', 2, 2] : ['ignore', 'ignore', 'ignore'];
  const child = spawn(program, args, { stdio, detached: true });
  return new Promise((resolve, reject) => child.once('error', reject).once('close', (code) => resolve(code ?? 1)));
}
