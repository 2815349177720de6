import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { Membership } from '../../server/entities/Membership.ts';
import { recheckSockets } from '../../server/realtime/recheckSockets.ts';
import { openClient, signIn } from '../support/client.ts';
import { buildMember, buildTake, PASSWORD } from '../support/factories.ts';
import { goLive, message } from '../support/liveClient.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

let server: TestServer;
beforeAll(async () => {
  server = await createTestServer();
});
afterAll(() => server.remove());

describe('the session', () => {
  test('changes its id when someone signs in, so that a planted one is worth nothing', async () => {
    const { user } = await buildMember(server.deps);
    const client = await signIn(server, user);
    const planted = client.cookie();
    await client.post('/session', { email: user.email, password: PASSWORD }).expect(200);
    expect(client.cookie()).not.toBe(planted);
    await openClient(server).get('/session').set('Cookie', planted).expect(401);
  });

  test('is not taken from a cookie that we did not sign', async () => {
    const { user } = await buildMember(server.deps);
    const client = await signIn(server, user);
    const id = decodeURIComponent(client.cookie())
      .replace(/^spandrel\.sid=s:/, '')
      .split('.')[0];
    const forged = `spandrel.sid=${encodeURIComponent(`s:${id}.${'a'.repeat(43)}`)}`;
    await openClient(server).get('/session').set('Cookie', forged).expect(401);
  });

  test('has a cookie that no script reads and no other site sends', async () => {
    const { user } = await buildMember(server.deps);
    const answer = await openClient(server).post('/session', { email: user.email, password: PASSWORD });
    const [cookie] = answer.headers['set-cookie'] as unknown as string[];
    expect(cookie).toMatch(/; HttpOnly/);
    expect(cookie).toMatch(/; SameSite=Lax/);
    expect(cookie).toMatch(/; Path=\//);
    expect(cookie).not.toMatch(/Domain/);
  });

  test('is not made for those who do not sign in', async () => {
    const answer = await openClient(server).get('/session').expect(401);
    expect(answer.headers['set-cookie']).toBeUndefined();
  });
});

describe('sockets', () => {
  test('are refused without a session', async () => {
    await expect(goLive(server, null)).rejects.toThrow('sign_in_required');
  });

  test('are refused to a page of another site', async () => {
    const { user } = await buildMember(server.deps);
    const client = await signIn(server, user);
    await expect(goLive(server, client, { Origin: 'https://elsewhere.test' })).rejects.toThrow();
    const own = await goLive(server, client, { Origin: server.url });
    own.close();
  });

  test('end with the session, in every tab of it and in no other', async () => {
    const { user } = await buildMember(server.deps);
    const client = await signIn(server, user);
    const elsewhere = await goLive(server, await signIn(server, user));
    const tabs = [await goLive(server, client), await goLive(server, client)];
    const told = tabs.map((tab) => message(tab, 'session:ended'));
    const gone = tabs.map((tab) => new Promise((resolve) => tab.socket.once('disconnect', resolve)));
    await client.delete('/session').expect(204);
    await Promise.all(told);
    await Promise.all(gone);
    expect(elsewhere.socket.connected).toBe(true);
    elsewhere.close();
  });

  test('end when someone else signs in over their session', async () => {
    const client = await signIn(server, (await buildMember(server.deps)).user);
    const tab = await goLive(server, client);
    const told = message(tab, 'session:ended');
    const { user } = await buildMember(server.deps);
    await client.post('/session', { email: user.email, password: PASSWORD }).expect(200);
    await told;
    const own = await goLive(server, client);
    expect(own.socket.connected).toBe(true);
    own.close();
  });

  test('do not open a production of others, nor hear of it', async () => {
    const { take, production, user } = await buildTake(server.deps);
    const stranger = await goLive(server, await signIn(server, (await buildMember(server.deps)).user));
    expect(await stranger.join(production.slug)).toMatchObject({ ok: false, problem: { code: 'not_allowed' } });
    expect(await stranger.join('nowhere')).toMatchObject({ ok: false, problem: { code: 'not_found' } });
    const member = await goLive(server, await signIn(server, user));
    await member.join(production.slug);
    await (await signIn(server, user)).put(`/takes/${take.id}/stamps/agree`).expect(200);
    await member.next('stamps:changed');
    expect(stranger.heard).toEqual([]);
    stranger.close();
    member.close();
  });

  test('answer nonsense with a problem and stay up', async () => {
    const { user, production } = await buildMember(server.deps);
    const tab = await goLive(server, await signIn(server, user));
    const raw = tab.socket as unknown as { emitWithAck(name: string, given: unknown): Promise<unknown> };
    for (const given of [null, 7, {}, { slug: '../etc', protocol: 1 }, { slug: production.slug, protocol: '1' }]) {
      expect(await raw.emitWithAck('production:join', given)).toMatchObject({
        ok: false,
        problem: { code: 'invalid_request' },
      });
    }
    expect(await raw.emitWithAck('production:join', { slug: production.slug, protocol: 999 })).toMatchObject({
      ok: false,
      problem: { code: 'conflict' },
    });
    expect(await tab.join(production.slug)).toMatchObject({ ok: true });
    tab.close();
  });

  test('leave a production when someone is taken off it', async () => {
    const { user, production } = await buildMember(server.deps);
    const other = await buildMember(server.deps, { production });
    const tab = await goLive(server, await signIn(server, user));
    const witness = await goLive(server, await signIn(server, other.user));
    await tab.join(production.slug);
    await witness.join(production.slug);
    await server.deps.dataSource.manager.delete(Membership, { productionId: production.id, userId: user.id });
    const here = message(witness, 'production:here');
    await recheckSockets(server.live, server.deps, server.sessions);
    expect(await here).toMatchObject({ people: [{ id: other.user.id }] });
    expect(await tab.join(production.slug)).toMatchObject({ ok: false, problem: { code: 'not_allowed' } });
    tab.close();
    witness.close();
  });

  test('end when the session is over, though nobody signed out', async () => {
    const { user } = await buildMember(server.deps);
    const client = await signIn(server, user);
    const tab = await goLive(server, client);
    const { sessionId } = [...server.live.of('/').sockets.values()].at(-1)!.data;
    await server.deps.dataSource.query('UPDATE sessions SET expires = 1 WHERE session_id = ?', [sessionId]);
    const ended = message(tab, 'session:ended');
    await recheckSockets(server.live, server.deps, server.sessions);
    await ended;
    await client.get('/session').expect(401);
  });
});

test('a session is written once a minute at most, not with every request', async () => {
  const { user } = await buildMember(server.deps);
  const client = await signIn(server, user);
  await client.get('/session').expect(200);
  const expiries = () => server.deps.dataSource.query('SELECT session_id, expires FROM sessions ORDER BY session_id');
  await server.deps.dataSource.query('UPDATE sessions SET expires = expires - 100 WHERE expires > 1000');
  const before = await expiries();
  for (let request = 0; request < 5; request += 1) await client.get('/session').expect(200);
  expect(await expiries()).toEqual(before);
});
