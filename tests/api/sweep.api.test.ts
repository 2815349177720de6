import { mkdir, readdir, utimes } from 'node:fs/promises';
import path from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { Draft } from '../../server/entities/Draft.ts';
import { reopenDrafts, sweep } from '../../server/services/sweep.ts';
import { signIn } from '../support/client.ts';
import { buildMember, buildTake } from '../support/factories.ts';
import { addPictures, dragToss, startDraft } from '../support/posting.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

let server: TestServer;
beforeAll(async () => {
  server = await createTestServer();
});
afterAll(() => server.remove());

const HOUR = 3_600_000;
const longAgo = new Date(Date.now() - 8 * 24 * HOUR);

/** Makes a folder look as old as it would be after a crash long ago. */
async function age(folder: string): Promise<void> {
  await utimes(folder, longAgo, longAgo);
}

test('posts that nobody touched for a week go, with their files; newer ones and takes stay', async () => {
  const { user, production, take } = await buildTake(server.deps);
  const client = await signIn(server, user);
  const [old, fresh] = [await startDraft(client, production.slug), await startDraft(client, production.slug)];
  for (const draft of [old, fresh]) await addPictures(client, draft.id, await dragToss({ frames: 2 }));
  await server.deps.dataSource.manager.update(Draft, { id: old.id }, { touchedAt: longAgo });
  await age(path.join(server.dataDir, 'drafts', old.id));
  await age(path.join(server.dataDir, 'takes', take.id));
  const stray = path.join(server.dataDir, 'takes', '4ab4ad4b-7cf0-4fa5-a7aa-1bf8cd0e1d3c');
  const young = path.join(server.dataDir, 'takes', '5ab4ad4b-7cf0-4fa5-a7aa-1bf8cd0e1d3c');
  await mkdir(stray);
  await mkdir(young);
  await age(stray);

  await sweep(server.deps);

  await client.get(`/drafts/${old.id}`).expect(404);
  expect((await client.get(`/drafts/${fresh.id}`).expect(200)).body.pictures).toHaveLength(2);
  expect(await readdir(path.join(server.dataDir, 'drafts'))).toEqual([fresh.id]);
  expect((await readdir(path.join(server.dataDir, 'takes'))).sort()).toEqual([take.id, path.basename(young)].sort());
});

test('a draft that was being posted when the server ended can be posted after the next start', async () => {
  const { user, production } = await buildMember(server.deps);
  const client = await signIn(server, user);
  const draft = await startDraft(client, production.slug);
  await addPictures(client, draft.id, await dragToss({ frames: 2 }));
  await server.deps.dataSource.manager.update(Draft, { id: draft.id }, { status: 'posting' });
  await client.get(`/drafts/${draft.id}`).expect(409);
  await reopenDrafts(server.deps);
  const post = { shotNumber: '1', shotTitle: 'One', fps: { num: 24, den: 1 }, hold: 2 };
  const { body: take } = await client.post(`/drafts/${draft.id}/post`, post).expect(201);
  expect(take.hold).toBe(2);
});
