import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmdirSync } from 'node:fs';
import { readdir } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { Take } from '../../server/entities/Take.ts';
import { type Client, signIn } from '../support/client.ts';
import { buildMember } from '../support/factories.ts';
import { drawGrain } from '../support/pictures.ts';
import { addPictures, dragToss, startDraft } from '../support/posting.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

/** A disk of one megabyte; only where this process may mount one. */
const disk = mkdtempSync(path.join(tmpdir(), 'spandrel-small-disk-'));
const mounted = spawnSync('mount', ['-t', 'tmpfs', '-o', 'size=1m', 'tmpfs', disk]).status === 0;

describe.skipIf(!mounted)('on a disk that is full', () => {
  let server: TestServer;
  let client: Client;
  let slug: string;

  beforeAll(async () => {
    server = await createTestServer({ DATA_DIR: disk });
    const { user, production } = await buildMember(server.deps);
    client = await signIn(server, user);
    slug = production.slug;
  });
  afterAll(() => server.remove());

  test('a batch that does not fit is refused with a sentence, and what was there stays', async () => {
    const draft = await startDraft(client, slug);
    const filled = await addPictures(client, draft.id, await dragToss({ frames: 3 }));
    const before = (await readdir(path.join(disk, 'drafts', draft.id))).sort();
    const { body } = await client
      .request('post', `/drafts/${draft.id}/pictures`)
      .attach('pictures', Buffer.alloc(2 * 1024 * 1024), 'toss.1004.png')
      .expect(507);
    expect(body).toMatchObject({ code: 'storage_full', status: 507 });
    expect(body.detail).toMatch(/disk.*full/);
    expect((await client.get(`/drafts/${draft.id}`).expect(200)).body).toEqual(filled);
    expect((await readdir(path.join(disk, 'drafts', draft.id))).sort()).toEqual(before);
  });

  test('a post that does not fit leaves no take and no files, and the draft can be posted later', async () => {
    const draft = await startDraft(client, slug);
    // A strip is small as one picture and larger cut into frames.
    const filled = await addPictures(client, draft.id, [{ name: 'strip.png', bytes: await drawGrain(1500, 120) }]);
    const grid = { ...filled.grid, columns: 10, rows: 1, cellWidth: 150, cellHeight: 120, count: 10 };
    await client
      .patch(`/drafts/${draft.id}/grid`, { grid: { ...grid, gutterX: 0, gutterY: 0, marginX: 0, marginY: 0 } })
      .expect(200);
    const post = { shotNumber: '010-0010', shotTitle: 'Full', fps: { num: 24, den: 1 } };
    const { body } = await client.post(`/drafts/${draft.id}/post`, post).expect(507);
    expect(body.code).toBe('storage_full');
    expect(await server.deps.dataSource.manager.count(Take)).toBe(0);
    expect(await readdir(path.join(disk, 'takes')).catch(() => [])).toEqual([]);
    expect((await client.get(`/drafts/${draft.id}`).expect(200)).body.ready).toBe(true);
  });
});

afterAll(() => {
  if (mounted) spawnSync('umount', [disk]);
  rmdirSync(disk);
});
