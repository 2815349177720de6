import { afterAll, beforeAll, expect, test } from 'vitest';
import { signIn } from '../support/client.ts';
import { buildMember, buildProduction, buildUser } from '../support/factories.ts';
import { goLive, message } from '../support/liveClient.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

let server: TestServer;
beforeAll(async () => {
  server = await createTestServer();
});
afterAll(() => server.remove());

test('those who have a production open see who else has, each person once', async () => {
  const production = await buildProduction(server.deps);
  const [ada, ben] = [
    await buildUser(server.deps, { name: 'Ada Brook' }),
    await buildUser(server.deps, { name: 'Ben Cole' }),
  ];
  for (const user of [ada, ben]) await buildMember(server.deps, { production, user });
  const client = await signIn(server, ada);
  const [first, second] = [await goLive(server, client), await goLive(server, client)];
  const bens = await goLive(server, await signIn(server, ben));

  expect(await first.join(production.slug)).toMatchObject({ here: [{ name: 'Ada Brook' }] });
  const joined = message(first, 'production:here');
  expect(await bens.join(production.slug)).toMatchObject({ here: [{ name: 'Ada Brook' }, { name: 'Ben Cole' }] });
  expect(await joined).toMatchObject({
    slug: production.slug,
    people: [{ name: 'Ada Brook' }, { name: 'Ben Cole' }],
  });
  expect(await second.join(production.slug)).toMatchObject({ here: [{ name: 'Ada Brook' }, { name: 'Ben Cole' }] });

  const left = message(bens, 'production:here');
  first.socket.emit('production:leave', { slug: production.slug });
  expect(await left).toMatchObject({ people: [{ name: 'Ada Brook' }, { name: 'Ben Cole' }] });
  const gone = message(bens, 'production:here');
  second.close();
  expect(await gone).toMatchObject({ people: [{ name: 'Ben Cole' }] });
  first.close();
  bens.close();
});

test('joining answers the newest event, so that a client knows what it missed', async () => {
  const { user, production } = await buildMember(server.deps);
  const tab = await goLive(server, await signIn(server, user));
  expect(await tab.join(production.slug)).toMatchObject({ ok: true, newest: 0 });
  tab.close();
});
