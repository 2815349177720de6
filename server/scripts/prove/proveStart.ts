import { execFile } from 'node:child_process';
import { appendFile, mkdtemp, readdir, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { promisify } from 'node:util';
import { leftRunning } from './processes.ts';
import { endAll, type StartProcess, startSpandrel } from './startProcess.ts';

const secondStartWithin = 3;
/** The suite proves what a start does; how fast it is depends on what else the machine does, so only the hand run judges it. */
const untimed = process.argv.includes('--untimed');

/**
 * Proves `npm start` on what is committed: clones the repository to a new folder with an empty data folder, starts it,
 * waits for the page, stops it as Ctrl-C does and looks for anything left; then again to time it, and again after a change.
 * `--untimed` prints the times without judging them.
 */
export async function main({ root, stop }: { root: string; stop: AbortController }): Promise<number> {
  const folder = await mkdtemp(path.join(tmpdir(), 'spandrel-prove-'));
  const clone = path.join(folder, 'clone');
  const dataDir = path.join(folder, 'data');
  stop.signal.addEventListener('abort', () => void endAll(), { once: true });
  try {
    await promisify(execFile)('git', ['clone', '--quiet', '--no-hardlinks', root, clone]);
    const place = { clone, dataDir, folder };
    await startAndStop('first start', place, { does: ['Building the client'] });
    await quickStart(place);
    await appendFile(path.join(clone, 'src/main.tsx'), '\n');
    await startAndStop('start after a change', place, { does: ['Building the client'], not: ['Installing'] });
    console.log('npm start is proved.');
    return 0;
  } finally {
    await endAll();
    await rm(folder, { recursive: true, force: true });
  }
}

interface Place {
  clone: string;
  dataDir: string;
  folder: string;
}

/** Whatever else this machine does can only slow a start down, so the quickest of five counts. */
async function quickStart(place: Place): Promise<void> {
  const times: number[] = [];
  while (times.length < 5) {
    const seconds = await startAndStop('second start', place, { not: ['Installing', 'Building'] });
    if (untimed || seconds <= secondStartWithin) return;
    times.push(seconds);
  }
  throw new Error(`The second start took ${Math.min(...times).toFixed(1)} s; ${secondStartWithin} s are allowed.`);
}

async function startAndStop(
  name: string,
  place: Place,
  expected: { does?: string[]; not?: string[] },
): Promise<number> {
  const { clone, dataDir, folder } = place;
  let began = performance.now();
  const lap = () => (performance.now() - began) / 1000;
  const start = startSpandrel({ root: clone, settings: { DATA_DIR: dataDir }, asInTerminal: true });
  const address = await start.ready;
  const page = await fetch(address, { headers: { accept: 'text/html' } });
  const text = await page.text();
  const toPage = lap();
  if (!page.ok || !text.includes('<div id="root">')) throw new Error(`${address} answers ${page.status}: ${text}`);
  began = performance.now();
  const stdout = await stopped(start);
  console.log(`${name}: page after ${toPage.toFixed(1)} s, stopped in ${lap().toFixed(1)} s`);
  for (const words of expected.does ?? [])
    if (!stdout.includes(words)) throw new Error(`"${words}" is missing:\n${stdout}`);
  for (const words of expected.not ?? []) if (stdout.includes(words)) throw new Error(`It did too much:\n${stdout}`);
  await nothingLeft(dataDir, folder);
  return toPage;
}

async function stopped(start: StartProcess): Promise<string> {
  start.signal('SIGINT');
  const { code, signal, stdout, stderr } = await start.exited;
  // npm and its shell got the Ctrl-C as well, and say so by ending with it once their child has ended.
  if (code !== 0 && code !== 130 && signal !== 'SIGINT') throw new Error(`It ended with ${code}:\n${stdout}${stderr}`);
  return stdout;
}

async function nothingLeft(dataDir: string, folder: string): Promise<void> {
  const log = await readFile(path.join(dataDir, 'db.log'), 'utf8');
  if (!/Shutdown complete\s*$/.test(log)) throw new Error(`The database was not closed in order:\n${log.slice(-500)}`);
  const processes = await leftRunning(folder);
  if (processes.length > 0) throw new Error(`Still running after the stop:\n${processes.join('\n')}`);
  const files = (await readdir(dataDir)).filter((file) => /^(in-use|db\.pid|db\.making)/.test(file));
  if (files.length > 0) throw new Error(`Left behind: ${files.join(', ')}`);
}
