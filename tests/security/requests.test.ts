import { readdir, writeFile } from 'node:fs/promises';
import path from 'node:path';
import supertest from 'supertest';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { SIGN_IN_FAILURES } from '../../server/http/rateLimits.ts';
import { openClient, signIn } from '../support/client.ts';
import { buildMember, buildTake, buildUser, PASSWORD } from '../support/factories.ts';
import { drawTossFrame } from '../support/pictures.ts';
import { addPictures, startDraft } from '../support/posting.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

let server: TestServer;
beforeAll(async () => {
  server = await createTestServer();
});
afterAll(() => server.remove());

describe('a request that changes something', () => {
  const send = (headers: Record<string, string>) =>
    supertest(server.url).post('/api/session').set(headers).send({ email: 'no@one.test', password: 'no' });

  test.each([
    ['another site', { Origin: 'https://elsewhere.test' }],
    ['a look-alike port', { Origin: 'http://127.0.0.1:1' }],
    ['a page without an origin', { Origin: 'null' }],
    ['another site, as the browser says', { 'Sec-Fetch-Site': 'cross-site' }],
    ['a neighbour site', { 'Sec-Fetch-Site': 'same-site' }],
    ['nowhere', {}],
  ])('is refused from %s', async (_, headers) => {
    const { body } = await send(headers as Record<string, string>).expect(403);
    expect(body.code).toBe('foreign_origin');
  });

  test('is heard from our own pages', async () => {
    expect((await send({ Origin: server.url }).expect(401)).body.code).toBe('wrong_sign_in');
    expect((await send({ 'Sec-Fetch-Site': 'same-origin' }).expect(401)).body.code).toBe('wrong_sign_in');
  });
});

test('behind a proxy the public origin counts, and the cookie is for https only', async () => {
  const proxied = await createTestServer({ PUBLIC_ORIGIN: 'https://critique.test' });
  try {
    const { port } = proxied.address;
    const user = await buildUser(proxied.deps);
    const send = (origin: string) =>
      supertest(`http://127.0.0.1:${port}`)
        .post('/api/session')
        .set({ Origin: origin, 'X-Forwarded-Proto': 'https' })
        .send({ email: user.email, password: PASSWORD });
    await send(`http://127.0.0.1:${port}`).expect(403);
    const answer = await send('https://critique.test').expect(200);
    expect((answer.headers['set-cookie'] as unknown as string[])[0]).toMatch(/; Secure/);
    expect(answer.headers['strict-transport-security']).toBeDefined();
  } finally {
    await proxied.remove();
  }
});

test('guessing a password is slowed down, for that machine and address only', async () => {
  const [victim, other] = [await buildUser(server.deps), await buildUser(server.deps)];
  const client = openClient(server);
  for (let attempt = 0; attempt < SIGN_IN_FAILURES.perAddress; attempt += 1) {
    await client.post('/session', { email: victim.email, password: `guess ${attempt}` }).expect(401);
  }
  const { body, headers } = await client.post('/session', { email: victim.email, password: PASSWORD }).expect(429);
  expect(body).toMatchObject({ code: 'too_many_attempts', status: 429 });
  expect(body.detail).toMatch(/wait \d+ minutes/);
  expect(Number(headers['retry-after'])).toBeGreaterThan(0);
  await client.post('/session', { email: other.email, password: PASSWORD }).expect(200);
});

describe('headers', () => {
  test('allow our own scripts, styles and sockets, and pictures from memory', async () => {
    const { headers } = await supertest(server.url).get('/api/health').expect(200);
    const policy = headers['content-security-policy']!;
    expect(policy).toContain("script-src 'self';");
    expect(policy).toContain("img-src 'self' blob: data:");
    expect(policy).toContain("frame-ancestors 'none'");
    expect(policy).not.toContain('unsafe');
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers['x-powered-by']).toBeUndefined();
    expect(headers['cache-control']).toBe('no-store');
  });
});

