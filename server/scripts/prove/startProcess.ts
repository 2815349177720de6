import { type ChildProcess, spawn } from 'node:child_process';

/** How a process ended and what it said. */
interface Ending {
  code: number | null;
  signal: NodeJS.Signals | null;
  stdout: string;
  stderr: string;
}

/** `npm start` as a process of its own, seen as a person at the terminal sees it. */
export interface StartProcess {
  /** Resolves with the address it prints; rejects with what it said when it ends before that. */
  readonly ready: Promise<string>;
  /** Resolves when these words have appeared on standard output. */
  says(words: string): Promise<void>;
  /** Resolves when it is gone. */
  readonly exited: Promise<Ending>;
  signal(signal: NodeJS.Signals): void;
}

interface StartOptions {
  /** The repository to start. */
  root: string;
  /** Settings such as DATA_DIR; those of the caller's own environment do not reach it. */
  settings: Record<string, string>;
  /** True starts it through npm in a process group of its own and signals the whole group, which is what a terminal does. */
  asInTerminal?: boolean;
}

const running = new Set<ChildProcess>();
const notHandedOn =
  /^(npm_|VITEST|NODE_ENV$|NODE_OPTIONS$|HOST$|PORT$|DATA_DIR$|DEMO$|DATABASE_URL$|SESSION_SECRET$|PUBLIC_ORIGIN$|LOG_LEVEL$)/i;

/** Starts Spandrel on any free port unless the settings name one. */
export function startSpandrel({ root, settings, asInTerminal = false }: StartOptions): StartProcess {
  const inherited = Object.fromEntries(Object.entries(process.env).filter(([name]) => !notHandedOn.test(name)));
  const [program, ...args] = asInTerminal ? ['npm', 'start'] : [process.execPath, 'server/scripts/start.mjs'];
  const child = spawn(program, args, {
    cwd: root,
    env: { ...inherited, PORT: '0', ...settings },
    stdio: ['ignore', 'pipe', 'pipe'],
    detached: asInTerminal,
  });
  running.add(child);
  const output = { stdout: '', stderr: '' };
  const exited = new Promise<Ending>((resolve, reject) => {
    child.once('error', reject).once('close', (code, signal) => {
      running.delete(child);
      resolve({ code, signal, ...output });
    });
  });
  const ready = new Promise<string>((resolve, reject) => {
    child.stdout.on('data', (chunk) => {
      output.stdout += chunk;
      const address = /ready at (\S+)\n/.exec(output.stdout)?.[1];
      if (address) resolve(address);
    });
    child.stderr.on('data', (chunk) => (output.stderr += chunk));
    exited.then(({ code }) => reject(new Error(`It ended with ${code}: ${output.stdout}${output.stderr}`)), reject);
  });
  // Whoever expects it to fail never looks at `ready`.
  ready.catch(() => {});
  const signal = (name: NodeJS.Signals) => {
    if (asInTerminal && child.pid !== undefined) process.kill(-child.pid, name);
    else child.kill(name);
  };
  const says = (words: string) =>
    new Promise<void>((resolve, reject) => {
      const look = () => {
        if (output.stdout.includes(words)) resolve();
      };
      look();
      child.stdout.on('data', look);
      exited.then(() => reject(new Error(`It never said "${words}": ${output.stdout}${output.stderr}`)), reject);
    });
  return { ready, says, exited, signal };
}

/** Ends whatever is still running, and waits for it. */
export async function endAll(): Promise<void> {
  await Promise.all(
    [...running].map((child) => {
      const gone = new Promise((resolve) => child.once('close', resolve));
      child.kill('SIGTERM');
      return gone;
    }),
  );
}
