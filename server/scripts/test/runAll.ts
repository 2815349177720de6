import viteConfig from '../../../vite.config.ts';
import { ensureClientBuilt } from '../start/clientBuild.ts';
import { chromium, ensurePrograms, ffmpeg, mariadb } from '../start/debian.ts';
import { conclude, runChecks, total } from './checks.ts';
import { runTests } from './vitest.ts';

/** Everything that must hold before a change is merged. Ends with one line, `N passed, N failed`. */
export async function main({ root, stop: { signal } }: { root: string; stop: AbortController }): Promise<number> {
  await ensurePrograms([mariadb, ffmpeg, chromium], signal);
  const [checks, build] = await Promise.all([runChecks(root, signal), buildClient(root, signal)]);
  const tests = await runTests(root, projectNames(), signal);
  return conclude(total(checks, build, tests));
}

/** The browser tests drive the built client. */
async function buildClient(root: string, signal: AbortSignal) {
  try {
    await ensureClientBuilt(root, signal);
    return { passed: 1, failed: 0 };
  } catch (error) {
    signal.throwIfAborted();
    console.log(` × client build: ${(error as Error).message}`);
    return { passed: 0, failed: 1 };
  }
}

/** The names of the vitest projects; each must run at least one test. */
function projectNames(): string[] {
  return (viteConfig.test?.projects ?? []).map((project) => {
    if (typeof project !== 'object' || !('test' in project))
      throw new TypeError('vite.config.ts lists a project without a name.');
    return String(project.test?.name);
  });
}