describe('problem details', () => {
  test('of a fault of ours tell nothing about it', async () => {
    const { user, production } = await buildMember(server.deps);
    const client = await signIn(server, user);
    await server.deps.dataSource.query('RENAME TABLE shots TO shots_away');
    try {
      const { body, text } = await client.get(`/productions/${production.slug}/shots`).expect(500);
      expect(body.code).toBe('internal');
      expect(Object.keys(body).sort()).toEqual(['code', 'detail', 'status', 'title', 'type']);
      expect(text).not.toMatch(/shots|SELECT|server\/|node_modules|ER_/);
    } finally {
      await server.deps.dataSource.query('RENAME TABLE shots_away TO shots');
    }
  });

  test('answer an unknown address below /api as JSON', async () => {
    const { body, headers } = await openClient(server).get('/nowhere/at/all').expect(404);
    expect(headers['content-type']).toContain('application/problem+json');
    expect(body.code).toBe('not_found');
  });

  test('answer a method that the pages do not know', async () => {
    for (const method of ['post', 'delete'] as const) {
      const { body, headers } = await supertest(server.url)[method]('/p/nowhere').expect(404);
      expect(headers['content-type']).toContain('application/problem+json');
      expect(body.code).toBe('not_found');
    }
  });

  test('answer a method that an address below /api does not know, and name those it does', async () => {
    const { body, headers } = await openClient(server).patch('/session', {}).expect(405);
    expect(headers.allow).toBe('POST, GET, DELETE');
    expect(body).toMatchObject({ code: 'invalid_request', status: 405 });
  });

  test('answer a body of another kind instead of reading it as none', async () => {
    const { take, user } = await buildTake(server.deps);
    const client = await signIn(server, user);
    const sent = client.request('post', `/takes/${take.id}/threads`).type('text/plain').send('A word.');
    expect((await sent.expect(415)).body.detail).toContain('application/json');
  });

  test('answer a broken address and a body that is too large', async () => {
    await supertest(server.url).get('/api/productions/%E0%A4%A').expect(404);
    const { user } = await buildMember(server.deps);
    const client = await signIn(server, user);
    const large = await client.post('/session', { email: user.email, password: 'x'.repeat(200_000) }).expect(413);
    expect(large.body.code).toBe('invalid_request');
  });
});

describe('paths', () => {
  test('in file names lead nowhere', async () => {
    const { user, production } = await buildMember(server.deps);
    const client = await signIn(server, user);
    const draft = await startDraft(client, production.slug);
    const bytes = await drawTossFrame(1, { frames: 2 });
    const names = ['../../../escape.1.png', '..\\..\\escape.2.png', '/etc/cron.d/escape.3.png', 'C:\\escape.4.png'];
    const filled = await addPictures(
      client,
      draft.id,
      names.map((name) => ({ name, bytes })),
    );
    for (const { name } of filled.pictures) expect(name).toMatch(/^escape\.\d\.png$/);
    const everything = await readdir(server.dataDir, { recursive: true });
    expect(everything.filter((file) => file.includes('escape'))).toEqual([]);
    expect(everything.filter((file) => !/^(drafts|takes)/.test(file))).toEqual([]);
  });

  test('a part with a header that cannot be parsed is refused, and the draft stays', async () => {
    const { user, production } = await buildMember(server.deps);
    const client = await signIn(server, user);
    const draft = await startDraft(client, production.slug);
    const bytes = await drawTossFrame(1, { frames: 2 });
    const { body } = await client
      .request('post', `/drafts/${draft.id}/pictures`)
      .attach('pictures', bytes, '.\u0000escape.png')
      .expect(400);
    expect(body.code).toBe('invalid_request');
    expect((await client.get(`/drafts/${draft.id}`).expect(200)).body).toEqual(draft);
  });

  test('in addresses lead nowhere', async () => {
    await writeFile(path.join(server.dataDir, 'secrets.json'), '{"sessionSecret":"visible"}');
    const { user, take } = await buildTake(server.deps);
    const client = await signIn(server, user);
    for (const tricky of ['..%2f..%2fsecrets.json', '%2e%2e/secrets.json', '1%00', '..;/1']) {
      const answer = await client.get(`/takes/${take.id}/frames/${tricky}/picture`);
      expect(answer.status).toBeGreaterThanOrEqual(400);
      expect(JSON.stringify(answer.body)).not.toContain('visible');
    }
    for (const tricky of [
      '/..%2fserver/main.ts',
      '/assets/..%2f..%2fpackage.json',
      '/fonts/%2e%2e%2f%2e%2e%2fpackage.json',
    ]) {
      const answer = await supertest(server.url).get(tricky);
      expect(answer.text).not.toMatch(/startServer|"dependencies"/);
    }
  });
});

test('pictures and readings are for those on the production only', async () => {
  const { take } = await buildTake(server.deps);
  const stranger = await signIn(server, (await buildMember(server.deps)).user);
  for (const what of ['frames/1/picture', 'frames/1/thumbnail', 'reading', 'threads']) {
    await stranger.get(`/takes/${take.id}/${what}`).expect(403);
    await openClient(server).get(`/takes/${take.id}/${what}`).expect(401);
  }
});
