import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { MAX_FRAMES, MAX_PICTURE_BYTES } from '../../shared/api/drafts.ts';
import { DraftPicture } from '../../server/entities/DraftPicture.ts';
import type { Production } from '../../server/entities/Production.ts';
import { type Client, signIn } from '../support/client.ts';
import { buildMember } from '../support/factories.ts';
import { drawTossFrame } from '../support/pictures.ts';
import { blankPng } from '../support/pngBytes.ts';
import { addPictures, type Dragged, dragToss, startDraft } from '../support/posting.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

let server: TestServer;
let production: Production;
let client: Client;
let good: Dragged[];

const post = { shotNumber: '020-0140', shotTitle: 'The toss', fps: { num: 24, den: 1 }, firstFrame: 1001 };

beforeAll(async () => {
  server = await createTestServer();
  const member = await buildMember(server.deps);
  production = member.production;
  client = await signIn(server, member.user);
  good = await dragToss({ frames: 4 });
});
afterAll(() => server.remove());

/** Drags files in beside four good frames; the good ones must always be kept. */
async function dragIn(...files: Dragged[]) {
  const draft = await startDraft(client, production.slug);
  const filled = await addPictures(client, draft.id, [...good, ...files]);
  expect(filled.pictures.map(({ name }) => name)).toEqual(good.map(({ name }) => name));
  expect(filled.ready).toBe(true);
  return filled;
}

describe('a wrong file among good ones is refused by name, and the rest is kept', () => {
  test('a text file named .png', async () => {
    const { refused } = await dragIn({ name: 'notes.png', bytes: Buffer.from('Remember the apex.\n') });
    expect(refused).toEqual([{ name: 'notes.png', reason: expect.stringMatching(/“notes\.png” is a text file/) }]);
  });

  test('a file of 0 bytes', async () => {
    const { refused } = await dragIn({ name: 'toss.1005.png', bytes: Buffer.alloc(0) });
    expect(refused).toEqual([{ name: 'toss.1005.png', reason: expect.stringContaining('0 bytes') }]);
  });

  test('a JPEG that is cut off', async () => {
    const whole = await drawTossFrame(2, { frames: 4, format: 'jpeg' });
    const { refused } = await dragIn({ name: 'toss.1005.jpg', bytes: whole.subarray(0, whole.length / 2) });
    expect(refused).toEqual([
      { name: 'toss.1005.jpg', reason: expect.stringMatching(/“toss\.1005\.jpg”.*(cut off|damaged)/) },
    ]);
  });

  test('a picture of 20,000 × 20,000 px', async () => {
    const { refused } = await dragIn({ name: 'huge.png', bytes: blankPng(20_000, 20_000) });
    expect(refused).toEqual([{ name: 'huge.png', reason: expect.stringContaining('20,000 × 20,000 px') }]);
  });

  test('a file larger than a picture may be', async () => {
    const { refused } = await dragIn({ name: 'heavy.png', bytes: Buffer.alloc(MAX_PICTURE_BYTES + 1) });
    expect(refused).toEqual([
      { name: 'heavy.png', reason: expect.stringMatching(/“heavy\.png” is larger than 40 MB/) },
    ]);
  });

  test('a frame of another size than the others', async () => {
    const bytes = await drawTossFrame(2, { frames: 4, width: 200, height: 100 });
    const { refused } = await dragIn({ name: 'toss.1005.png', bytes });
    expect(refused).toEqual([
      { name: 'toss.1005.png', reason: '“toss.1005.png” is 200 × 100 px; the other frames are 320 × 180 px.' },
    ]);
  });

  test('a file that was refused is forgotten once a good one of its name arrives', async () => {
    const { id, refused } = await dragIn({ name: 'toss.1005.png', bytes: Buffer.alloc(0) });
    expect(refused).toHaveLength(1);
    const bytes = await drawTossFrame(4, { frames: 4 });
    const mended = await addPictures(client, id, [{ name: 'toss.1005.png', bytes }]);
    expect(mended.refused).toEqual([]);
    expect(mended.pictures).toHaveLength(5);
  });
});

