import { readdir } from 'node:fs/promises';
import path from 'node:path';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Production } from '../../server/entities/Production.ts';
import { type Client, signIn } from '../support/client.ts';
import { buildMember } from '../support/factories.ts';
import { drawTossFrame } from '../support/pictures.ts';
import { addPictures, dragToss, startDraft } from '../support/posting.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

let server: TestServer;
let production: Production;
let client: Client;

const fps = { num: 24, den: 1 };
const post = { shotNumber: '020-0140', shotTitle: 'The toss', fps, firstFrame: 1001 };

beforeAll(async () => {
  server = await createTestServer();
  const member = await buildMember(server.deps);
  production = member.production;
  client = await signIn(server, member.user);
});
afterAll(() => server.remove());

describe('a numbered set', () => {
  test('is put in order, shows its first frame and is posted as take 1 of a new shot', async () => {
    const draft = await startDraft(client, production.slug);
    expect(draft).toMatchObject({ pictures: [], ready: false, warnings: [], refused: [] });
    const files = await dragToss({ frames: 12, firstFrame: 995 });
    const filled = await addPictures(client, draft.id, files.toReversed());
    expect(filled.pictures.map(({ number }) => number)).toEqual(Array.from({ length: 12 }, (_, index) => 995 + index));
    expect(filled).toMatchObject({ firstFrame: 995, missingFrames: [], warnings: [], ready: true, grid: null });

    const { body: take } = await client
      .post(`/drafts/${draft.id}/post`, { ...post, firstFrame: 995, changed: 'First pass.', intended: 'Heavy.' })
      .expect(201);
    expect(take).toMatchObject({
      shotNumber: '020-0140',
      number: 1,
      frames: 12,
      firstFrame: 995,
      width: 320,
      height: 180,
      changed: 'First pass.',
      fps,
    });
    const picture = await client.get(`/takes/${take.id}/frames/12/picture`).expect(200);
    expect(picture.body.equals(files[11]!.bytes)).toBe(true);
  });

  test('makes the next take of a shot that is there, which keeps its title', async () => {
    const draft = await startDraft(client, production.slug);
    await addPictures(client, draft.id, await dragToss({ frames: 2, format: 'webp' }, (n) => `${n}.webp`));
    const given = { ...post, shotTitle: 'Another title' };
    const { body: take } = await client.post(`/drafts/${draft.id}/post`, given).expect(201);
    expect(take.number).toBe(2);
    const { body: shot } = await client.get(`/productions/${production.slug}/shots/020-0140`).expect(200);
    expect(shot.title).toBe('The toss');
  });

  test('is posted once, however often someone clicks', async () => {
    const draft = await startDraft(client, production.slug);
    await addPictures(client, draft.id, await dragToss({ frames: 3 }));
    const answers = await Promise.all([1, 2, 3].map(() => client.post(`/drafts/${draft.id}/post`, post)));
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409]);
    const late = await client.post(`/drafts/${draft.id}/post`, post).expect(409);
    expect(late.body.code).toBe('draft_closed');
  });

  test('stays as it was when the post is refused', async () => {
    const draft = await startDraft(client, production.slug);
    const filled = await addPictures(client, draft.id, await dragToss({ frames: 3 }));
    const { body } = await client.post(`/drafts/${draft.id}/post`, { fps, shotNumber: '777-0001' }).expect(422);
    expect(body.fields).toEqual([{ path: 'shotTitle', message: 'Shot 777-0001 is new; give it a title.' }]);
    expect((await client.get(`/drafts/${draft.id}`).expect(200)).body).toEqual(filled);
    const takes = await server.deps.dataSource.query('SELECT id FROM takes');
    expect(await readdir(path.join(server.dataDir, 'takes'))).toHaveLength(takes.length);
  });

  test('with a name twice keeps the later file', async () => {
    const draft = await startDraft(client, production.slug);
    await addPictures(client, draft.id, await dragToss({ frames: 3 }));
    const later = { name: 'toss.1002.png', bytes: await drawTossFrame(2, { frames: 3, still: true }) };
    const filled = await addPictures(client, draft.id, [later]);
    expect(filled.pictures).toHaveLength(3);
    const { body: take } = await client.post(`/drafts/${draft.id}/post`, post).expect(201);
    const picture = await client.get(`/takes/${take.id}/frames/2/picture`).expect(200);
    expect(picture.body.equals(later.bytes)).toBe(true);
  });

  test('loses the picture that is taken out', async () => {
    const draft = await startDraft(client, production.slug);
    await addPictures(client, draft.id, await dragToss({ frames: 3 }, (n) => `Über die Ecke ${n}.png`));
    const gone = encodeURIComponent('Über die Ecke 1001.png');
    const { body } = await client.delete(`/drafts/${draft.id}/pictures/${gone}`).expect(200);
    expect(body.pictures.map(({ name }: { name: string }) => name)).toEqual([
      'Über die Ecke 1002.png',
      'Über die Ecke 1003.png',
    ]);
    await client.delete(`/drafts/${draft.id}/pictures/${gone}`).expect(404);
  });

  test('that is thrown away leaves nothing', async () => {
    const draft = await startDraft(client, production.slug);
    await addPictures(client, draft.id, await dragToss({ frames: 2 }));
    await client.delete(`/drafts/${draft.id}`).expect(204);
    await client.get(`/drafts/${draft.id}`).expect(404);
    expect(await readdir(path.join(server.dataDir, 'drafts'))).not.toContain(draft.id);
  });
});

