import { QueryClient } from '@tanstack/react-query';
import { beforeEach, describe, expect, test } from 'vitest';
import type { ProductionEvent } from '../../../shared/api/events.ts';
import { applyEvent } from '../../../src/features/live/applyEvent.ts';
import { feedOptions } from '../../../src/lib/queries/feed.ts';
import { sessionOptions } from '../../../src/lib/queries/session.ts';
import { sheetOptions, shotOptions } from '../../../src/lib/queries/shots.ts';
import { applyTake, takeOptions } from '../../../src/lib/queries/take.ts';
import { threadsOptions } from '../../../src/lib/queries/threads.ts';
import {
  BRITTA,
  buildCard,
  buildFinding,
  buildNote,
  buildSession,
  buildShot,
  buildSketch,
  buildTake,
  buildTakeEvent,
  buildThread,
  OTIS,
} from '../../support/wire.ts';

const SLUG = 'paper-yard';
let client: QueryClient;

beforeEach(() => {
  client = new QueryClient();
  client.setQueryData(sessionOptions().queryKey, buildSession());
});

const fillFeed = (cards = [buildCard()], filter: 'everything' | 'mine' | 'with-findings' = 'everything') =>
  client.setQueryData(feedOptions(SLUG, filter).queryKey, {
    pages: [{ cards, nextCursor: null }],
    pageParams: [undefined],
  });
const feed = (filter: 'everything' | 'mine' | 'with-findings' = 'everything') =>
  client.getQueryData(feedOptions(SLUG, filter).queryKey)?.pages.flatMap((page) => page.cards) ?? [];
const show = (event: ProductionEvent) => applyEvent(client, SLUG, event);

describe('a take that is posted', () => {
  test('joins the feed at the top and the sheet as a new row', () => {
    fillFeed([buildCard({ take: buildTake({ postedAt: '2026-11-29T09:00:00.000Z' }) })]);
    client.setQueryData(sheetOptions(SLUG).queryKey, { shots: [] });
    const take = buildTake({ shotNumber: '030-0010' });
    show(buildTakeEvent(7, 'take:posted', take));
    expect(feed()[0]?.take.id).toBe(take.id);
    expect(feed()).toHaveLength(2);
    const sheet = client.getQueryData(sheetOptions(SLUG).queryKey);
    expect(sheet?.shots.map((shot) => [shot.number, shot.takes.length])).toEqual([['030-0010', 1]]);
  });

  test('stands there once when the event comes twice', () => {
    fillFeed([]);
    const event = buildTakeEvent(7, 'take:posted', buildTake());
    show(event);
    show(event);
    expect(feed()).toHaveLength(1);
  });

  test('joins only the lists it belongs to', () => {
    fillFeed([], 'mine');
    fillFeed([], 'with-findings');
    show(buildTakeEvent(7, 'take:posted', buildTake({ postedBy: OTIS, sketch: null })));
    expect(feed('mine')).toHaveLength(0);
    expect(feed('with-findings')).toHaveLength(0);
    const faulty = buildTake({ postedBy: BRITTA, sketch: buildSketch({ findings: [buildFinding()] }) });
    show(buildTakeEvent(8, 'take:read', faulty));
    expect(feed('mine')).toHaveLength(1);
    expect(feed('with-findings')).toHaveLength(1);
  });

  test('does not jump into a part of the feed that is not loaded yet', () => {
    client.setQueryData(feedOptions(SLUG, 'everything').queryKey, {
      pages: [{ cards: [buildCard({ take: buildTake({ postedAt: '2026-11-30T09:00:00.000Z' }) })], nextCursor: '4' }],
      pageParams: [undefined],
    });
    show(buildTakeEvent(7, 'take:decided', buildTake({ postedAt: '2026-11-20T09:00:00.000Z' })));
    expect(feed()).toHaveLength(1);
  });
});

describe('a take that changes', () => {
  test('changes on its page, in the sheet, in its shot and in the feed', () => {
    const take = buildTake();
    fillFeed([buildCard({ take })]);
    client.setQueryData(takeOptions(SLUG, take.shotNumber, 1).queryKey, take);
    client.setQueryData(sheetOptions(SLUG).queryKey, { shots: [buildShot({ takes: [take] })] });
    client.setQueryData(shotOptions(SLUG, take.shotNumber).queryKey, buildShot({ takes: [take] }));
    show(buildTakeEvent(9, 'take:decided', { ...take, review: 'cleared' }));
    expect(client.getQueryData(takeOptions(SLUG, take.shotNumber, 1).queryKey)?.review).toBe('cleared');
    expect(client.getQueryData(sheetOptions(SLUG).queryKey)?.shots[0]?.takes[0]?.review).toBe('cleared');
    expect(client.getQueryData(shotOptions(SLUG, take.shotNumber).queryKey)?.takes[0]?.review).toBe('cleared');
    expect(feed()[0]?.take.review).toBe('cleared');
  });

  test('is not set back by an event that comes late', () => {
    const take = buildTake();
    fillFeed([buildCard({ take })]);
    show(buildTakeEvent(9, 'take:decided', { ...take, review: 'cleared' }));
    show(buildTakeEvent(8, 'take:read', { ...take, review: 'waiting' }));
    expect(feed()[0]?.take.review).toBe('cleared');
  });

  test('keeps newer stamps when an older state of it arrives with a newer decision', () => {
    const stamps = { revision: 12, stamps: [{ kind: 'lovely' as const, people: [OTIS] }] };
    const take = buildTake({ stamps });
    fillFeed([buildCard({ take })]);
    applyTake(client, SLUG, { ...take, revision: 10, review: 'waived', stamps: { revision: 3, stamps: [] } });
    expect(feed()[0]?.take).toMatchObject({ review: 'waived', stamps });
  });

  test('leaves the shot it was moved away from, and its old address knows the new one', () => {
    const take = buildTake({ shotNumber: '020-0140', number: 2 });
    const from = buildShot({ number: '020-0140', takes: [take] });
    client.setQueryData(takeOptions(SLUG, '020-0140', 2).queryKey, take);
    client.setQueryData(sheetOptions(SLUG).queryKey, { shots: [from, buildShot({ number: '020-0150', takes: [] })] });
    const moved = { ...take, shotNumber: '020-0150', number: 1, revision: 9 };
    const to = buildShot({ number: '020-0150', takes: [moved] });
    show({
      seq: 9,
      actor: OTIS,
      at: '2026-11-30T10:00:00.000Z',
      kind: 'take:moved',
      payload: { card: buildCard({ take: moved }), shot: to, from, fromTakeNumber: 2 },
    });
    const rows = client.getQueryData(sheetOptions(SLUG).queryKey)?.shots ?? [];
    expect(rows.find((shot) => shot.number === '020-0140')?.takes).toEqual([]);
    expect(client.getQueryData(takeOptions(SLUG, '020-0140', 2).queryKey)?.shotNumber).toBe('020-0150');
    expect(client.getQueryData(takeOptions(SLUG, '020-0150', 1).queryKey)?.id).toBe(take.id);
  });
});

