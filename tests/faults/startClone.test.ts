import { spawnSync } from 'node:child_process';
import path from 'node:path';
import { expect, it } from 'vitest';

const root = path.resolve(import.meta.dirname, '../..');

it('npm start serves the page on a fresh clone with an empty data folder, stops clean, and installs and builds nothing the second time', () => {
  const { status, stdout, stderr } = spawnSync(process.execPath, ['server/scripts/prove-start.mjs', '--untimed'], {
    cwd: root,
    encoding: 'utf8',
  });
  expect({ status, stderr, stdout }).toMatchObject({
    status: 0,
    stdout: expect.stringContaining('npm start is proved.'),
  });
}, 300_000);
