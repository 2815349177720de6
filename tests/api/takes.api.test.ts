import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Role } from '../../shared/api/people.ts';
import type { Take } from '../../shared/api/takes.ts';
import type { Production } from '../../server/entities/Production.ts';
import type { User } from '../../server/entities/User.ts';
import { type Client, signIn } from '../support/client.ts';
import { buildMember, buildProduction, buildTake } from '../support/factories.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

let server: TestServer;
let production: Production;
const people = {} as Record<Role | 'other', { user: User; client: Client }>;
let shots = 0;

beforeAll(async () => {
  server = await createTestServer();
  production = await buildProduction(server.deps);
  for (const who of ['animator', 'other', 'mentor', 'producer', 'owner'] as const) {
    const role = who === 'other' ? 'animator' : who;
    const { user } = await buildMember(server.deps, { production, role });
    people[who] = { user, client: await signIn(server, user) };
  }
});
afterAll(() => server.remove());

/** A new shot with one take by the animator. */
async function post(shotNumber = `100-${1000 + (shots += 1)}`, user = people.animator.user): Promise<Take> {
  return (await buildTake(server.deps, { production, user, shotNumber })).take;
}

const at = (shotNumber: string, take?: number) =>
  `/productions/${production.slug}/shots/${shotNumber}${take === undefined ? '' : `/takes/${take}`}`;

test('a take is found by the numbers of its shot and itself', async () => {
  const take = await post();
  const { body } = await people.other.client.get(at(take.shotNumber, 1)).expect(200);
  expect(body).toEqual(take);
  expect(body).toMatchObject({ review: 'waiting', reading: { status: 'queued' }, sketch: null, noteCount: 0 });
  await people.other.client.get(at(take.shotNumber, 2)).expect(404);
  await people.other.client.get(at(take.shotNumber, 0)).expect(404);
});

describe('deciding', () => {
  test.each(['mentor', 'owner'] as const)('a %s clears a take', async (role) => {
    const take = await post();
    const { body } = await people[role].client.post(`/takes/${take.id}/decision`, { state: 'cleared' }).expect(200);
    expect(body).toMatchObject({ review: 'cleared', decision: { state: 'cleared', by: { id: people[role].user.id } } });
    expect(body.revision).toBeGreaterThan(take.revision);
    const shot = await people.animator.client.get(at(take.shotNumber)).expect(200);
    expect(shot.body).toMatchObject({
      state: 'cleared',
      mentor: { id: people[role].user.id },
      waitingSince: null,
      revision: body.revision,
    });
  });

  test.each(['other', 'producer'] as const)('%s does not decide', async (who) => {
    const take = await post();
    const { body } = await people[who].client.post(`/takes/${take.id}/decision`, { state: 'cleared' }).expect(403);
    expect(body).toMatchObject({ code: 'not_allowed', detail: 'A mentor or an owner decides on takes.' });
  });

  test('nobody decides on their own take', async () => {
    for (const who of ['animator', 'mentor', 'owner'] as const) {
      const take = await post(undefined, people[who].user);
      const { body } = await people[who].client.post(`/takes/${take.id}/decision`, { state: 'cleared' }).expect(403);
      expect(body.code).toBe('own_take');
    }
  });

  test('another pass needs a word why', async () => {
    const take = await post();
    const { body } = await people.mentor.client
      .post(`/takes/${take.id}/decision`, { state: 'another-pass', remark: '  ' })
      .expect(422);
    expect(body.fields).toEqual([{ path: 'remark', message: expect.stringContaining('Say in a sentence why') }]);
  });

  test('a mind may change: the last decision counts', async () => {
    const take = await post();
    const decide = (state: string, remark = 'Once more.') =>
      people.mentor.client.post(`/takes/${take.id}/decision`, { state, remark }).expect(200);
    await decide('cleared');
    const { body } = await decide('another-pass', 'It hangs after all.');
    expect(body).toMatchObject({ review: 'another-pass', decision: { remark: 'It hangs after all.' } });
  });

  test('a second click decides nothing more', async () => {
    const take = await post();
    const decide = (remark: string) =>
      people.mentor.client.post(`/takes/${take.id}/decision`, { state: 'another-pass', remark }).expect(200);
    const [first, second] = await Promise.all([decide('Lower the top.'), decide('Lower the top.')]);
    expect(second.body).toEqual(first.body);
    expect((await decide('Lower the top by two frames.')).body.revision).toBe(first.body.revision + 1);
  });

  test('an older take is not decided on', async () => {
    const first = await post();
    await post(first.shotNumber);
    const { body } = await people.mentor.client.post(`/takes/${first.id}/decision`, { state: 'cleared' }).expect(409);
    expect(body).toMatchObject({ code: 'conflict', detail: 'Take 2 is newer; decide on that one.' });
  });
});