describe('talk', () => {
  const pinned = (takeId: string, thread = buildThread({ takeId })): ProductionEvent => ({
    seq: 5,
    actor: OTIS,
    at: '2026-11-30T10:00:00.000Z',
    kind: 'thread:pinned',
    payload: { thread, noteCount: 1 },
  });

  test('hangs from the card, counts on the take and stands on its page, once', () => {
    const take = buildTake();
    fillFeed([buildCard({ take })]);
    client.setQueryData(threadsOptions(take.id).queryKey, { threads: [] });
    const event = pinned(take.id);
    show(event);
    show(event);
    expect(feed()[0]?.talk.map((said) => said.excerpt)).toEqual(['The hand lets go on 1003.']);
    expect(feed()[0]?.take.noteCount).toBe(1);
    expect(client.getQueryData(threadsOptions(take.id).queryKey)?.threads).toHaveLength(1);
  });

  test('is cut on the card as the server cuts it: on one line, between words', () => {
    const take = buildTake();
    fillFeed([buildCard({ take })]);
    const thread = buildThread({ takeId: take.id });
    const [note] = thread.notes;
    show(pinned(take.id, { ...thread, notes: [{ ...note!, body: 'up\nand down '.repeat(30) }] }));
    const [said] = feed()[0]!.talk;
    expect(said!.excerpt).toMatch(/^up and down .*(up|and|down)…$/);
  });

  test('a reply stands under what it answers, in the thread and on the card', () => {
    const take = buildTake();
    const thread = buildThread({ takeId: take.id });
    fillFeed([buildCard({ take })]);
    client.setQueryData(threadsOptions(take.id).queryKey, { threads: [] });
    show(pinned(take.id, thread));
    const note = buildNote({
      threadId: thread.id,
      author: BRITTA,
      body: 'Moving it up.',
      writtenAt: '2026-11-30T11:00:00.000Z',
    });
    show({
      seq: 6,
      actor: BRITTA,
      at: '2026-11-30T11:00:00.000Z',
      kind: 'note:added',
      payload: { takeId: take.id, frame: thread.frame, note, noteCount: 2 },
    });
    const threads = client.getQueryData(threadsOptions(take.id).queryKey)?.threads;
    expect(threads?.[0]?.notes.map((one) => one.body)).toEqual(['The hand lets go on 1003.', 'Moving it up.']);
    expect(feed()[0]?.talk.map((said) => said.excerpt)).toEqual(['The hand lets go on 1003.', 'Moving it up.']);
  });

  test('stamps on a note are replaced by a newer board only', () => {
    const take = buildTake();
    const thread = buildThread({ takeId: take.id });
    const noteId = thread.notes[0]!.id;
    client.setQueryData(threadsOptions(take.id).queryKey, { threads: [thread] });
    const stamped = (seq: number, people: (typeof OTIS)[]): ProductionEvent => ({
      seq,
      actor: OTIS,
      at: '2026-11-30T10:00:00.000Z',
      kind: 'stamps:changed',
      payload: { takeId: take.id, noteId, board: { revision: seq, stamps: [{ kind: 'agree', people }] } },
    });
    show(stamped(8, [OTIS, BRITTA]));
    show(stamped(7, [OTIS]));
    const note = client.getQueryData(threadsOptions(take.id).queryKey)?.threads[0]?.notes[0];
    expect(note?.stamps.stamps[0]?.people).toHaveLength(2);
  });
});

describe('a fetch that was answered before an event', () => {
  test('does not wipe out what the event brought', async () => {
    const take = buildTake();
    client.setQueryData(takeOptions(SLUG, take.shotNumber, 1).queryKey, take);
    show(buildTakeEvent(9, 'take:decided', { ...take, review: 'cleared' }));
    const options = takeOptions(SLUG, take.shotNumber, 1);
    await client.query({ ...options, queryFn: async () => take, staleTime: 0 });
    expect(client.getQueryData(options.queryKey)?.review).toBe('cleared');
  });
});
