import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Thread } from '../../shared/api/threads.ts';
import type { User } from '../../server/entities/User.ts';
import { type Client, signIn } from '../support/client.ts';
import { buildMember, buildThread } from '../support/factories.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

let server: TestServer;
let takeId: string;
let thread: Thread;
let animator: { user: User; client: Client };
let mentor: { user: User; client: Client };
let slug: string;

beforeAll(async () => {
  server = await createTestServer();
  const built = await buildThread(server.deps, { frame: 2, body: 'First word.' });
  ({ takeId, thread } = built);
  slug = built.production.slug;
  animator = { user: built.user, client: await signIn(server, built.user) };
  const { user } = await buildMember(server.deps, { production: built.production, role: 'mentor' });
  mentor = { user, client: await signIn(server, user) };
});
afterAll(() => server.remove());

describe('threads', () => {
  test('stand in frame order, each with its notes as they were written', async () => {
    await mentor.client.post(`/takes/${takeId}/threads`, { frame: 1, body: 'Earlier frame.' }).expect(201);
    const reply = await mentor.client.post(`/threads/${thread.id}/notes`, { body: 'A second word.' }).expect(201);
    expect(reply.body).toMatchObject({ threadId: thread.id, author: { id: mentor.user.id, role: 'mentor' } });
    const { body } = await animator.client.get(`/takes/${takeId}/threads`).expect(200);
    expect(body.threads.map(({ frame, notes }: Thread) => [frame, notes.map((note) => note.body)])).toEqual([
      [1, ['Earlier frame.']],
      [2, ['First word.', 'A second word.']],
    ]);
  });

  test('make the take and its card say how many notes there are and what was said last', async () => {
    const { body } = await animator.client.get(`/productions/${slug}/feed`).expect(200);
    expect(body.cards[0].take.noteCount).toBe(3);
    expect(
      body.cards[0].talk.map(({ excerpt, frame }: { excerpt: string; frame: number }) => [frame, excerpt]),
    ).toEqual([
      [2, 'First word.'],
      [2, 'A second word.'],
    ]);
  });

  test.each([
    ['nothing', ''],
    ['only spaces', ' \n\t '],
    ['only what nobody sees', '\u200B\u2060\u0000'],
  ])('take no note that shows %s', async (_, body) => {
    const answer = await mentor.client.post(`/takes/${takeId}/threads`, { frame: 1, body }).expect(422);
    expect(answer.body).toMatchObject({ detail: 'Write something first.', fields: [{ path: 'body' }] });
  });

  test('keep what was written, pictograms and all', async () => {
    const words = 'Über die Ecke 🪁👩‍👩‍👧 <b>not bold</b> & "so on"';
    const { body } = await animator.client.post(`/takes/${takeId}/threads`, { frame: 3, body: words }).expect(201);
    expect(body.notes[0].body).toBe(words);
  });

  test.each([
    ['nothing', { frame: 1, body: '   ' }],
    ['too much', { frame: 1, body: 'a'.repeat(4001) }],
    ['a frame before the first', { frame: 0, body: 'a' }],
    ['a frame after the last', { frame: 4, body: 'a' }],
    ['half a frame', { frame: 1.5, body: 'a' }],
  ])('refuse %s', async (_, given) => {
    const { body } = await animator.client.post(`/takes/${takeId}/threads`, given).expect(422);
    expect(body.code).toBe('invalid_request');
    expect(body.fields).toHaveLength(1);
  });
});

describe('stamps', () => {
  test('on a note show who stamped, in the order kinds were first used', async () => {
    const at = `/notes/${thread.notes[0]!.id}/stamps`;
    await mentor.client.put(`${at}/lovely`).expect(200);
    await animator.client.put(`${at}/agree`).expect(200);
    const { body } = await animator.client.put(`${at}/lovely`).expect(200);
    expect(
      body.stamps.map(({ kind, people }: { kind: string; people: { id: string }[] }) => [
        kind,
        people.map(({ id }) => id),
      ]),
    ).toEqual([
      ['lovely', [mentor.user.id, animator.user.id]],
      ['agree', [animator.user.id]],
    ]);
  });

  test('come off again, only one’s own', async () => {
    const at = `/notes/${thread.notes[0]!.id}/stamps/lovely`;
    const { body } = await animator.client.delete(at).expect(200);
    expect(body.stamps[0]).toMatchObject({ kind: 'lovely', people: [{ id: mentor.user.id }] });
    expect((await animator.client.delete(at).expect(200)).body).toEqual(body);
  });

  test('on a take are part of the take', async () => {
    const { body: board } = await mentor.client.put(`/takes/${takeId}/stamps/good-weight`).expect(200);
    const { body: feed } = await animator.client.get(`/productions/${slug}/feed`).expect(200);
    expect(feed.cards[0].take.stamps).toEqual(board);
    expect(feed.cards[0].take.revision).toBe(board.revision);
  });

  test('are the five there are', async () => {
    await mentor.client.put(`/takes/${takeId}/stamps/applause`).expect(404);
  });
});
