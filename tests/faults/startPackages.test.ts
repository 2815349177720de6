import { spawnSync } from 'node:child_process';
import path from 'node:path';
import { expect, it } from 'vitest';

const root = path.resolve(import.meta.dirname, '../..');
const asking = `
  import { ensurePrograms } from './server/scripts/start/debian.ts';
  const missing = [
    { name: 'Ghost', program: 'no-such-program', packages: ['no-such-package'] },
    { name: 'Node', program: 'node', packages: ['nodejs'] },
    { name: 'Phantom', program: 'no-such-program-2', packages: ['no-such-package-2', 'its-tools'] },
  ];
  await ensurePrograms(missing, new AbortController().signal).catch((error) => console.log(error.message));
`;

it('names the command to run when packages are missing and this user may not install them', ({ skip }) => {
  const program = [process.execPath, '--import', 'tsx', '--input-type=module', '--eval', asking];
  // Root may install, so the question is asked as an ordinary user.
  const ordinary = ['setpriv', '--reuid=65534', '--regid=65534', '--clear-groups', ...program];
  const [command = '', ...args] = process.getuid?.() === 0 ? ordinary : program;
  const environment = {
    cwd: root,
    encoding: 'utf8',
    env: { PATH: process.env.PATH, HOME: '/', TMPDIR: '/tmp' },
  } as const;
  if (process.getuid?.() !== 0 && spawnSync('sudo', ['-n', 'true']).status === 0)
    skip('this user may install packages');
  const { stdout, stderr } = spawnSync(command, args, environment);
  expect({ stdout, stderr }).toEqual({
    stdout:
      'Ghost and Phantom are missing; run this once as root, then start again: apt-get update && apt-get install -y --no-install-recommends no-such-package no-such-package-2 its-tools\n',
    stderr: '',
  });
});
