import { afterAll, beforeAll, expect, test } from 'vitest';
import type { FeedPage } from '../../shared/api/feed.ts';
import type { Production } from '../../server/entities/Production.ts';
import type { User } from '../../server/entities/User.ts';
import { type Client, signIn } from '../support/client.ts';
import { buildMember, buildProduction, buildTake } from '../support/factories.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

let server: TestServer;
let production: Production;
let animator: { user: User; client: Client };
let mentor: { user: User; client: Client };

beforeAll(async () => {
  server = await createTestServer();
  production = await buildProduction(server.deps);
  const one = await buildMember(server.deps, { production });
  const two = await buildMember(server.deps, { production, role: 'mentor' });
  animator = { user: one.user, client: await signIn(server, one.user) };
  mentor = { user: two.user, client: await signIn(server, two.user) };
  for (const shotNumber of ['1', '2', '2', '3', '4'])
    await buildTake(server.deps, { production, user: one.user, shotNumber });
  await buildTake(server.deps, { production, user: two.user, shotNumber: '5' });
});
afterAll(() => server.remove());

async function feed(client: Client, query = ''): Promise<FeedPage> {
  return (await client.get(`/productions/${production.slug}/feed${query}`).expect(200)).body;
}

const shown = ({ cards }: FeedPage) => cards.map(({ take }) => `${take.shotNumber}/${take.number}`);

test('shows the newest take first, page by page, each take once', async () => {
  const pages: string[][] = [];
  let cursor: string | null = '';
  while (cursor !== null) {
    const page: FeedPage = await feed(animator.client, `?limit=2${cursor && `&cursor=${cursor}`}`);
    pages.push(shown(page));
    cursor = page.nextCursor;
  }
  expect(pages).toEqual([
    ['5/1', '4/1'],
    ['3/1', '2/2'],
    ['2/1', '1/1'],
  ]);
});

test('a take posted while someone reads on does not push another one twice', async () => {
  const first = await feed(animator.client, '?limit=3');
  await buildTake(server.deps, { production, user: animator.user, shotNumber: '6' });
  const second = await feed(animator.client, `?limit=10&cursor=${first.nextCursor}`);
  expect([...shown(first), ...shown(second)]).toEqual(['5/1', '4/1', '3/1', '2/2', '2/1', '1/1']);
});

test('shows mine', async () => {
  expect(shown(await feed(mentor.client, '?filter=mine'))).toEqual(['5/1']);
});

test('shows a mentor the latest takes that wait, but not their own', async () => {
  expect(shown(await feed(mentor.client, '?filter=waiting-on-me'))).toEqual(['6/1', '4/1', '3/1', '2/2', '1/1']);
});

test('shows an animator what needs another pass', async () => {
  expect(shown(await feed(animator.client, '?filter=waiting-on-me'))).toEqual([]);
  const { cards } = await feed(mentor.client, '?filter=waiting-on-me');
  const take = cards.find((card) => card.take.shotNumber === '3')!.take;
  await mentor.client.post(`/takes/${take.id}/decision`, { state: 'another-pass', remark: 'Heavier.' }).expect(200);
  expect(shown(await feed(animator.client, '?filter=waiting-on-me'))).toEqual(['3/1']);
  expect(shown(await feed(mentor.client, '?filter=waiting-on-me'))).not.toContain('3/1');
});

test('refuses a cursor it did not give', async () => {
  const { body } = await animator.client.get(`/productions/${production.slug}/feed?cursor=x`).expect(422);
  expect(body.fields[0].path).toBe('cursor');
  await animator.client.get(`/productions/${production.slug}/feed?limit=51`).expect(422);
  await animator.client.get(`/productions/${production.slug}/feed?filter=all`).expect(422);
});
