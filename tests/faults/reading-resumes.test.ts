import { rm } from 'node:fs/promises';
import path from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { Take } from '../../server/entities/Take.ts';
import { TakeFrame } from '../../server/entities/TakeFrame.ts';
import { takeFolder } from '../../server/storage/folders.ts';
import { openClient, signIn } from '../support/client.ts';
import { buildTake } from '../support/factories.ts';
import { goLive, message } from '../support/liveClient.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

let server: TestServer;
beforeAll(async () => {
  server = await createTestServer();
});
afterAll(() => server.remove());

async function readingOf(id: string) {
  const { readingStatus: status, readingMessage: said } = await server.deps.dataSource.manager.findOneByOrFail(Take, {
    id,
  });
  return { status, said };
}

test('a server that is stopped in the middle of a reading reads the take after its next start', async () => {
  const built = await buildTake(server.deps, { frames: 60 });
  const client = await signIn(server, built.user);
  const tab = await goLive(server, client);
  await tab.join(built.production.slug);
  const began = message(tab, 'take:progress');
  server.deps.readings.add(built.take.id);
  expect(await began).toMatchObject({ takeId: built.take.id, total: 60 });

  await server.restart();
  expect(tab.heard).toEqual([]);
  const again = await goLive(server, client);
  await again.join(built.production.slug);
  if ((await readingOf(built.take.id)).status !== 'read') await again.next('take:read');
  expect(await readingOf(built.take.id)).toEqual({ status: 'read', said: null });

  // The session outlives the restart; only the port is new.
  const log = await openClient(server)
    .get(`/productions/${built.production.slug}/events?after=0`)
    .set('Cookie', client.cookie())
    .expect(200);
  expect(log.body.events.map(({ seq, kind }: { seq: number; kind: string }) => [seq, kind])).toEqual([
    [1, 'take:posted'],
    [2, 'take:read'],
  ]);
  again.close();
});

test('a reading that fails says so in a sentence, keeps the frames, and can be asked for again', async () => {
  const built = await buildTake(server.deps, { frames: 5 });
  const client = await signIn(server, built.user);
  const tab = await goLive(server, client);
  await tab.join(built.production.slug);
  const frame = await server.deps.dataSource.manager.findOneByOrFail(TakeFrame, { takeId: built.take.id, frame: 3 });
  await rm(path.join(takeFolder(server.dataDir, built.take.id), frame.file));

  server.deps.readings.add(built.take.id);
  const { payload } = await tab.next('take:read');
  expect(payload.card.take.reading.status).toBe('failed');
  expect(payload.card.take.reading.message).toMatch(/^[^/]+\.$/);
  expect(payload.card.take.reading.message).not.toContain(server.dataDir);
  await client.get(`/takes/${built.take.id}/frames/2/picture`).expect(200);
  await client.get(`/takes/${built.take.id}/frames/3/picture`).expect(404);

  await client.post(`/takes/${built.take.id}/reading`).expect(202);
  expect((await tab.next('take:read')).payload.card.take.reading.status).toBe('queued');
  expect((await tab.next('take:read')).payload.card.take.reading.status).toBe('failed');
  tab.close();
});