describe('a draft', () => {
  test('is nobody else’s, also on the same production', async () => {
    const draft = await startDraft(client, production.slug);
    const { user } = await buildMember(server.deps, { production, role: 'owner' });
    const other = await signIn(server, user);
    await other.get(`/drafts/${draft.id}`).expect(403);
    await other.post(`/drafts/${draft.id}/post`, post).expect(403);
    await other.delete(`/drafts/${draft.id}`).expect(403);
  });

  test('without frames is not posted', async () => {
    const draft = await startDraft(client, production.slug);
    const { body } = await client.post(`/drafts/${draft.id}/post`, post).expect(422);
    expect(body).toMatchObject({ code: 'draft_empty', detail: 'There are no frames in this post yet.' });
  });

  test.each([
    ['a shot number with a slash', { shotNumber: '../x' }, 'shotNumber'],
    ['no frames a second', { fps: { num: 0, den: 1 } }, 'fps.num'],
    ['a thousand frames a second', { fps: { num: 1000, den: 1 } }, 'fps'],
    ['fours', { hold: 4 }, 'hold'],
    ['half a first frame', { firstFrame: 1.5 }, 'firstFrame'],
  ])('refuses %s', async (_, wrong, field) => {
    const draft = await startDraft(client, production.slug);
    const { body } = await client.post(`/drafts/${draft.id}/post`, { ...post, ...wrong }).expect(422);
    expect(body.fields.map(({ path: at }: { path: string }) => at)).toContain(field);
  });
});

describe('a strip picture', () => {
  async function drawStrip(columns: number, rows: number): Promise<Buffer> {
    const count = columns * rows;
    const cells = await Promise.all(
      Array.from({ length: count }, async (_, index) => ({
        input: await drawTossFrame(index + 1, { frames: count, width: 160, height: 90 }),
        left: (index % columns) * 168 + 8,
        top: Math.floor(index / columns) * 98 + 8,
      })),
    );
    const size = { width: columns * 168 + 8, height: rows * 98 + 8, channels: 3 as const, background: '#000' };
    return sharp({ create: size }).composite(cells).png().toBuffer();
  }

  test('is cut where its frames are, and posted frame by frame', async () => {
    const draft = await startDraft(client, production.slug);
    const filled = await addPictures(client, draft.id, [{ name: 'strip.png', bytes: await drawStrip(4, 2) }]);
    expect(filled).toMatchObject({
      ready: true,
      firstFrame: null,
      grid: { columns: 4, rows: 2, cellWidth: 160, cellHeight: 90, gutterX: 8, gutterY: 8, count: 8 },
    });
    const { body: take } = await client.post(`/drafts/${draft.id}/post`, { ...post, firstFrame: 1 }).expect(201);
    expect(take).toMatchObject({ frames: 8, width: 160, height: 90, firstFrame: 1 });
    const frame = await client.get(`/takes/${take.id}/frames/8/picture`).expect(200);
    expect(await sharp(frame.body).metadata()).toMatchObject({ width: 160, height: 90 });
  });

  test('is cut as someone says instead', async () => {
    const draft = await startDraft(client, production.slug);
    const filled = await addPictures(client, draft.id, [{ name: 'strip.png', bytes: await drawStrip(4, 2) }]);
    const grid = { ...filled.grid!, count: 7 };
    const { body } = await client.patch(`/drafts/${draft.id}/grid`, { grid }).expect(200);
    expect(body.grid.count).toBe(7);
    const { body: frame } = await client.patch(`/drafts/${draft.id}/grid`, { grid: null }).expect(200);
    expect(frame).toMatchObject({ grid: null, ready: false, warnings: [expect.stringContaining('One frame')] });
  });

  test('is not cut past its edge', async () => {
    const draft = await startDraft(client, production.slug);
    const filled = await addPictures(client, draft.id, [{ name: 'strip.png', bytes: await drawStrip(4, 2) }]);
    const grid = { ...filled.grid!, columns: 5, count: 10 };
    const { body } = await client.patch(`/drafts/${draft.id}/grid`, { grid }).expect(422);
    expect(body.detail).toContain('reaches past the picture, which is 680 × 204 px');
  });

  test('is no strip any more when other pictures join it', async () => {
    const draft = await startDraft(client, production.slug);
    await addPictures(client, draft.id, [{ name: 'strip.png', bytes: await drawStrip(4, 2) }]);
    const filled = await addPictures(client, draft.id, await dragToss({ frames: 2 }));
    expect(filled.grid).toBeNull();
    await client.patch(`/drafts/${draft.id}/grid`, { grid: null }).expect(409);
  });
});
