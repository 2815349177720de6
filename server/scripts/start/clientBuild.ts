import { spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import { readdir, readFile, rename, rm, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { StartupError, writeFault } from '../../database/startupError.ts';

const sources = ['index.html', 'package-lock.json', 'public', 'shared', 'src', 'tsconfig.json', 'vite.config.ts'];

/**
 * Builds the client into `dist/` unless it was built from exactly these sources. It is built aside and moved when
 * whole, so neither a failed build nor two at once leave half a client.
 * @throws {StartupError} when vite does not build it; vite's own message stands above.
 */
export async function ensureClientBuilt(root: string, signal: AbortSignal): Promise<void> {
  const dist = path.join(root, 'dist');
  const stamp = await hashOf(root);
  if ((await readFile(path.join(dist, '.built-from'), 'utf8').catch(() => '')) === stamp) return;
  console.log('Building the client.');
  const draft = path.join(root, 'node_modules', `.client-${process.pid}`);
  const old = `${draft}-old`;
  try {
    await viteBuild(root, draft, signal);
    await writeFile(path.join(draft, '.built-from'), stamp);
    await rename(dist, old).catch(unlessMissing);
    await rename(draft, dist);
  } catch (error) {
    signal.throwIfAborted();
    throw error instanceof StartupError ? error : (writeFault(error, root) ?? error);
  } finally {
    await Promise.all([draft, old].map((folder) => rm(folder, { recursive: true, force: true })));
  }
}

/** One hash over the names and the bytes of everything the client is made from. */
async function hashOf(root: string): Promise<string> {
  const hash = createHash('sha256').update(process.version);
  const files = (await Promise.all(sources.map((source) => filesBelow(path.join(root, source))))).flat().sort();
  const contents = await Promise.all(files.map((file) => readFile(file)));
  files.forEach((file, index) => {
    const content = contents[index] ?? Buffer.alloc(0);
    hash.update(`\n${path.relative(root, file)}\n${content.length}\n`).update(content);
  });
  return hash.digest('hex');
}

async function filesBelow(place: string): Promise<string[]> {
  try {
    const entries = await readdir(place, { withFileTypes: true, recursive: true });
    return entries.filter((entry) => entry.isFile()).map((entry) => path.join(entry.parentPath, entry.name));
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOTDIR') return [place];
    unlessMissing(error as NodeJS.ErrnoException);
    return [];
  }
}

function unlessMissing(error: NodeJS.ErrnoException): void {
  if (error.code !== 'ENOENT') throw error;
}

async function viteBuild(root: string, outDir: string, signal: AbortSignal): Promise<void> {
  const vite = path.join(root, 'node_modules/vite/bin/vite.js');
  const args = [vite, 'build', '--outDir', outDir, '--emptyOutDir', '--logLevel', 'error'];
  const env = { ...process.env, NODE_ENV: 'production' };
  const child = spawn(process.execPath, args, { cwd: root, env, stdio: ['ignore', 2, 2] });
  const end = () => child.kill('SIGKILL');
  signal.addEventListener('abort', end, { once: true });
  const code = await new Promise((resolve, reject) => child.once('error', reject).once('close', resolve));
  signal.removeEventListener('abort', end);
  signal.throwIfAborted();
  if (code !== 0) throw new StartupError('The client could not be built; vite says why above.');
}
