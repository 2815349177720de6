import { spawn } from 'node:child_process';
import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { z } from 'zod';
import type { Count } from './checks.ts';

const millisecondsToStop = 20_000;

const reportSchema = z.object({
  numPassedTests: z.number(),
  numFailedTests: z.number(),
  testResults: z.array(
    z.object({
      name: z.string(),
      status: z.string(),
      assertionResults: z.array(z.object({ status: z.string() })),
    }),
  ),
});
type Report = z.infer<typeof reportSchema>;

/**
 * Runs the tests of the given projects and counts them. Everything they leave behind, processes and temporary files,
 * is taken away, also when vitest itself breaks.
 */
export async function runTests(root: string, projects: string[], signal: AbortSignal): Promise<Count> {
  const scratch = await mkdtemp(path.join(tmpdir(), 'spandrel-test-'));
  try {
    const report = path.join(scratch, 'report.json');
    const code = await runVitest(root, projects, scratch, report, signal);
    signal.throwIfAborted();
    return count(await readReport(report), projects, code);
  } finally {
    await rm(scratch, { recursive: true, force: true, maxRetries: 5 });
  }
}

async function runVitest(root: string, projects: string[], scratch: string, report: string, signal: AbortSignal) {
  const args = [
    path.join(root, 'node_modules/vitest/vitest.mjs'),
    'run',
    ...projects.flatMap((name) => ['--project', name]),
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${report}`,
  ];
  // Its own process group, so that whatever a test started and forgot can be ended with it.
  const child = spawn(process.execPath, args, {
    cwd: root,
    env: { ...process.env, TMPDIR: scratch },
    stdio: ['ignore', 'inherit', 'inherit'],
    detached: true,
  });
  const pid = child.pid;
  let patience: NodeJS.Timeout | undefined;
  const end = () => {
    child.kill('SIGINT');
    patience = setTimeout(() => child.kill('SIGKILL'), millisecondsToStop);
  };
  signal.addEventListener('abort', end, { once: true });
  const code = await new Promise<number | null>((resolve, reject) => child.once('error', reject).once('exit', resolve));
  clearTimeout(patience);
  signal.removeEventListener('abort', end);
  if (pid !== undefined) endGroup(pid);
  return code;
}

function endGroup(group: number): void {
  try {
    process.kill(-group, 'SIGTERM');
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'ESRCH') throw error;
  }
}

async function readReport(file: string): Promise<Report | undefined> {
  const text = await readFile(file, 'utf8').catch(() => undefined);
  return text === undefined ? undefined : reportSchema.parse(JSON.parse(text));
}

/** Counts tests; a file that broke outside its tests, a project without a test and a vitest that failed for another reason count as failures too. */
export function count(report: Report | undefined, projects: string[], code: number | null): Count {
  if (!report) return fault('vitest ended without a report');
  const files = report.testResults;
  const broken = files.filter(
    ({ status, assertionResults }) => status === 'failed' && !assertionResults.some((test) => test.status === 'failed'),
  );
  const ran = files.filter(({ assertionResults }) =>
    assertionResults.some(({ status }) => /passed|failed/.test(status)),
  );
  const idle = projects.filter((name) => !ran.some((file) => file.name.includes(`/tests/${name}/`)));
  for (const file of broken) console.log(` × ${file.name} could not be run`);
  for (const name of idle) console.log(` × no test ran in tests/${name}`);
  const failed = report.numFailedTests + broken.length + idle.length;
  if (code !== 0 && failed === 0) return { ...fault(`vitest ended with code ${code}`), passed: report.numPassedTests };
  return { passed: report.numPassedTests, failed };
}

function fault(reason: string) {
  console.log(` × ${reason}`);
  return { passed: 0, failed: 1 };
}
