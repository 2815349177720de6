import { conclude, runChecks, total } from './checks.ts';
import { runTests } from './vitest.ts';

/** What to run while working: types, lint, formatting and the unit tests. */
export async function main({ root, stop: { signal } }: { root: string; stop: AbortController }): Promise<number> {
  const checks = await runChecks(root, signal);
  return conclude(total(checks, await runTests(root, ['unit'], signal)));
}
