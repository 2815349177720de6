import type { DataSource } from 'typeorm';
import { afterAll, beforeAll, expect, inject, test } from 'vitest';
import { createDataSource } from '../../server/data-source.ts';
import type { Deps } from '../../server/deps.ts';
import { Take } from '../../server/entities/Take.ts';
import { record } from '../../server/services/record.ts';
import { readEvents } from '../../server/services/events.service.ts';
import { pinNote } from '../../server/services/threads.service.ts';
import { buildTake } from '../support/factories.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

let server: TestServer;
let another: DataSource;
let elsewhere: Deps;

beforeAll(async () => {
  server = await createTestServer();
  const [{ database }] = await server.deps.dataSource.query('SELECT DATABASE() AS `database`');
  another = await createDataSource({ ...inject('mariadb'), database }).initialize();
  elsewhere = { ...server.deps, dataSource: another };
});
afterAll(async () => {
  await another.destroy();
  await server.remove();
});

test('two processes that write at the same time still number without gaps', async () => {
  const { take, user, production } = await buildTake(server.deps);
  const writes = Array.from({ length: 40 }, (_, index) =>
    pinNote(index % 2 ? server.deps : elsewhere, user.id, take.id, { frame: 1, body: `Note ${index}` }),
  );
  await Promise.all(writes);
  const { events, newest } = await readEvents(server.deps, user.id, production.slug, { after: 0, limit: 500 });
  expect(events.map(({ seq }) => seq)).toEqual(Array.from({ length: 41 }, (_, index) => index + 1));
  expect(newest).toBe(41);
  const counts = events.flatMap((event) => (event.kind === 'thread:pinned' ? event.payload.noteCount : []));
  expect(counts).toEqual(Array.from({ length: 40 }, (_, index) => index + 1));
});

test('takes of one shot that are posted at the same time get numbers one after the other', async () => {
  const { user, production } = await buildTake(server.deps, { shotNumber: '7' });
  const posts = await Promise.all(
    [server.deps, elsewhere, server.deps, elsewhere].map((deps) =>
      buildTake(deps, { production, user, shotNumber: '7' }),
    ),
  );
  expect(posts.map(({ take }) => take.number).sort()).toEqual([2, 3, 4, 5]);
});

test('a write that loses a lock is repeated, and what it did before is undone', async () => {
  const { take, user, production } = await buildTake(server.deps);
  let attempts = 0;
  await record(server.deps, production.id, user.id, async ({ manager, seq }) => {
    attempts += 1;
    await manager.query("UPDATE takes SET changed = CONCAT(changed, '!') WHERE id = ?", [take.id]);
    if (attempts < 3) throw Object.assign(new Error('deadlock'), { driverError: { code: 'ER_LOCK_DEADLOCK' } });
    const board = { revision: seq, stamps: [] };
    return { change: { kind: 'stamps:changed', payload: { takeId: take.id, noteId: null, board } }, answer: seq };
  });
  expect(attempts).toBe(3);
  const { changed } = await server.deps.dataSource.manager.findOneByOrFail(Take, { id: take.id });
  expect(changed).toBe(`${take.changed}!`);
  const { events } = await readEvents(server.deps, user.id, production.slug, { after: 0, limit: 500 });
  expect(events.map(({ seq }) => seq)).toEqual([1, 2]);
});

test('a write that fails for another reason is not repeated', async () => {
  const { user, production } = await buildTake(server.deps);
  let attempts = 0;
  const write = record(server.deps, production.id, user.id, async () => {
    attempts += 1;
    throw new Error('no');
  });
  await expect(write).rejects.toThrow('no');
  expect(attempts).toBe(1);
});
