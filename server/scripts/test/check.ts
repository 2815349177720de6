import { conclude, runChecks, total } from './checks.ts';
import { runTests } from './vitest.ts';

/** What to run while working: types, lint, formatting and the unit tests. */
export async function main({ root, stop: { signal } }: { root: string; stop: AbortController }): Promise<number> {
  const [checks, tests] = await Promise.all([runChecks(root, signal), runTests(root, ['unit'], signal)]);
  return conclude(total(checks, tests));
}