describe('moving', () => {
  test('makes it the next take of the other shot, and both shots change', async () => {
    const there = await post();
    const wrong = await post();
    const { body } = await people.animator.client
      .post(`/takes/${wrong.id}/move`, { shotNumber: there.shotNumber })
      .expect(200);
    expect(body).toMatchObject({ id: wrong.id, shotNumber: there.shotNumber, number: 2 });
    const events = await people.other.client
      .get(`/productions/${production.slug}/events?after=${body.revision - 1}`)
      .expect(200);
    expect(events.body.events[0]).toMatchObject({
      kind: 'take:moved',
      payload: {
        card: { take: { id: wrong.id } },
        shot: { number: there.shotNumber, revision: body.revision },
        from: { number: wrong.shotNumber, state: null, revision: body.revision },
        fromTakeNumber: 1,
      },
    });
  });

  test('gives the old number to nobody else', async () => {
    const first = await post();
    const second = await post(first.shotNumber);
    await people.producer.client
      .post(`/takes/${second.id}/move`, { shotNumber: `${first.shotNumber}-B`, shotTitle: 'Elsewhere' })
      .expect(200);
    expect((await people.animator.client.get(at(first.shotNumber))).body.nextTakeNumber).toBe(3);
    expect((await post(first.shotNumber)).number).toBe(3);
  });

  test('to a new shot needs its title', async () => {
    const take = await post();
    const { body } = await people.animator.client
      .post(`/takes/${take.id}/move`, { shotNumber: '500-0001' })
      .expect(422);
    expect(body.fields).toEqual([{ path: 'shotTitle', message: 'Shot 500-0001 is new; give it a title.' }]);
  });

  test('to where it is already is refused', async () => {
    const take = await post();
    await people.animator.client.post(`/takes/${take.id}/move`, { shotNumber: take.shotNumber }).expect(409);
  });

  test('is not for another animator', async () => {
    const take = await post();
    await people.other.client.post(`/takes/${take.id}/move`, { shotNumber: '500-0002', shotTitle: 'No' }).expect(403);
  });
});

describe('pictures', () => {
  test('are answered as posted, for good, and for those on the production only', async () => {
    const take = await post();
    const picture = await people.other.client.get(`/takes/${take.id}/frames/1/picture`).expect(200);
    expect(picture.headers['content-type']).toBe('image/png');
    expect(picture.headers['cache-control']).toBe('private, max-age=31536000, immutable');
    expect(picture.body.subarray(1, 4).toString()).toBe('PNG');
  });

  test('have thumbnails that are WebP', async () => {
    const take = await post();
    const small = await people.other.client.get(`/takes/${take.id}/frames/3/thumbnail`).expect(200);
    expect(small.headers['content-type']).toBe('image/webp');
    expect(small.body.subarray(8, 12).toString()).toBe('WEBP');
  });

  test('end with the last frame', async () => {
    const take = await post();
    await people.other.client.get(`/takes/${take.id}/frames/4/picture`).expect(404);
    await people.other.client.get(`/takes/${take.id}/frames/0/picture`).expect(404);
  });
});
