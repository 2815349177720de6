import { act, screen, within } from '@testing-library/react';
import { describe, expect, test } from 'vitest';
import type { FeedCard } from '../../shared/api/feed.ts';
import { FeedList } from '../../src/features/feed/FeedList.tsx';
import { WaitingOnYou } from '../../src/features/feed/WaitingOnYou.tsx';
import { applyEvent } from '../../src/features/live/applyEvent.ts';
import { feedOptions } from '../../src/lib/queries/feed.ts';
import { applyProgress } from '../../src/lib/queries/take.ts';
import { BRITTA, buildCard, buildFinding, buildSketch, buildTake, buildTakeEvent, OTIS } from '../support/wire.ts';
import { filledClient, SLUG, show } from './show.tsx';

function showFeed(cards: FeedCard[], filter: 'everything' | 'waiting-on-me' | 'mine' | 'with-findings' = 'everything') {
  const client = filledClient();
  client.setQueryData(feedOptions(SLUG, filter).queryKey, {
    pages: [{ cards, nextCursor: null }],
    pageParams: [undefined],
  });
  return show(<FeedList slug={SLUG} filter={filter} stampsOf={() => <p>stamps</p>} />, { client });
}

const faulty = () =>
  buildTake({
    sketch: buildSketch({
      findings: [
        buildFinding({ id: 'one', title: 'Apex sits late' }),
        buildFinding({ id: 'two', title: 'Rise is too even' }),
      ],
    }),
  });

describe('a card of the feed', () => {
  test('says who posted which take of which shot, and what became of it', () => {
    showFeed([buildCard({ take: buildTake({ number: 2, review: 'another-pass' }) })]);
    const card = screen.getByRole('article', { name: /020-0140 Kite over the yard/ });
    expect(within(card).getByText('Britta Sand')).toBeTruthy();
    expect(within(card).getByText(/animator/)).toBeTruthy();
    expect(within(card).getByText('Take 2')).toBeTruthy();
    expect(within(card).getByText('Another pass')).toBeTruthy();
    expect(
      within(card)
        .getByRole('link', { name: /Kite over the yard/ })
        .getAttribute('href'),
    ).toBe('/p/paper-yard/shots/020-0140/takes/2');
  });

  test('lists its findings by number', () => {
    showFeed([buildCard({ take: faulty() })]);
    expect(screen.getAllByRole('listitem').map((item) => item.textContent)).toEqual([
      '1Apex sits late',
      '2Rise is too even',
    ]);
    expect(screen.queryByText('Reads true')).toBeNull();
  });

  test('says that it reads true when nothing is off, and draws no true arc then', () => {
    const { container } = showFeed([buildCard()]);
    expect(screen.getByText('Reads true')).toBeTruthy();
    expect(container.querySelector('.stroke-pencil-blueline')).toBeNull();
  });

  test('draws the true arc and a wash under the drawings a finding speaks of', () => {
    const { container } = showFeed([buildCard({ take: faulty() })]);
    expect(container.querySelectorAll('.stroke-pencil-blueline')).toHaveLength(1);
    expect(container.querySelectorAll('.stroke-pencil-redline')).toHaveLength(2);
  });

  test('counts frames while it is being read', async () => {
    const take = buildTake({ reading: { status: 'reading', message: null }, sketch: null });
    const { client } = showFeed([buildCard({ take })]);
    expect(screen.getByText('Waiting to be read')).toBeTruthy();
    act(() => applyProgress(client, { takeId: take.id, phase: 'finding', done: 7, total: 12 }));
    expect(await screen.findByText('7 of 12 frames')).toBeTruthy();
    expect(screen.getByRole('progressbar', { name: 'Finding the thing' }).getAttribute('value')).toBe('7');
  });

  test('says in a sentence why it could not be read', () => {
    const reading = { status: 'failed' as const, message: 'Frame 1007 cannot be opened. Export it again.' };
    showFeed([buildCard({ take: buildTake({ reading, sketch: null }) })]);
    expect(screen.getByText('Could not be read')).toBeTruthy();
    expect(screen.getByText('Frame 1007 cannot be opened. Export it again.')).toBeTruthy();
  });

  test('does not call a strip true in which nothing flies', () => {
    showFeed([buildCard({ take: buildTake({ sketch: buildSketch({ outcome: 'no-motion', marks: [], arcs: [] }) }) })]);
    expect(screen.getByText('Nothing moves here')).toBeTruthy();
    expect(screen.queryByText('Reads true')).toBeNull();
  });

  test('lets the talk hang from its frame, in the production’s own number', () => {
    const talk = [
      { noteId: crypto.randomUUID(), author: OTIS, frame: 11, excerpt: 'Nobody pushes it from there.' },
      { noteId: crypto.randomUUID(), author: BRITTA, frame: 11, excerpt: 'Moving it up.' },
    ];
    showFeed([buildCard({ talk })]);
    const note = screen.getByRole('link', { name: /Nobody pushes it/ });
    expect(note.textContent).toContain('1011');
    expect(note.textContent).toContain('Britta Sand: Moving it up.');
    expect(note.getAttribute('href')).toBe('/p/paper-yard/shots/020-0140/takes/1?frame=1011');
  });

  test('gives the animator the word before anyone spoke', () => {
    showFeed([buildCard({ take: buildTake({ changed: 'Apex moved to 1014.' }) })]);
    expect(screen.getByText(/Apex moved to 1014\./)).toBeTruthy();
  });
});

