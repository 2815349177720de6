import type { Test } from 'supertest';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Contract } from '../../shared/api/contract.ts';
import { problemSchema } from '../../shared/errors.ts';
import { type Client, openClient, signIn } from '../support/client.ts';
import { everyContract } from '../support/contracts.ts';
import { buildMember, buildThread, buildUser } from '../support/factories.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

const contracts = await everyContract();
const closed = contracts.filter((contract) => !contract.open);
const name = ({ method, path }: Contract) => `${method.toUpperCase()} ${path}`;

const BODIES: Record<string, object> = {
  'POST /takes/:takeId/threads': { frame: 1, body: 'A word.' },
  'POST /threads/:threadId/notes': { body: 'A word.' },
  'POST /takes/:takeId/decision': { state: 'cleared' },
  'POST /takes/:takeId/move': { shotNumber: '010-0020', shotTitle: 'Another' },
  'POST /drafts/:draftId/post': { shotNumber: '010-0010', fps: { num: 24, den: 1 } },
  'PATCH /drafts/:draftId/grid': { grid: null },
};

let server: TestServer;
let values: Record<string, string>;
let stranger: Client;

beforeAll(async () => {
  server = await createTestServer();
  const { thread, takeId, production, user } = await buildThread(server.deps);
  const member = await signIn(server, user);
  const draft = await member.post(`/productions/${production.slug}/drafts`).expect(201);
  values = {
    slug: production.slug,
    shotNumber: '010-0010',
    takeNumber: '1',
    takeId,
    frame: '1',
    threadId: thread.id,
    noteId: thread.notes[0]!.id,
    kind: 'agree',
    draftId: draft.body.id,
    name: 'toss.1001.png',
  };
  const elsewhere = await buildMember(server.deps, { role: 'owner' });
  stranger = await signIn(server, elsewhere.user);
});
afterAll(() => server.remove());

/** The contract's address with real things in it, below /api. */
function address(contract: Contract): string {
  const filled = contract.path.replaceAll(/:(\w+)/g, (_, key: string) => values[key]!);
  return contract.query && name(contract).endsWith('/events') ? `${filled}?after=0` : filled;
}

function ask(client: Client, contract: Contract): Test {
  const request = client.request(contract.method, address(contract));
  if (contract.files) return request.attach(contract.files, Buffer.from('x'), 'a.png');
  return contract.body ? request.send(BODIES[name(contract)]) : request;
}

test('every body has an example here', () => {
  const wanted = closed.filter(({ body }) => body).map(name);
  expect(Object.keys(BODIES).sort()).toEqual(wanted.sort());
});

test('only sign-in and health are open', () => {
  expect(contracts.filter(({ open }) => open).map(name)).toEqual(['POST /session', 'GET /health']);
});

describe('without a session', () => {
  test.each(closed.map((contract) => [name(contract), contract] as const))('%s answers 401', async (_, contract) => {
    const answer = await ask(openClient(server), contract);
    expect(answer.status).toBe(401);
    expect(problemSchema.parse(answer.body).code).toBe('sign_in_required');
    expect(answer.headers['content-type']).toContain('application/problem+json');
  });
});

describe('for a stranger to the production', () => {
  const inside = closed.filter(({ path }) => path !== '/session');
  test.each(inside.map((contract) => [name(contract), contract] as const))('%s answers 403', async (_, contract) => {
    const answer = await ask(stranger, contract);
    expect(answer.status).toBe(403);
    expect(problemSchema.parse(answer.body).code).toBe('not_allowed');
  });
});

describe('for a thing that is not there', () => {
  const inside = closed.filter(({ path }) => path !== '/session');
  test.each(inside.map((contract) => [name(contract), contract] as const))('%s answers 404', async (_, contract) => {
    const real = values;
    const nobody = '4ab4ad4b-7cf0-4fa5-a7aa-1bf8cd0e1d3c';
    values = { ...real, slug: 'nowhere', takeId: nobody, threadId: nobody, noteId: nobody, draftId: nobody };
    const answer = await ask(stranger, contract);
    values = real;
    expect(answer.status).toBe(404);
    expect(problemSchema.parse(answer.body).code).toBe('not_found');
  });
});

test('a session of someone who is gone is no session', async () => {
  const user = await buildUser(server.deps);
  const client = await signIn(server, user);
  await server.deps.dataSource.query('DELETE FROM users WHERE id = ?', [user.id]);
  await client.get('/session').expect(401);
});
