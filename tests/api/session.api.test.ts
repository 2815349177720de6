import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { openClient, signIn } from '../support/client.ts';
import { buildMember, buildUser, PASSWORD } from '../support/factories.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

let server: TestServer;
beforeAll(async () => {
  server = await createTestServer();
});
afterAll(() => server.remove());

describe('signing in', () => {
  test('answers who it is and which productions they are on', async () => {
    const { user, production } = await buildMember(server.deps, { role: 'mentor' });
    const client = openClient(server);
    const { body } = await client.post('/session', { email: user.email, password: PASSWORD }).expect(200);
    expect(body).toEqual({
      person: { id: user.id, name: user.name, initials: user.initials },
      productions: [{ slug: production.slug, name: production.name, role: 'mentor' }],
    });
    expect((await client.get('/session').expect(200)).body).toEqual(body);
  });

  test('takes the address in any case', async () => {
    const user = await buildUser(server.deps);
    await openClient(server).post('/session', { email: user.email.toUpperCase(), password: PASSWORD }).expect(200);
  });

  test('answers a wrong password and an unknown address with the same words', async () => {
    const user = await buildUser(server.deps);
    const wrong = await openClient(server).post('/session', { email: user.email, password: 'no' }).expect(401);
    const unknown = await openClient(server).post('/session', { email: 'no@one.test', password: 'no' }).expect(401);
    expect(wrong.body).toEqual(unknown.body);
    expect(wrong.body).toMatchObject({ code: 'wrong_sign_in', status: 401 });
  });

  test('names the fields that do not fit', async () => {
    const { body } = await openClient(server).post('/session', { email: 'nobody' }).expect(422);
    expect(body.code).toBe('invalid_request');
    expect(body.fields.map(({ path }: { path: string }) => path)).toEqual(['email', 'password']);
  });

  test('answers broken JSON with a sentence', async () => {
    const broken = await openClient(server)
      .request('post', '/session')
      .set('Content-Type', 'application/json')
      .send('{"email":')
      .expect(400);
    expect(broken.body).toMatchObject({ code: 'invalid_request', detail: 'This is not JSON.' });
  });
});

test('signing out ends the session for good', async () => {
  const { user } = await buildMember(server.deps);
  const client = await signIn(server, user);
  const cookie = client.cookie();
  await client.delete('/session').expect(204);
  await client.get('/session').expect(401);
  await openClient(server).get('/session').set('Cookie', cookie).expect(401);
});

test('health answers with the version while the database does', async () => {
  const { body } = await openClient(server).get('/health').expect(200);
  expect(body).toEqual({ ok: true, version: expect.stringMatching(/^\d+\.\d+\.\d+$/) });
});
