import { io } from 'socket.io-client';
import { afterAll, afterEach, beforeAll, expect, test } from 'vitest';
import type { Production } from '../../server/entities/Production.ts';
import type { User } from '../../server/entities/User.ts';
import { type LineState, liveProduction } from '../../src/lib/liveProduction.ts';
import type { ProductionSocket } from '../../src/lib/socket.ts';
import { type Client, signIn } from '../support/client.ts';
import { buildMember, buildTake, buildUser } from '../support/factories.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

let server: TestServer;
let production: Production;
let user: User;
let takeId: string;
let mentor: Client;
const lines: { leave: () => void; socket: ProductionSocket }[] = [];

beforeAll(async () => {
  server = await createTestServer();
  const first = await buildMember(server.deps);
  production = first.production;
  user = first.user;
  const second = await buildMember(server.deps, { production, role: 'mentor' });
  mentor = await signIn(server, second.user);
  takeId = (await buildTake(server.deps, { production, user })).take.id;
});
afterEach(() => {
  for (const { leave, socket } of lines.splice(0)) {
    leave();
    socket.disconnect();
  }
});
afterAll(() => server.remove());

const newestOf = async (client: Client): Promise<number> =>
  (await client.get(`/productions/${production.slug}`).expect(200)).body.eventSeq;

/** The client's own line on a real socket: what it showed, and how it said it was. */
function openLine(client: Client, seen: number) {
  const socket: ProductionSocket = io(server.url, {
    extraHeaders: { Cookie: client.cookie() },
    autoConnect: false,
    forceNew: true,
    reconnectionDelay: 10,
  });
  const shown: number[] = [];
  const states: LineState[] = [];
  const waiting = new Set<() => void>();
  const changed = () => waiting.forEach((look) => look());
  const until = (holds: () => boolean): Promise<void> =>
    new Promise((resolve) => {
      const look = () => {
        if (!holds()) return;
        waiting.delete(look);
        resolve();
      };
      waiting.add(look);
      look();
    });
  const line = liveProduction({
    slug: production.slug,
    socket,
    seen,
    fetchAfter: async (after) => (await client.get(`/productions/${production.slug}/events?after=${after}`)).body,
    onEvent: (event) => {
      shown.push(event.seq);
      changed();
    },
    onProgress: () => {},
    onHere: () => {},
    onState: (state) => {
      states.push(state);
      changed();
    },
  });
  lines.push({ leave: line.leave, socket });
  return { socket, shown, states, line, until, is: (state: LineState) => until(() => states.at(-1) === state) };
}

const stamp = (kind: string, on: boolean) =>
  (on ? mentor.put(`/takes/${takeId}/stamps/${kind}`) : mentor.delete(`/takes/${takeId}/stamps/${kind}`)).expect(200);

test('a page shows what happened between its data and its line, then every event as it comes', async () => {
  const client = await signIn(server, user);
  const seen = await newestOf(client);
  await stamp('lovely', true);
  const { is, until, shown } = openLine(client, seen);
  await is('live');
  expect(shown).toEqual([seen + 1]);
  await stamp('lovely', false);
  await until(() => shown.length === 2);
  expect(shown).toEqual([seen + 1, seen + 2]);
});

test('a line that breaks comes back, and shows once and in order what it missed', async () => {
  const client = await signIn(server, user);
  const seen = await newestOf(client);
  const { is, until, shown, states, socket } = openLine(client, seen);
  await is('live');
  socket.io.reconnection(false);
  socket.io.engine.close();
  await is('reconnecting');
  await stamp('agree', true);
  await stamp('agree', false);
  await stamp('unsure', true);
  expect(shown).toEqual([]);

  socket.connect();
  await is('live');
  await stamp('unsure', false);
  await until(() => shown.length === 4);
  expect(shown).toEqual([seen + 1, seen + 2, seen + 3, seen + 4]);
  expect(states).toEqual(['live', 'reconnecting', 'live']);
});

test('a session that ends is said as that, also when the line drops with it', async () => {
  const client = await signIn(server, user);
  const { is, states, socket } = openLine(client, await newestOf(client));
  await is('live');
  const dropped = new Promise((resolve) => socket.once('disconnect', resolve));
  await client.delete('/session').expect(204);
  await is('ended');
  await dropped;
  expect(states.at(-1)).toBe('ended');
});

test('a page without a session is told so when it opens its line', async () => {
  const client = await signIn(server, user);
  const seen = await newestOf(client);
  await client.delete('/session').expect(204);
  const { is, states } = openLine(client, seen);
  await is('ended');
  expect(states).toEqual(['ended']);
});

test('a production that is not open to someone is closed to their line', async () => {
  const stranger = await signIn(server, await buildUser(server.deps));
  const { is, states } = openLine(stranger, 0);
  await is('closed');
  expect(states).toEqual(['closed']);
});

test('opening and leaving a page five times leaves one listener for each event, and then none', async () => {
  const client = await signIn(server, user);
  const seen = await newestOf(client);
  const { socket, is, line } = openLine(client, seen);
  await is('live');
  const open = () =>
    liveProduction({
      slug: production.slug,
      socket,
      seen,
      fetchAfter: async () => ({ events: [], newest: seen }),
      onEvent: () => {},
      onProgress: () => {},
      onHere: () => {},
      onState: () => {},
    });
  line.leave();
  for (let time = 0; time < 5; time++) open().leave();
  const last = open();
  for (const name of ['production:event', 'production:here', 'take:progress', 'session:ended'] as const) {
    expect(socket.listeners(name)).toHaveLength(1);
  }
  last.leave();
  expect(socket.listeners('production:event')).toHaveLength(0);
  expect(socket.listeners('connect')).toHaveLength(0);
});