test('the size that most frames have counts, also when it arrives later', async () => {
  const draft = await startDraft(client, production.slug);
  const small = await drawTossFrame(1, { frames: 4, width: 200, height: 100 });
  const first = await addPictures(client, draft.id, [{ name: 'toss.1000.png', bytes: small }]);
  expect(first.refused).toEqual([]);
  const later = await addPictures(client, draft.id, good);
  expect(later.refused.map(({ name }) => name)).toEqual(['toss.1000.png']);
  expect(later.firstFrame).toBe(1001);
});

test('a gap in the numbers is said before the post and kept with the take', async () => {
  const draft = await startDraft(client, production.slug);
  const files = (await dragToss({ frames: 8 })).filter((_, index) => ![2, 4, 5].includes(index));
  const filled = await addPictures(client, draft.id, files);
  expect(filled).toMatchObject({ firstFrame: 1001, missingFrames: [1003, 1005, 1006], ready: true });
  expect(filled.warnings).toEqual(['Frames 1003, 1005–1006 are missing between the files. Add them if you can.']);
  const { body: take } = await client.post(`/drafts/${draft.id}/post`, post).expect(201);
  expect(take).toMatchObject({ missingFrames: [1003, 1005, 1006], frames: 8 });
  const picture = (frame: number) => client.get(`/takes/${take.id}/frames/${frame}/picture`).expect(200);
  expect((await picture(7)).body.equals(files[3]!.bytes)).toBe(true);
  expect((await picture(6)).body).toEqual((await picture(4)).body);
});

test('one frame is not a flight', async () => {
  const draft = await startDraft(client, production.slug);
  const filled = await addPictures(client, draft.id, good.slice(0, 1));
  expect(filled.ready).toBe(false);
  expect(filled.warnings).toEqual([expect.stringContaining('One frame is not a flight')]);
  const { body } = await client.post(`/drafts/${draft.id}/post`, post).expect(422);
  expect(body).toMatchObject({ code: 'draft_empty', detail: 'One frame is not a flight; add the others first.' });
});

describe('very many frames', () => {
  /** Rows as uploads leave them: what counts here is the number, and 4,000 uploads would only take longer. */
  async function fillDraft(draftId: string, count: number): Promise<void> {
    const rows = Array.from({ length: count }, (_, index) => ({
      draftId,
      name: `long.${String(index + 1).padStart(4, '0')}.png`,
      file: `${index}.png`,
      format: 'png' as const,
      width: 320,
      height: 180,
    }));
    await server.deps.dataSource.manager.insert(DraftPicture, rows);
  }

  test('4,000 are too many: the batch past the limit is refused, what was there stays', async () => {
    const draft = await startDraft(client, production.slug);
    await fillDraft(draft.id, MAX_FRAMES);
    const { body } = await client
      .request('post', `/drafts/${draft.id}/pictures`)
      .attach('pictures', good[0]!.bytes, 'long.2001.png')
      .expect(413);
    expect(body).toMatchObject({
      code: 'too_many_frames',
      detail: 'A strip holds 2,000 frames at most; post the shot in parts.',
    });
    expect((await client.get(`/drafts/${draft.id}`).expect(200)).body.pictures).toHaveLength(MAX_FRAMES);
  });

  test('more files than a batch holds are refused together, with how many may come', async () => {
    const draft = await startDraft(client, production.slug);
    const request = client.request('post', `/drafts/${draft.id}/pictures`);
    for (let index = 0; index < 17; index += 1) request.attach('pictures', good[0]!.bytes, `${index}.png`);
    const { body } = await request.expect(422);
    expect(body.detail).toBe('Send up to 16 pictures at a time.');
  });

  test('400 are fine', async () => {
    const draft = await startDraft(client, production.slug);
    const bytes = await drawTossFrame(1, { frames: 4, width: 64, height: 36 });
    const files = Array.from({ length: 400 }, (_, index) => ({ name: `long.${index + 1}.png`, bytes }));
    const filled = await addPictures(client, draft.id, files);
    expect(filled).toMatchObject({ ready: true, refused: [], firstFrame: 1 });
    const { body: take } = await client.post(`/drafts/${draft.id}/post`, { ...post, firstFrame: 1 }).expect(201);
    expect(take.frames).toBe(400);
    await client.get(`/takes/${take.id}/frames/400/picture`).expect(200);
  });
});
