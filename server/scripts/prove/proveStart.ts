import { execFile } from 'node:child_process';
import { mkdtemp, readdir, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { promisify } from 'node:util';
import { leftRunning } from './processes.ts';
import { endAll, type StartProcess, startSpandrel } from './startProcess.ts';

const secondStartWithin = 3;

/**
 * Proves `npm start` on what is committed: clones the repository to a new folder with an empty data folder, starts it,
 * waits for the page, stops it as Ctrl-C does, looks for anything left running, and does it once more to time a second start.
 */
export async function main({ root, stop }: { root: string; stop: AbortController }): Promise<number> {
  const folder = await mkdtemp(path.join(tmpdir(), 'spandrel-prove-'));
  const clone = path.join(folder, 'clone');
  const dataDir = path.join(folder, 'data');
  stop.signal.addEventListener('abort', () => void endAll(), { once: true });
  try {
    await promisify(execFile)('git', ['clone', '--quiet', '--no-hardlinks', root, clone]);
    await startAndStop('first', clone, dataDir, folder);
    const seconds = await startAndStop('second', clone, dataDir, folder);
    if (seconds > secondStartWithin) throw new Error(`The second start took ${seconds.toFixed(1)} s; 3 s are allowed.`);
    console.log('npm start is proved.');
    return 0;
  } finally {
    await endAll();
    await rm(folder, { recursive: true, force: true });
  }
}

async function startAndStop(name: string, root: string, dataDir: string, folder: string) {
  let began = performance.now();
  const lap = () => (performance.now() - began) / 1000;
  const start = startSpandrel({ root, settings: { DATA_DIR: dataDir }, asInTerminal: true });
  const address = await start.ready;
  const page = await fetch(address, { headers: { accept: 'text/html' } });
  const text = await page.text();
  const toPage = lap();
  if (!page.ok || !text.includes('<div id="root">'))
    throw new Error(`${address} answers ${page.status}: ${text.slice(0, 200)}`);
  began = performance.now();
  await stopped(start);
  console.log(`${name} start: page after ${toPage.toFixed(1)} s, stopped in ${lap().toFixed(1)} s`);
  const log = await readFile(path.join(dataDir, 'db.log'), 'utf8');
  if (!/Shutdown complete\s*$/.test(log)) throw new Error(`The database was not closed in order:\n${log.slice(-500)}`);
  const left = await leftRunning(folder);
  if (left.length > 0) throw new Error(`Still running after the stop:\n${left.join('\n')}`);
  const files = await readdir(dataDir);
  if (files.some((file) => /^(in-use|db\.pid|db\.making)/.test(file)))
    throw new Error(`Left behind: ${files.join(', ')}`);
  return toPage;
}

async function stopped(start: StartProcess): Promise<void> {
  start.signal('SIGINT');
  const { code, signal, stdout, stderr } = await start.exited;
  // npm and its shell got the Ctrl-C as well, and say so by ending with it once their child has ended.
  if (code !== 0 && code !== 130 && signal !== 'SIGINT') throw new Error(`It ended with ${code}:\n${stdout}${stderr}`);
}
