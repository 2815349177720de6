import { afterAll, beforeAll, expect, test } from 'vitest';
import { openClient, signIn } from '../support/client.ts';
import { everyContract } from '../support/contracts.ts';
import { buildUser } from '../support/factories.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

let server: TestServer;
// The description is JSON of any depth; tests look at single places of it.
// oxlint-disable-next-line typescript/no-explicit-any
let description: any;

beforeAll(async () => {
  server = await createTestServer();
  const client = await signIn(server, await buildUser(server.deps));
  description = (await client.get('/openapi.json').expect(200)).body;
});
afterAll(() => server.remove());

test('is for those who are signed in', async () => {
  await openClient(server).get('/openapi.json').expect(401);
});

test('describes every contract, and nothing else', async () => {
  expect(description.openapi).toBe('3.1.0');
  const described = Object.entries(description.paths as Record<string, object>).flatMap(([path, operations]) =>
    Object.keys(operations).map((method) => `${method} ${path}`),
  );
  const declared = (await everyContract()).map(({ method, path }) => `${method} ${path.replaceAll(/:(\w+)/g, '{$1}')}`);
  expect(described.sort()).toEqual(declared.sort());
});

test('names parameters, bodies, answers and problems', () => {
  const pin = description.paths['/takes/{takeId}/threads'].post;
  expect(pin.parameters).toEqual([expect.objectContaining({ in: 'path', name: 'takeId', required: true })]);
  expect(pin.requestBody.content['application/json'].schema.required).toEqual(['frame', 'body']);
  expect(pin.responses['201'].content['application/json'].schema).toEqual({ $ref: '#/components/schemas/Thread' });
  expect(pin.responses['403'].content['application/problem+json'].schema).toEqual({
    $ref: '#/components/schemas/Problem',
  });
  const upload = description.paths['/drafts/{draftId}/pictures'].post;
  expect(upload.requestBody.content['multipart/form-data'].schema.required).toEqual(['pictures']);
  expect(description.paths['/session'].post.security).toEqual([]);
});

test('holds the reading as JSON Schema', () => {
  const { Reading } = description.components.schemas;
  expect(Reading.properties.format).toMatchObject({ const: 'spandrel-reading/1' });
  expect(Reading.required).toEqual(expect.arrayContaining(['engine', 'source', 'objects', 'findings', 'cautions']));
});

test('refers only to what it holds', () => {
  const refs = [...JSON.stringify(description).matchAll(/"\$ref":"#\/components\/schemas\/(\w+)"/g)].map(
    ([, id]) => id,
  );
  expect(refs.length).toBeGreaterThan(10);
  for (const id of refs) expect(description.components.schemas).toHaveProperty(id!);
});
