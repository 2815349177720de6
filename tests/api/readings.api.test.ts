import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { ProductionEvent } from '../../shared/api/events.ts';
import type { Take } from '../../shared/api/takes.ts';
import { type Reading, readingSchema } from '../../shared/reading/document.ts';
import type { Production } from '../../server/entities/Production.ts';
import { type Client, signIn } from '../support/client.ts';
import { buildMember, buildTake } from '../support/factories.ts';
import { goLive, type LiveClient } from '../support/liveClient.ts';
import type { TossDrawing } from '../support/pictures.ts';
import { addPictures, dragToss, startDraft } from '../support/posting.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

let server: TestServer;
let production: Production;
let client: Client;
let tab: LiveClient;

beforeAll(async () => {
  server = await createTestServer();
  const member = await buildMember(server.deps);
  production = member.production;
  client = await signIn(server, member.user);
  tab = await goLive(server, client);
  await tab.join(production.slug);
});
afterAll(async () => {
  tab.close();
  await server.remove();
});

type ReadEvent = Extract<ProductionEvent, { kind: 'take:read' }>;

/** Posts a drawn strip as people do and waits for the event that says it is read. */
async function postAndRead(drawing: TossDrawing): Promise<{ take: Take; event: ReadEvent }> {
  const draft = await startDraft(client, production.slug);
  await addPictures(client, draft.id, await dragToss(drawing));
  const post = { shotNumber: '300-0010', shotTitle: 'Reads', fps: { num: 24, den: 1 }, firstFrame: 1001 };
  const { body: take } = await client.post(`/drafts/${draft.id}/post`, post).expect(201);
  expect(take.reading).toEqual({ status: 'queued', message: null });
  return { take, event: await tab.next('take:read') };
}

const room = { width: 480, height: 270 };

describe('a strip with a thing in flight', () => {
  test('is read by the engine, with progress by frames, and its card carries the sketch', async () => {
    const progress: { takeId: string; done: number; total: number }[] = [];
    tab.socket.on('take:progress', (told) => progress.push(told));
    const { take, event } = await postAndRead({ frames: 24, ...room });
    tab.socket.off('take:progress');

    const { card, shot } = event.payload;
    expect(event.actor).toBeNull();
    expect(card.take).toMatchObject({ id: take.id, revision: event.seq, reading: { status: 'read', message: null } });
    expect(shot.revision).toBe(event.seq);
    expect(card.take.sketch).toMatchObject({ width: 480, height: 270, outcome: 'read' });
    expect(card.take.sketch!.marks.length).toBeGreaterThan(20);
    expect(card.take.sketch!.arcs.length).toBeGreaterThan(0);

    expect(progress.length).toBeGreaterThan(0);
    expect(progress.every(({ takeId, done, total }) => takeId === take.id && done <= total && total === 24)).toBe(true);
    expect((await client.get(`/productions/${production.slug}/shots/300-0010/takes/${take.number}`)).body).toEqual(
      card.take,
    );
  });

  test('has its reading as a document that names its engine, its frames and its take', async () => {
    const { take } = await postAndRead({ frames: 20, ...room });
    const { body } = await client.get(`/takes/${take.id}/reading`).expect(200);
    const reading = readingSchema.parse(body);
    expect(reading).toMatchObject({
      id: `300-0010/${take.number}`,
      source: { kind: 'frames', frames: 20, width: 480, height: 270, firstFrame: 1001, fps: { num: 24, den: 1 } },
    });
    expect(reading.engine).toMatch(/^\d+\.\d+/);

    await client.post(`/takes/${take.id}/move`, { shotNumber: '300-0011', shotTitle: 'Elsewhere' }).expect(200);
    const moved = await client.get(`/takes/${take.id}/reading`).expect(200);
    expect(moved.body).toEqual({ ...body, id: '300-0011/1' });
  });

  test('is read again when someone asks, and only once at a time', async () => {
    const { take } = await postAndRead({ frames: 20, ...room });
    const before = (await client.get(`/takes/${take.id}/reading`).expect(200)).body;
    const again = await client.post(`/takes/${take.id}/reading`).expect(202);
    expect(again.body.reading.status).toBe('queued');
    const twice = await client.post(`/takes/${take.id}/reading`);
    expect(twice.status).toBe(409);
    const states = [await tab.next('take:read'), await tab.next('take:read')];
    expect(states.map(({ payload }) => payload.card.take.reading.status)).toEqual(['queued', 'read']);
    expect((await client.get(`/takes/${take.id}/reading`).expect(200)).body).toEqual(before);
  });
});

test('a strip with a gap is read on the frames that it has, and the gap is said', async () => {
  const draft = await startDraft(client, production.slug);
  const files = (await dragToss({ frames: 24, ...room })).filter((_, index) => ![7, 15].includes(index));
  await addPictures(client, draft.id, files);
  const post = { shotNumber: '300-0010', fps: { num: 24, den: 1 }, firstFrame: 101 };
  const { body: take } = await client.post(`/drafts/${draft.id}/post`, post).expect(201);
  expect(take).toMatchObject({ frames: 24, missingFrames: [108, 116] });
  await tab.next('take:read');
  const reading: Reading = (await client.get(`/takes/${take.id}/reading`).expect(200)).body;
  expect(reading.cautions).toContain('Frames 108, 116 were not posted; the arc is read from the others.');
  expect(reading.findings).toEqual([]);
  const [thing] = reading.objects;
  expect(thing!.marks.map(({ frame }) => frame)).not.toContain(8);
  expect(thing!.flights[0]!.apex!.frame).toBeCloseTo(12.5, 1);
});

test('a strip with nothing moving is read as such, without a finding', async () => {
  const { event, take } = await postAndRead({ frames: 16, ...room, still: true });
  expect(event.payload.card.take.reading.status).toBe('read');
  expect(event.payload.card.take.sketch).toMatchObject({ outcome: 'no-motion', marks: [], findings: [] });
  const { body } = await client.get(`/takes/${take.id}/reading`).expect(200);
  expect(body.cautions.join(' ')).toMatch(/mov/i);
});

test('a strip in which two things move has both read', async () => {
  const { take } = await postAndRead({ frames: 24, ...room, balls: 2 });
  const { body } = await client.get(`/takes/${take.id}/reading`).expect(200);
  const things = body.objects.map(({ outcome, marks }: Reading['objects'][number]) => [outcome, marks.length]);
  expect(things).toEqual([
    ['read', 24],
    ['read', 24],
  ]);
  expect(body.cautions).toContain('A and B move here; each is read on its own.');
});

test('a take that waits has no reading yet, and that is said', async () => {
  const { take } = await buildTake(server.deps, { production, shotNumber: '300-0020' });
  const { body } = await client.get(`/takes/${take.id}/reading`).expect(404);
  expect(body).toMatchObject({ code: 'not_found', detail: 'This take has not been read yet.' });
});

test('takes with findings are found by the feed’s filter', async () => {
  const { take, event } = await postAndRead({ frames: 24, ...room, straight: true });
  expect(event.payload.card.take.sketch!.findings.map(({ kind }) => kind)).toEqual(['too-straight']);
  const { body: all } = await client.get(`/productions/${production.slug}/feed?limit=50`).expect(200);
  const { body } = await client.get(`/productions/${production.slug}/feed?filter=with-findings&limit=50`).expect(200);
  const withFindings = all.cards.filter((card: { take: Take }) => (card.take.sketch?.findings.length ?? 0) > 0);
  expect(body.cards[0].take.id).toBe(take.id);
  expect(body.cards).toEqual(withFindings);
});
