import { spawn } from 'node:child_process';
import path from 'node:path';

export interface Count {
  passed: number;
  failed: number;
}

const checks: Record<string, string[]> = {
  types: ['tsc', '--noEmit'],
  lint: ['oxlint', '--deny-warnings'],
  formatting: ['biome', 'format', '.'],
  unused: ['knip', '--no-progress'],
};

/** Runs types, lint, formatting and the search for what nothing uses; each counts as one, and one that fails shows what its tool said. */
export async function runChecks(root: string, signal: AbortSignal): Promise<Count> {
  const results = await Promise.all(Object.entries(checks).map(([name, words]) => runCheck(root, name, words, signal)));
  const passed = results.filter(Boolean).length;
  return { passed, failed: results.length - passed };
}

async function runCheck(root: string, name: string, [tool = '', ...args]: string[], signal: AbortSignal) {
  const started = performance.now();
  const child = spawn(path.join(root, 'node_modules/.bin', tool), args, {
    cwd: root,
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  const end = () => child.kill();
  signal.addEventListener('abort', end, { once: true });
  let output = '';
  child.stdout.on('data', (chunk) => (output += chunk));
  child.stderr.on('data', (chunk) => (output += chunk));
  const code = await new Promise((resolve, reject) => child.once('error', reject).once('close', resolve));
  signal.removeEventListener('abort', end);
  signal.throwIfAborted();
  const seconds = ((performance.now() - started) / 1000).toFixed(1);
  console.log(code === 0 ? ` ✓ ${name} ${seconds} s` : ` × ${name} ${seconds} s\n${output.trimEnd()}\n`);
  return code === 0;
}

/** The sum of several counts. */
export function total(...counts: Count[]): Count {
  return counts.reduce((sum, { passed, failed }) => ({ passed: sum.passed + passed, failed: sum.failed + failed }));
}

/** Prints the last line and answers with the exit code. A run in which nothing was tried has failed. */
export function conclude({ passed, failed }: Count): number {
  console.log(`${passed} passed, ${failed} failed`);
  return failed === 0 && passed > 0 ? 0 : 1;
}
