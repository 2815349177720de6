import { act, screen, within } from '@testing-library/react';
import { beforeEach, describe, expect, test } from 'vitest';
import type { ShotWithTakes } from '../../shared/api/shots.ts';
import { PeopleList } from '../../src/features/people/PeopleList.tsx';
import { applyEvent } from '../../src/features/live/applyEvent.ts';
import { ShotSheet } from '../../src/features/sheet/ShotSheet.tsx';
import { hereOptions } from '../../src/lib/queries/production.ts';
import { sheetOptions } from '../../src/lib/queries/shots.ts';
import { BRITTA, buildFinding, buildShot, buildSketch, buildTake, buildTakeEvent, OTIS } from '../support/wire.ts';
import { filledClient, screenOf, SLUG, show } from './show.tsx';

const off = (count: number) =>
  buildSketch({ findings: Array.from({ length: count }, (_, index) => buildFinding({ id: `finding ${index}` })) });

const shots = () => [
  buildShot({
    number: '010-0020',
    title: 'Kite over the yard',
    takes: [
      buildTake({
        shotNumber: '010-0020',
        review: 'another-pass',
        decision: { state: 'another-pass', remark: 'Bend the rise.', by: OTIS, decidedAt: '2026-11-28T09:00:00.000Z' },
        sketch: off(2),
      }),
      buildTake({ shotNumber: '010-0020', number: 2, review: 'cleared' }),
    ],
    mentor: OTIS,
  }),
  buildShot({
    number: '020-0010',
    title: 'Hoop down the hill',
    takes: [buildTake({ shotNumber: '020-0010', sketch: off(3) })],
  }),
  buildShot({
    number: '020-0040',
    title: 'Cap that stays up',
    takes: [buildTake({ shotNumber: '020-0040', review: 'waived', sketch: off(1) })],
  }),
];

function showSheet(rows: ShotWithTakes[]) {
  const client = filledClient();
  client.setQueryData(sheetOptions(SLUG).queryKey, { shots: rows });
  return show(<ShotSheet slug={SLUG} />, { client });
}

describe('the shot sheet on a desk', () => {
  beforeEach(() => screenOf(1440));

  test('says in a sentence first how many are through', () => {
    showSheet(shots());
    expect(screen.getByText(/2 of 3 are through\. One waits for a look\./)).toBeTruthy();
    expect(screen.queryByText(/What comes back most/)).toBeNull();
  });

  test('says what comes back most once it did so twice', () => {
    const [kite, ...others] = shots();
    const first = kite!.takes[0]!;
    const again = (count: number) => {
      const takes = Array.from({ length: count }, (_, index) => ({
        ...first,
        id: crypto.randomUUID(),
        number: index + 1,
      }));
      return [{ ...kite!, takes }, ...others];
    };
    const { unmount } = showSheet(again(2));
    expect(screen.getByText(/What comes back most: “Rise is too even”, twice\./)).toBeTruthy();
    unmount();
    showSheet(again(3));
    expect(screen.getByText(/What comes back most: “Rise is too even”, 3 times\./)).toBeTruthy();
  });

  test('groups shots by sequence with a count of their own', () => {
    showSheet(shots());
    expect(screen.getByRole('columnheader', { name: /Sequence 010 1 of 1 through/ })).toBeTruthy();
    expect(screen.getByRole('columnheader', { name: /Sequence 020 1 of 2 through/ })).toBeTruthy();
  });

  test('draws every take as an arc that leads to it, with what became of it', () => {
    showSheet(shots());
    const row = screen.getByRole('row', { name: /Kite over the yard/ });
    const trail = within(row).getAllByRole('link', { name: /^Take/ });
    expect(trail.map((link) => link.getAttribute('aria-label'))).toEqual([
      'Take 1: another pass, 2 findings',
      'Take 2: cleared, no findings',
    ]);
    expect(trail[0]?.getAttribute('href')).toBe('/p/paper-yard/shots/010-0020/takes/1');
    expect(within(row).getByText('Otis Reed')).toBeTruthy();
  });

  test('shows open findings of the latest take only where something is to do', () => {
    showSheet(shots());
    const cell = (name: RegExp) => within(screen.getByRole('row', { name })).getAllByRole('cell')[2]?.textContent;
    expect(cell(/Kite over the yard/)).toBe('none');
    expect(cell(/Hoop down the hill/)).toBe('3');
    expect(cell(/Cap that stays up/)).toBe('1 waived');
  });

  test('follows a decision while it is open', async () => {
    const rows = shots();
    const { client } = showSheet(rows);
    const take = { ...rows[1]!.takes[0]!, review: 'cleared' as const };
    const event = buildTakeEvent(9, 'take:decided', take);
    if (event.kind !== 'take:decided') throw new Error('The builder made another event.');
    event.payload.shot = { ...event.payload.shot, id: rows[1]!.id, title: rows[1]!.title, state: 'cleared' };
    act(() => applyEvent(client, SLUG, event));
    expect(await screen.findByText(/All 3 are through\./)).toBeTruthy();
    expect(within(screen.getByRole('row', { name: /Hoop down the hill/ })).getByText('Cleared')).toBeTruthy();
  });

  test('says what it is for while it is blank', () => {
    showSheet([]);
    expect(screen.getByRole('heading', { name: 'The sheet is blank' })).toBeTruthy();
    expect(screen.getByRole('link', { name: 'Post a strip' })).toBeTruthy();
  });
});

test('on a phone the sheet is a list that says the same', () => {
  screenOf(390);
  showSheet(shots());
  expect(screen.queryByRole('table')).toBeNull();
  const item = screen.getByText('Hoop down the hill').closest('li')!;
  expect(item.textContent).toContain('Open findings3');
  expect(item.textContent).toContain('AnimatorBritta Sand');
  expect(within(item).getByText('Waiting', { selector: 'span' })).toBeTruthy();
});

test('people stand under what they do, with who is here now', () => {
  const client = filledClient();
  client.setQueryData(hereOptions(SLUG).queryKey, [OTIS]);
  show(<PeopleList slug={SLUG} me={BRITTA.id} />, { client });
  const mentors = screen.getByRole('region', { name: 'Mentor' });
  expect(within(mentors).getByText(/asks for another pass/)).toBeTruthy();
  expect(within(mentors).getByText('here now')).toBeTruthy();
  const animators = screen.getByRole('region', { name: 'Animator' });
  expect(within(animators).getByText('(you)')).toBeTruthy();
  expect(within(animators).queryByText('here now')).toBeNull();
});
