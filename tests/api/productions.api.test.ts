import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { DEFAULT_TOLERANCES } from '../../shared/reading/tolerances.ts';
import type { Production } from '../../server/entities/Production.ts';
import { type Client, signIn } from '../support/client.ts';
import { buildMember, buildProduction, buildTake, buildUser } from '../support/factories.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

let server: TestServer;
let production: Production;
let client: Client;

beforeAll(async () => {
  server = await createTestServer();
  production = await buildProduction(server.deps, { name: 'The Long Yard' });
  const owner = await buildUser(server.deps, { name: 'Zora Quill', initials: 'ZQ' });
  await buildMember(server.deps, { production, user: owner, role: 'owner' });
  const animator = await buildUser(server.deps, { name: 'Abel Fenn', initials: 'AF' });
  await buildMember(server.deps, { production, user: animator });
  client = await signIn(server, owner);
  for (const shotNumber of ['010-0100', '010-0020', '010-0020']) {
    await buildTake(server.deps, { production, user: animator, shotNumber });
  }
});
afterAll(() => server.remove());

test('a production shows its people by name, my role, the usual tolerances and its newest event', async () => {
  const { body } = await client.get(`/productions/${production.slug}`).expect(200);
  expect(body).toMatchObject({ name: 'The Long Yard', myRole: 'owner', eventSeq: 3, tolerances: DEFAULT_TOLERANCES });
  expect(body.members.map(({ name, role }: { name: string; role: string }) => [name, role])).toEqual([
    ['Abel Fenn', 'animator'],
    ['Zora Quill', 'owner'],
  ]);
});

describe('events', () => {
  test('come in order after a number, up to a limit', async () => {
    const first = await client.get(`/productions/${production.slug}/events?after=0&limit=2`).expect(200);
    expect(first.body.events.map(({ seq }: { seq: number }) => seq)).toEqual([1, 2]);
    expect(first.body.newest).toBe(3);
    const rest = await client.get(`/productions/${production.slug}/events?after=2`).expect(200);
    expect(rest.body.events.map(({ seq, kind }: { seq: number; kind: string }) => [seq, kind])).toEqual([
      [3, 'take:posted'],
    ]);
    expect((await client.get(`/productions/${production.slug}/events?after=3`).expect(200)).body.events).toEqual([]);
  });

  test('need a number to start from', async () => {
    await client.get(`/productions/${production.slug}/events`).expect(422);
    await client.get(`/productions/${production.slug}/events?after=-1`).expect(422);
    await client.get(`/productions/${production.slug}/events?after=0&limit=501`).expect(422);
  });
});

describe('the shot sheet', () => {
  test('lists shots by number with their takes first to last', async () => {
    const { body } = await client.get(`/productions/${production.slug}/shots`).expect(200);
    const rows = body.shots.map((shot: { number: string; takes: { number: number }[] }) => [
      shot.number,
      shot.takes.map(({ number }) => number),
    ]);
    expect(rows).toEqual([
      ['010-0020', [1, 2]],
      ['010-0100', [1]],
    ]);
  });

  test('says who drew the latest take and since when it waits', async () => {
    const { body } = await client.get(`/productions/${production.slug}/shots/010-0020`).expect(200);
    expect(body).toMatchObject({ sequence: '010', state: 'waiting', animator: { name: 'Abel Fenn' }, mentor: null });
    expect(body.waitingSince).toBe(body.takes[1].postedAt);
  });

  test('answers 404 for a shot that is not there', async () => {
    await client.get(`/productions/${production.slug}/shots/999-0001`).expect(404);
  });
});
