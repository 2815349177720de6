import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import supertest from 'supertest';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { createApp } from '../../server/app.ts';
import { createPassport } from '../../server/http/passport.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

let server: TestServer;
let distDir: string;
let app: ReturnType<typeof createApp>;

beforeAll(async () => {
  server = await createTestServer();
  distDir = await mkdtemp(path.join(tmpdir(), 'spandrel-dist-'));
  await mkdir(path.join(distDir, 'assets'));
  await mkdir(path.join(distDir, 'fonts'));
  await writeFile(path.join(distDir, 'index.html'), '<!doctype html><title>Spandrel</title>');
  await writeFile(path.join(distDir, 'assets', 'main-4f1c.js'), 'export {};');
  await writeFile(path.join(distDir, 'fonts', 'a.woff2'), 'font');
  const { deps, sessions } = server;
  app = createApp(deps, { sessions, passport: createPassport(deps), distDir });
});
afterAll(async () => {
  await server.remove();
  await rm(distDir, { recursive: true, force: true });
});

test('every address of the client answers the page, which is never kept', async () => {
  for (const address of ['/', '/stilt-bakery/shots/010-0020/3?frame=12', '/nowhere']) {
    const { text, headers } = await supertest(app).get(address).expect(200);
    expect(text).toContain('<title>Spandrel</title>');
    expect(headers['cache-control']).toBe('no-store');
    expect(headers['content-type']).toContain('text/html');
  }
});

test('files with a hash in their name are kept for good, fonts for a while', async () => {
  const script = await supertest(app).get('/assets/main-4f1c.js').expect(200);
  expect(script.headers['cache-control']).toBe('public, max-age=31536000, immutable');
  const font = await supertest(app).get('/fonts/a.woff2').expect(200);
  expect(font.headers['cache-control']).toBe('public, max-age=604800');
});

test('a script of an older build is missing and not a page', async () => {
  const { headers } = await supertest(app).get('/assets/main-0000.js').expect(404);
  expect(headers['content-type']).toContain('application/problem+json');
});

test('nothing is written to an address of the client', async () => {
  await supertest(app).post('/nowhere').expect(404);
});

test('a server without a built client says how to build it', async () => {
  const { deps, sessions } = server;
  const bare = createApp(deps, { sessions, passport: createPassport(deps), distDir: path.join(distDir, 'none') });
  const { body } = await supertest(bare).get('/').expect(404);
  expect(body.detail).toBe('The pages are not built yet; run npm run build.');
});
