import { spawn } from 'node:child_process';
import { findProgram } from '../../database/programs.ts';
import { StartupError } from '../../database/startupError.ts';

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
  if (!root && !(await maySudo())) {
    throw new StartupError(`${names} ${are} missing; run this once as root, then start again: ${byHand}`);
  }
  console.log(`Installing ${names} from Debian's packages.`);
  signal.throwIfAborted();
  // Lists may be missing or old on a fresh machine. A failed refresh may still leave lists good enough to install from.
  await aptGet(['update'], root);
  const { code, output } = await aptGet(install, root);
  signal.throwIfAborted();
  if (code !== 0 || missing.some(({ program }) => !findProgram(program))) {
    console.error(output.trim().split('\n').slice(-15).join('\n'));
    throw new StartupError(`${names} could not be installed; apt-get says why above. By hand, as root: ${byHand}`);
  }
}

async function maySudo(): Promise<boolean> {
  return findProgram('sudo') !== undefined && (await run(['sudo', '-n', 'true'])).code === 0;
}

function aptGet(args: string[], root: boolean) {
  const command = ['env', 'DEBIAN_FRONTEND=noninteractive', 'apt-get', '-q', '-o', 'DPkg::Lock::Timeout=120', ...args];
  return run(root ? command : ['sudo', '-n', ...command]);
}

/** Runs in a process group of its own: a Ctrl-C half-way would leave dpkg to be repaired by hand, so it finishes first. */
function run([program = '', ...args]: string[]): Promise<{ code: number; output: string }> {
  const child = spawn(program, args, { stdio: ['ignore', 'pipe', 'pipe'], detached: true });
  let output = '';
  child.stdout.on('data', (chunk) => (output += chunk));
  child.stderr.on('data', (chunk) => (output += chunk));
  return new Promise((resolve, reject) =>
    child.once('error', reject).once('close', (code) => resolve({ code: code ?? 1, output })),
  );
}
