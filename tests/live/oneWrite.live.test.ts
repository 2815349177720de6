import { afterAll, afterEach, beforeAll, expect, test } from 'vitest';
import type { Production } from '../../server/entities/Production.ts';
import type { User } from '../../server/entities/User.ts';
import { type Client, signIn } from '../support/client.ts';
import { buildMember, buildTake } from '../support/factories.ts';
import { goLive, type LiveClient } from '../support/liveClient.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

let server: TestServer;
let production: Production;
let animator: { user: User; client: Client };
let mentor: { user: User; client: Client };
let takeId: string;
const open: LiveClient[] = [];

beforeAll(async () => {
  server = await createTestServer();
  const first = await buildMember(server.deps);
  production = first.production;
  animator = { user: first.user, client: await signIn(server, first.user) };
  const { user } = await buildMember(server.deps, { production, role: 'mentor' });
  mentor = { user, client: await signIn(server, user) };
  takeId = (await buildTake(server.deps, { production, user: first.user })).take.id;
});
afterEach(() => {
  for (const client of open.splice(0)) client.close();
});
afterAll(() => server.remove());

async function live(client: Client): Promise<LiveClient> {
  const tab = await goLive(server, client);
  open.push(tab);
  const answer = await tab.join(production.slug);
  expect(answer.ok).toBe(true);
  return tab;
}

async function eventsAfter(client: Client, after: number) {
  const { body } = await client.get(`/productions/${production.slug}/events?after=${after}`).expect(200);
  return body;
}

test('a note that is pinned reaches both tabs as the same event that the log keeps', async () => {
  const [one, two] = [await live(animator.client), await live(mentor.client)];
  const { body: thread } = await mentor.client
    .post(`/takes/${takeId}/threads`, { frame: 2, body: 'It hangs here.' })
    .expect(201);
  const heard = await one.next('thread:pinned');
  expect(heard.payload.thread).toEqual(thread);
  expect(heard.actor?.id).toBe(mentor.user.id);
  expect(await two.next('thread:pinned')).toEqual(heard);
  expect((await eventsAfter(animator.client, heard.seq - 1)).events).toEqual([heard]);
});

test('what was missed while the line was down is answered once, in order, without gaps', async () => {
  const before = await live(animator.client);
  const { body: thread } = await mentor.client
    .post(`/takes/${takeId}/threads`, { frame: 1, body: 'Heavier, please.' })
    .expect(201);
  const last = await before.next('thread:pinned');
  before.close();

  await mentor.client.post(`/threads/${thread.id}/notes`, { body: 'And later.' }).expect(201);
  await mentor.client.put(`/takes/${takeId}/stamps/lovely`).expect(200);

  const after = await live(animator.client);
  const missed = await eventsAfter(animator.client, last.seq);
  expect(missed.events.map(({ seq, kind }: { seq: number; kind: string }) => [seq, kind])).toEqual([
    [last.seq + 1, 'note:added'],
    [last.seq + 2, 'stamps:changed'],
  ]);
  expect(missed.newest).toBe(last.seq + 2);
  expect(after.heard).toEqual([]);

  await mentor.client.delete(`/takes/${takeId}/stamps/lovely`).expect(200);
  expect((await after.next('stamps:changed')).seq).toBe(missed.newest + 1);
});

test('fifty writes at once are numbered without a gap and heard in their order', async () => {
  const tab = await live(animator.client);
  const { newest } = await eventsAfter(animator.client, 0);
  await Promise.all(
    Array.from({ length: 50 }, (_, index) =>
      mentor.client.post(`/takes/${takeId}/threads`, { frame: 1, body: `Note ${index}` }).expect(201),
    ),
  );
  await tab.until(50);
  const expected = Array.from({ length: 50 }, (_, index) => newest + 1 + index);
  expect(tab.heard.map(({ seq }) => seq)).toEqual(expected);
  const log = await eventsAfter(animator.client, newest);
  expect(log.events).toEqual(tab.heard);
});

test('a refused write takes its number back', async () => {
  const { newest } = await eventsAfter(animator.client, 0);
  await animator.client.post(`/takes/${takeId}/move`, { shotNumber: '999-0010' }).expect(422);
  await mentor.client.put(`/takes/${takeId}/stamps/unsure`).expect(200);
  expect((await eventsAfter(animator.client, newest)).events.map(({ seq }: { seq: number }) => seq)).toEqual([
    newest + 1,
  ]);
});

test('asking twice for the same stamp is one event', async () => {
  const { newest } = await eventsAfter(animator.client, 0);
  const first = await animator.client.put(`/takes/${takeId}/stamps/agree`).expect(200);
  const second = await animator.client.put(`/takes/${takeId}/stamps/agree`).expect(200);
  expect(second.body).toEqual(first.body);
  expect((await eventsAfter(animator.client, newest)).events).toHaveLength(1);
});
