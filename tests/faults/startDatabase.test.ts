import { spawnSync } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { existsSync, watch } from 'node:fs';
import { mkdir, mkdtemp, readdir, readFile, rm, stat, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { createConnection } from 'mysql2/promise';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { startMariadb } from '../../server/database/mariadb.ts';
import { readOrMakeSecrets } from '../../server/database/secrets.ts';
import { createTestDatabase } from '../support/testDatabase.ts';

const password = randomBytes(24).toString('base64url');
let folder: string;

beforeEach(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'spandrel-fault-'));
});

afterEach(() => rm(folder, { recursive: true, force: true }));

describe('the database of our own', () => {
  it('keeps what was written over a stop and a start, below a folder deeper than a socket path may be', async () => {
    const dataDir = path.join(folder, 'a'.repeat(90), 'b'.repeat(90));
    const first = await startMariadb({ dataDir, password });
    await query(first, 'CREATE TABLE kept (word TEXT)');
    await query(first, "INSERT INTO kept VALUES ('anticipation')");
    await first.stop();
    expect(await readFile(path.join(dataDir, 'db.log'), 'utf8')).toContain('Shutdown complete');

    const second = await startMariadb({ dataDir, password: `${password}-changed` });
    expect(await query(second, 'SELECT word FROM kept')).toEqual([{ word: 'anticipation' }]);
    await second.stop();
    expect(await readdir(dataDir)).not.toContain('db-accounts.sql');
  });

  it('lets nobody in over TCP without its password', async () => {
    const { host, port } = await createTestDatabase();
    for (const user of ['root', 'spandrel', '']) {
      await expect(createConnection({ host, port, user, password: '' })).rejects.toThrow(/Access denied/);
    }
  });

  it('says so, names its log and leaves no server behind when its files are damaged', async () => {
    await (await startMariadb({ dataDir: folder, password })).stop();
    await writeFile(path.join(folder, 'db', 'ibdata1'), 'not a tablespace');
    await expect(startMariadb({ dataDir: folder, password })).rejects.toThrow(
      new RegExp(`^The database did not come up: .+ \\(its log: ${folder}/db.log\\)$`),
    );
    expect(existsSync(path.join(folder, 'db.pid'))).toBe(false);
  });

  it('removes a half-made database when the first start is given up', async () => {
    const giveUp = new AbortController();
    const watcher = watch(folder, (_, name) => name?.startsWith('db.making') && giveUp.abort());
    await expect(startMariadb({ dataDir: folder, password, signal: giveUp.signal })).rejects.toThrow(/abort/);
    watcher.close();
    expect(await readdir(folder)).toEqual([]);
  });

  it('refuses a folder that cannot be made, in one sentence', async () => {
    const file = path.join(folder, 'a-file');
    await writeFile(file, '');
    await expect(startMariadb({ dataDir: path.join(file, 'data'), password })).rejects.toThrow(
      /a-file\/data cannot be written; allow it for this user or point DATA_DIR elsewhere\.$/,
    );
  });

  it('refuses a full disk in one sentence and takes its half-made files away', async ({ skip }) => {
    const disk = path.join(folder, 'disk');
    await mkdir(disk);
    if (spawnSync('mount', ['-t', 'tmpfs', '-o', 'size=20m', 'tmpfs', disk]).status !== 0) skip('only root may mount');
    try {
      await expect(startMariadb({ dataDir: disk, password })).rejects.toThrow(/^The disk that holds .+ is full/);
      expect(await readdir(disk)).toEqual([]);
    } finally {
      spawnSync('umount', [disk]);
    }
  });
});

describe('the secrets of an installation', () => {
  it('are made once, for the eyes of their owner, and stay', async () => {
    const made = await readOrMakeSecrets(folder);
    expect((await stat(path.join(folder, 'secrets.json'))).mode & 0o777).toBe(0o600);
    expect(await readOrMakeSecrets(folder)).toEqual(made);
  });

  it('are never replaced unasked when the file is damaged', async () => {
    await writeFile(path.join(folder, 'secrets.json'), '{"sessionSecret":');
    await expect(readOrMakeSecrets(folder)).rejects.toThrow(/secrets\.json is damaged/);
    expect(await readFile(path.join(folder, 'secrets.json'), 'utf8')).toBe('{"sessionSecret":');
  });
});

async function query(server: Awaited<ReturnType<typeof startMariadb>>, statement: string) {
  const connection = await createConnection(server.connection);
  try {
    return (await connection.query(statement))[0];
  } finally {
    await connection.end();
  }
}
