// Runs before any npm package is there: Node's own modules only.
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { ensurePackages } from './packages.mjs';
import { startupError } from './sentence.mjs';

const root = path.resolve(import.meta.dirname, '../../..');

/**
 * Makes sure the npm packages are there, then hands over to a TypeScript module of `server/scripts/`, which exports
 * `main({ root, stop })` and answers with the exit code. `stop` is aborted by Ctrl-C, SIGTERM and SIGHUP; it comes once,
 * however often they are sent (npm passes a terminal's Ctrl-C on a second time).
 */
export async function boot(module) {
  const stop = new AbortController();
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => stop.abort());
  // A terminal that was closed must not turn the goodbye into a crash.
  for (const stream of [process.stdout, process.stderr]) stream.on('error', () => {});
  process.chdir(root);
  try {
    const [major, minor] = process.versions.node.split('.').map(Number);
    if (major < 20 || (major === 20 && minor < 19)) {
      throw startupError(`Spandrel needs Node 20.19 or newer; this is ${process.version}.`);
    }
    await ensurePackages(root, stop.signal);
    const { register } = await import('tsx/esm/api');
    register();
    const { main } = await import(pathToFileURL(path.join(root, 'server/scripts', module)).href);
    process.exit(await main({ root, stop }));
  } catch (error) {
    if (error === stop.signal.reason) process.exit(130);
    const ours = error?.name === 'StartupError' || error?.name === 'EnvError';
    console.error(ours ? error.message : error);
    process.exit(1);
  }
}
