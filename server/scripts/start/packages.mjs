// Runs before any npm package is there: Node's own modules only.
import { spawn } from 'node:child_process';
import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { startupError } from './sentence.mjs';

/** Installs the npm packages unless npm's own record in node_modules agrees with the lock file. */
export async function ensurePackages(root, signal) {
  if (await agree(root)) return;
  console.log('Installing the npm packages.');
  const code = await npmCi(root, signal);
  signal.throwIfAborted();
  if (code === 0) return;
  throw startupError('The npm packages could not be installed; npm says why above.');
}

/** Every package of the lock file is installed in that version; only optional ones (other platforms') may be missing. */
async function agree(root) {
  const [wanted, installed] = await Promise.all([
    packagesOf(path.join(root, 'package-lock.json')),
    packagesOf(path.join(root, 'node_modules/.package-lock.json')),
  ]);
  return Object.entries(wanted).every(([folder, { version, optional }]) => {
    const found = installed[folder]?.version;
    return folder === '' || found === version || (optional && found === undefined);
  });
}

async function packagesOf(file) {
  try {
    return JSON.parse(await readFile(file, 'utf8')).packages;
  } catch (error) {
    if (error.code === 'ENOENT') return {};
    throw error;
  }
}

function npmCi(root, signal) {
  // `npm start` hands its own settings down, and --omit=dev or a prefix among them would change what is installed here.
  const kept = /^npm_config_(registry|cafile|ca|proxy|https_proxy|noproxy|cache|userconfig|globalconfig)$/i;
  const env = Object.fromEntries(
    Object.entries(process.env).filter(([name]) => !/^npm_config_/i.test(name) || kept.test(name)),
  );
  const args = ['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'];
  const npm = process.env.npm_execpath;
  const command = npm?.endsWith('.js') ? [process.execPath, npm, ...args] : ['npm', ...args];
  const child = spawn(command[0], command.slice(1), { cwd: root, env, stdio: ['ignore', 'inherit', 'inherit'] });
  signal.addEventListener('abort', () => child.kill('SIGTERM'), { once: true });
  return new Promise((resolve, reject) => child.once('error', reject).once('close', resolve));
}
