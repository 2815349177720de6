import { spawn } from 'node:child_process';
import { mkdtemp, readdir, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type HostileFile, writeHostileFiles } from '../support/hostileFiles.ts';

const ROOT = join(import.meta.dirname, '../..');
let folder: string;
let files: HostileFile[];

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'spandrel-hostile-'));
  files = await writeHostileFiles(folder);
});
afterAll(() => rm(folder, { recursive: true, force: true }));

function read(path: string): Promise<{ code: number | null; out: string; err: string }> {
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, ['--import', 'tsx', 'server/scripts/read.ts', path, '--json'], { cwd: ROOT });
    let out = '';
    let err = '';
    child.stdout.on('data', (data) => {
      out += data;
    });
    child.stderr.on('data', (data) => {
      err += data;
    });
    child.on('error', reject);
    child.on('close', (code) => resolve({ code, out, err }));
  });
}

describe('a hostile file', { timeout: 300_000 }, () => {
  it('is refused with one sentence and exit 2, and leaves nothing behind', async () => {
    const before = new Set(await readdir(tmpdir()));
    for (const file of files) {
      const { code, out, err } = await read(file.path);
      expect({ file: file.name, code, out }, err).toEqual({ file: file.name, code: 2, out: '' });
      expect(err.trim().split('\n'), file.name).toHaveLength(1);
      expect(err, file.name).toContain(file.says);
      expect(err, file.name).not.toMatch(/node_modules|at .+:\d+:\d+/);
    }
    const left = (await readdir(tmpdir())).filter((name) => name.startsWith('spandrel-read-') && !before.has(name));
    expect(left).toEqual([]);
  });
});