describe('the feed, live', () => {
  test('a new take stands at the top without being asked for', async () => {
    const { client } = showFeed([buildCard()]);
    const take = buildTake({ shotNumber: '030-0020', postedAt: '2026-12-01T09:00:00.000Z' });
    act(() => applyEvent(client, SLUG, buildTakeEvent(5, 'take:posted', take)));
    await screen.findByText('030-0020');
    const cards = screen.getAllByRole('article');
    expect(cards).toHaveLength(2);
    expect(within(cards[0]!).getByText('030-0020')).toBeTruthy();
  });

  test('a decision flips the state of its card', async () => {
    const take = buildTake();
    const { client } = showFeed([buildCard({ take })]);
    expect(screen.getByText('Waiting')).toBeTruthy();
    act(() => applyEvent(client, SLUG, buildTakeEvent(5, 'take:decided', { ...take, review: 'cleared' })));
    expect(await screen.findByText('Cleared')).toBeTruthy();
    expect(screen.queryByText('Waiting')).toBeNull();
  });
});

describe('a feed with nothing in it', () => {
  test.each([
    ['everything', 'Nothing has been thrown yet', 'Post a strip', '/p/paper-yard/post'],
    ['waiting-on-me', 'Nothing waits on you', 'See everything', '/p/paper-yard'],
    ['mine', 'You have not posted yet', 'Post a strip', '/p/paper-yard/post'],
    ['with-findings', 'Nothing is off', 'See everything', '/p/paper-yard'],
  ] as const)('(%s) says what it is for and offers the next step', (filter, title, next, href) => {
    showFeed([], filter);
    expect(screen.getByRole('heading', { name: title })).toBeTruthy();
    expect(screen.getByRole('link', { name: next }).getAttribute('href')).toBe(href);
  });
});

test('what waits on someone says why it does', () => {
  const client = filledClient();
  const mine = buildCard({ take: buildTake({ review: 'another-pass', postedBy: BRITTA }) });
  const theirs = buildCard({ take: buildTake({ number: 3, postedBy: OTIS }), poster: OTIS, shotTitle: 'Hoop' });
  client.setQueryData(feedOptions(SLUG, 'waiting-on-me').queryKey, {
    pages: [{ cards: [mine, theirs], nextCursor: null }],
    pageParams: [undefined],
  });
  show(<WaitingOnYou slug={SLUG} me={BRITTA.id} />, { client });
  expect(screen.getByText(/Kite over the yard needs another pass/)).toBeTruthy();
  expect(screen.getByText(/Hoop by Otis Reed is up/)).toBeTruthy();
});
