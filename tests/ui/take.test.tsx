import { act, screen, waitFor, within } from '@testing-library/react';
import { Route, Routes } from 'react-router';
import { beforeEach, describe, expect, test } from 'vitest';
import type { Role } from '../../shared/api/people.ts';
import type { Take } from '../../shared/api/takes.ts';
import type { Thread } from '../../shared/api/threads.ts';
import type { Reading } from '../../shared/reading/document.ts';
import { applyEvent } from '../../src/features/live/applyEvent.ts';
import { productionOptions } from '../../src/lib/queries/production.ts';
import { shotOptions } from '../../src/lib/queries/shots.ts';
import { applyProgress, readingOptions, takeOptions } from '../../src/lib/queries/take.ts';
import { threadsOptions } from '../../src/lib/queries/threads.ts';
import { TakePage } from '../../src/pages/TakePage.tsx';
import { buildFinding, buildMeasure, buildObject, buildReading } from '../support/readings.ts';
import {
  BRITTA,
  buildNote,
  buildProduction,
  buildShot,
  buildTake,
  buildTakeEvent,
  buildThread,
  OTIS,
} from '../support/wire.ts';
import { filledClient, SLUG, screenOf, show } from './show.tsx';

// jsdom lays nothing out: every element is as wide as a desk's middle and as high as a picture.
globalThis.ResizeObserver ??= class {
  observe() {}
  unobserve() {}
  disconnect() {}
};
Object.defineProperty(HTMLElement.prototype, 'clientWidth', { configurable: true, get: () => 1046 });
Object.defineProperty(HTMLElement.prototype, 'clientHeight', { configurable: true, get: () => 352 });
Element.prototype.scrollTo ??= () => {};
Element.prototype.scrollIntoView ??= () => {};

beforeEach(() => screenOf(1440));

interface Given {
  take?: Partial<Take>;
  reading?: Reading | null;
  threads?: Thread[];
  role?: Role;
  search?: string;
}

function showTake({
  take: over = {},
  reading = buildReading(),
  threads = [],
  role = 'animator',
  search = '',
}: Given = {}) {
  const take = buildTake({ frames: 25, width: 980, height: 520, ...over });
  const client = filledClient();
  client.setQueryData(productionOptions(SLUG).queryKey, buildProduction({ myRole: role }));
  client.setQueryData(takeOptions(SLUG, take.shotNumber, take.number).queryKey, take);
  client.setQueryData(
    shotOptions(SLUG, take.shotNumber).queryKey,
    buildShot({ number: take.shotNumber, takes: [take] }),
  );
  client.setQueryData(threadsOptions(take.id).queryKey, {
    threads: threads.map((one) => ({ ...one, takeId: take.id })),
  });
  if (reading) client.setQueryData(readingOptions(take.id).queryKey, reading);
  const at = `/p/${SLUG}/shots/${take.shotNumber}/takes/${take.number}${search}`;
  const shown = show(
    <Routes>
      <Route path="/p/:slug/shots/:shotNumber/takes/:n" element={<TakePage />} />
    </Routes>,
    { client, at },
  );
  return { ...shown, take };
}

const late = () => buildReading({ findings: [buildFinding()] });
const chosenFrame = () => screen.getByLabelText('Chosen frame').textContent;
const layer = (container: HTMLElement, name: string) => container.querySelector(`[data-layer="${name}"]`);

describe('the playhead', () => {
  test('steps the picture, the strip and the address with the arrow keys, in the production’s numbers', async () => {
    const { user, container, address } = showTake({ search: '?frame=1010' });
    await user.keyboard('{ArrowRight}{ArrowRight}');
    expect(chosenFrame()).toBe('1012');
    expect(screen.getByRole('img', { name: 'Frame 1012' }).getAttribute('src')).toMatch(/frames\/12\/picture$/);
    expect((screen.getByRole('slider', { name: 'Frame' }) as HTMLInputElement).value).toBe('1012');
    expect(container.querySelector('[data-layer="lit"] circle')?.getAttribute('cx')).toBe(String(120 + (730 * 9) / 20));
    await waitFor(() => expect(address()).toContain('frame=1012'));
    await user.keyboard('{End}');
    expect(chosenFrame()).toBe('1025');
    await user.keyboard('{ArrowRight}{Home}');
    expect(chosenFrame()).toBe('1001');
  });

  test('starts on the first frame, and on the nearest one when the address names a frame that is not there', () => {
    showTake({ search: '?frame=9000' });
    expect(chosenFrame()).toBe('1025');
  });

  test('lands on the frame of the talk when the address names none', async () => {
    showTake({ threads: [buildThread({ frame: 11 })] });
    await waitFor(() => expect(chosenFrame()).toBe('1011'));
  });

  test('goes where a note says when one of its frames is pressed', async () => {
    const notes = [buildNote({ body: 'It drops like a stone after 1017.' })];
    const { user } = showTake({ threads: [buildThread({ frame: 11, notes })], search: '?frame=1011' });
    await user.click(screen.getByRole('button', { name: '1017' }));
    expect(chosenFrame()).toBe('1017');
  });
});

describe('the layers', () => {
  test('go on and off with keys and in the peg bar, and stand in the address when they are not the usual ones', async () => {
    const { user, container, address } = showTake({ reading: late() });
    for (const name of ['marks', 'arc', 'findings', 'ladders', 'numbers']) expect(layer(container, name)).toBeTruthy();
    await user.keyboard('12');
    expect(layer(container, 'marks')).toBeNull();
    expect(layer(container, 'arc')).toBeNull();
    await waitFor(() => expect(address()).toContain('layers=findings,ladders,numbers'));
    await user.click(screen.getByRole('button', { name: 'Marks' }));
    await user.keyboard('2');
    expect(layer(container, 'marks')).toBeTruthy();
    await waitFor(() => expect(address()).not.toContain('layers'));
  });

  test('open as the address asks', () => {
    const { container } = showTake({ search: '?layers=marks' });
    expect(layer(container, 'marks')).toBeTruthy();
    expect(layer(container, 'arc')).toBeNull();
    expect(screen.getByRole('button', { name: 'True arc' }).getAttribute('aria-pressed')).toBe('false');
  });

  test('differ in shape: filled dots for what was drawn, open ones for where it should be', () => {
    const { container } = showTake();
    const drawn = layer(container, 'marks')!.querySelectorAll('circle');
    const should = layer(container, 'arc')!.querySelectorAll('circle');
    expect([drawn.length, should.length]).toEqual([21, 21]);
    expect(drawn[0]!.classList.contains('fill-pencil-ink')).toBe(true);
    expect(should[0]!.classList.contains('fill-pencil-bluewash')).toBe(true);
  });
});

describe('the reading in the margin', () => {
  test('says that a true flight reads true', () => {
    showTake();
    expect(screen.getByRole('region', { name: 'Flight A1' }).textContent).toContain('Reads true. Up takes 10.0 frames');
    expect(screen.queryByRole('heading', { name: /^Findings/ })).toBeNull();
    expect(screen.getByText('Nothing is off')).toBeTruthy();
  });

  test('tells a measure in words with its verdict, also to those who cannot see the gauge', () => {
    const object = buildObject();
    const flight = { ...object.flights[0]!, measures: [buildMeasure()] };
    showTake({ reading: buildReading({ objects: [{ ...object, flights: [flight] }], findings: [buildFinding()] }) });
    const card = screen.getByRole('region', { name: 'Flight A1' });
    expect(within(card).getAllByText('Apex in time')).toHaveLength(2);
    expect(card.textContent).toContain('64\u202f%, should be 50\u202f%, off');
  });

  test('keeps red for what a finding says', () => {
    const object = buildObject();
    const flight = { ...object.flights[0]!, measures: [buildMeasure()] };
    showTake({ reading: buildReading({ objects: [{ ...object, flights: [flight] }] }) });
    const card = screen.getByRole('region', { name: 'Flight A1' });
    expect(card.textContent).toContain('64\u202f%, should be 50\u202f%, outside the tolerance');
    expect(card.querySelector('.text-red')).toBeNull();
    expect(card.textContent).not.toContain('Reads true');
  });

  test('shows the mend on the picture and as a timing chart when it is asked for', async () => {
    const { user, container } = showTake({ reading: late(), search: '?frame=1003' });
    expect(layer(container, 'mend')).toBeNull();
    await user.click(screen.getByRole('button', { name: 'Show the mend' }));
    expect(layer(container, 'mend')!.textContent).toBe('up 84, right 1 px');
    expect(chosenFrame()).toBe('1011');
    expect(
      screen.getByRole('img', { name: 'Timing chart from 1003 to 1013: drawings at 19 %, 36 %, 51 % of the way' }),
    ).toBeTruthy();
    await user.click(screen.getByRole('button', { name: 'Hide the mend' }));
    expect(layer(container, 'mend')).toBeNull();
  });

  test('goes through the findings with up and down', async () => {
    const second = buildFinding({
      id: 'two',
      title: 'One drawing pops',
      fromFrame: 7,
      toFrame: 7,
      mend: [],
      chart: [],
    });
    const { user } = showTake({ reading: buildReading({ findings: [buildFinding(), second] }) });
    await user.keyboard('{ArrowDown}');
    expect(chosenFrame()).toBe('1011');
    await user.keyboard('{ArrowDown}');
    expect(chosenFrame()).toBe('1007');
    const chosen = screen.getAllByRole('button', { pressed: true }).map((button) => button.textContent);
    expect(chosen).toContain('One drawing pops');
  });

  test('has its statistics one click further down', () => {
    showTake();
    const details = screen.getByText('How this was read').closest('details')!;
    expect(details.open).toBe(false);
    expect(details.textContent).toContain('0.42 px an axis');
    expect(details.textContent).toContain('6.60 ± 0.04 px/f²');
  });

  test.each([
    ['no-motion', 'Nothing moves in this strip'],
    ['too-few-marks', 'Too few drawings to read'],
    ['not-in-flight', 'Nothing flies free here'],
    ['not-judged', 'Measured, not judged'],
  ] as const)('says why nothing was judged (%s) and what to do next', (outcome, title) => {
    const objects = outcome === 'no-motion' ? [] : [buildObject({ outcome, flights: [] })];
    showTake({ reading: buildReading({ objects }) });
    const heading = screen.getByRole('heading', { name: title });
    expect(heading.parentElement!.querySelectorAll('p')).toHaveLength(2);
    expect(screen.queryByText(/Reads true/)).toBeNull();
  });

  test('counts nothing while a reading that is done is only being fetched', () => {
    showTake({ reading: null });
    expect(screen.getByText('The reading is being fetched')).toBeTruthy();
    expect(screen.queryByRole('progressbar')).toBeNull();
  });

  test('counts the frames while it is under way, and keeps picture and notes at work', async () => {
    const { client, take } = showTake({
      take: { reading: { status: 'reading', message: null }, sketch: null },
      reading: null,
    });
    act(() => applyProgress(client, { takeId: take.id, phase: 'finding', done: 9, total: 25 }));
    expect(await screen.findByRole('progressbar', { name: 'Finding the thing' })).toBeTruthy();
    expect(screen.getByText('9 of 25 frames')).toBeTruthy();
    expect(screen.getByRole('img', { name: 'Frame 1001' })).toBeTruthy();
    expect((screen.getByRole('button', { name: 'Marks' }) as HTMLButtonElement).disabled).toBe(true);
  });

  test('says why it failed, and offers to read again', () => {
    const message = 'Frame 1007 cannot be opened. Export it again.';
    showTake({ take: { reading: { status: 'failed', message }, sketch: null }, reading: null });
    expect(screen.getByRole('alert').textContent).toContain(message);
    expect(screen.getByRole('button', { name: 'Read again' })).toBeTruthy();
  });
});

describe('the score', () => {
  test('says which bars leave the blue line', () => {
    const object = buildObject();
    const marks = object.marks.map((mark) => (mark.frame === 10 ? { ...mark, y: mark.y - 60 } : mark));
    const pop = buildFinding({ kind: 'pop', title: 'One drawing pops', fromFrame: 10, toFrame: 10 });
    showTake({ reading: buildReading({ objects: [{ ...object, marks }], findings: [pop] }) });
    expect(
      screen.getByRole('img', { name: /^Up and down: .* the bars of frames 1010 leave the blue line/ }),
    ).toBeTruthy();
    expect(screen.getByRole('img', { name: /^Across: .* no bar leaves the blue line/ })).toBeTruthy();
  });

  test('draws only what is seen of a long strip', () => {
    showTake({ take: { frames: 400 } });
    const thumbs = screen.getByTestId('score').querySelectorAll('img');
    expect(thumbs.length).toBeGreaterThan(20);
    expect(thumbs.length).toBeLessThan(60);
  });

  test('opens a thread from its pin and folds it again', async () => {
    const first = buildThread({ frame: 5, notes: [buildNote({ body: 'Good start.' })] });
    const second = buildThread({ frame: 20, notes: [buildNote({ body: 'Soft landing.' })] });
    const { user } = showTake({ threads: [first, second], search: '?frame=1020' });
    expect(screen.getByText('Soft landing.')).toBeTruthy();
    await user.click(screen.getByRole('button', { name: 'Note on frame 1005: Otis' }));
    expect(screen.getByText('Good start.')).toBeTruthy();
    expect(screen.queryByText('Soft landing.')).toBeNull();
    expect(chosenFrame()).toBe('1005');
    await user.click(screen.getByRole('button', { name: 'Fold this note' }));
    expect(screen.queryByText('Good start.')).toBeNull();
  });
});

describe('writing a note', () => {
  test('gives the focus back to the button it was begun with', async () => {
    const { user } = showTake({ search: '?frame=1007' });
    const button = screen.getAllByRole('button', { name: 'Write a note' })[0]!;
    await user.click(button);
    expect(document.activeElement).toBe(screen.getByRole('textbox', { name: 'Note on frame 1007' }));
    await user.keyboard('{Escape}');
    expect(document.activeElement).toBe(button);
  });

  test('begins with N on the chosen frame, and Escape keeps the words for later', async () => {
    const { user } = showTake({ search: '?frame=1007' });
    await user.keyboard('n');
    await user.type(screen.getByRole('textbox', { name: 'Note on frame 1007' }), 'Half a thought');
    await user.keyboard('{Escape}');
    expect(screen.queryByRole('textbox', { name: 'Note on frame 1007' })).toBeNull();
    await user.keyboard('{ArrowRight}n');
    expect((screen.getByRole('textbox', { name: 'Note on frame 1008' }) as HTMLTextAreaElement).value).toBe(
      'Half a thought',
    );
  });

  test('survives a reload of the page', async () => {
    const first = showTake({ search: '?frame=1007' });
    await first.user.keyboard('n');
    await first.user.type(screen.getByRole('textbox', { name: 'Note on frame 1007' }), 'Half a thought');
    first.unmount();
    const again = showTake({ take: { id: first.take.id }, search: '?frame=1007' });
    await again.user.keyboard('n');
    expect((screen.getByRole('textbox', { name: 'Note on frame 1007' }) as HTMLTextAreaElement).value).toBe(
      'Half a thought',
    );
  });

  test('that does not arrive stays on the screen, says so, and can be sent again or taken back', async () => {
    const { user } = showTake({ search: '?frame=1007' });
    await user.keyboard('n');
    await user.type(screen.getByRole('textbox', { name: 'Note on frame 1007' }), 'The hand lets go.');
    await user.click(screen.getByRole('button', { name: 'Pin it here' }));
    const note = await screen.findByRole('article', { name: 'Your note, not sent' });
    expect(note.textContent).toContain('The hand lets go.');
    expect(within(note).getByRole('button', { name: 'Send again' })).toBeTruthy();
    expect(screen.getByRole('button', { name: 'Note on frame 1007: You, not sent' })).toBeTruthy();
    await user.click(within(note).getByRole('button', { name: 'Back to the box' }));
    expect((screen.getByRole('textbox', { name: 'Note on frame 1007' }) as HTMLTextAreaElement).value).toBe(
      'The hand lets go.',
    );
    expect(screen.queryByRole('article', { name: /^Your note/ })).toBeNull();
  });
});

describe('deciding', () => {
  const theirs = { postedBy: OTIS };

  test('is offered to a mentor, and another pass asks for a remark', async () => {
    const { user } = showTake({ take: theirs, role: 'mentor' });
    expect(screen.getAllByRole('button', { name: 'Clear this shot' })).toHaveLength(1);
    await user.click(screen.getAllByRole('button', { name: 'Another pass…' })[0]!);
    await user.click(screen.getByRole('button', { name: 'Ask for another pass' }));
    expect(screen.getByRole('alert').textContent).toContain('Say in a sentence why');
  });

  test('is not offered on a take that has a later one', async () => {
    const { client, take } = showTake({ take: theirs, role: 'mentor' });
    act(() => {
      client.setQueryData(
        shotOptions(SLUG, take.shotNumber).queryKey,
        buildShot({
          number: take.shotNumber,
          revision: 9,
          takes: [take, buildTake({ number: take.number + 1, revision: 9 })],
        }),
      );
    });
    expect(await screen.findByRole('link', { name: `Take ${take.number + 1} is newer` })).toBeTruthy();
    expect(screen.queryByRole('button', { name: /Clear|Another pass|Waive/ })).toBeNull();
  });

  test('is not offered to an animator, nor to a mentor for their own take, who is told why', () => {
    const animator = showTake({ take: theirs });
    expect(screen.queryByRole('button', { name: /Clear/ })).toBeNull();
    animator.unmount();
    showTake({ role: 'mentor' });
    expect(screen.queryByRole('button', { name: /Clear/ })).toBeNull();
    expect(screen.getByText('Your own take: someone else clears it.')).toBeTruthy();
  });

  test('is told in a sentence, with the remark, as soon as it happens', async () => {
    const { client, take } = showTake();
    const decision = {
      state: 'another-pass' as const,
      remark: 'Bring the top back.',
      by: OTIS,
      decidedAt: take.postedAt,
    };
    act(() =>
      applyEvent(client, SLUG, buildTakeEvent(9, 'take:decided', { ...take, review: 'another-pass', decision })),
    );
    expect(await screen.findByText('Bring the top back.')).toBeTruthy();
    expect(screen.getByText('asked for another pass', { exact: false })).toBeTruthy();
    expect(screen.getAllByText('Another pass').length).toBeGreaterThan(0);
  });
});

describe('live', () => {
  const from = (seq: number) => ({ seq, actor: OTIS, at: '2026-12-01T10:00:00.000Z' });

  test('a note of someone else appears as a pin, and its answer in the open thread', async () => {
    const thread = buildThread({ frame: 4 });
    const { client, take } = showTake({ threads: [thread], search: '?frame=1004' });
    const pinned = buildThread({ takeId: take.id, frame: 9 });
    act(() =>
      applyEvent(client, SLUG, { ...from(5), kind: 'thread:pinned', payload: { thread: pinned, noteCount: 2 } }),
    );
    expect(await screen.findByRole('button', { name: 'Note on frame 1009: Otis' })).toBeTruthy();
    const note = buildNote({ threadId: thread.id, author: BRITTA, body: 'Moving it tonight.' });
    act(() =>
      applyEvent(client, SLUG, {
        ...from(6),
        kind: 'note:added',
        payload: { takeId: take.id, frame: 4, note, noteCount: 3 },
      }),
    );
    expect(await screen.findByText('Moving it tonight.')).toBeTruthy();
    expect(screen.getByRole('button', { name: 'Note on frame 1004: Otis +1' })).toBeTruthy();
  });

  test('a stamp shows the name of who stamped', async () => {
    const thread = buildThread({ frame: 4 });
    const { client, take } = showTake({ threads: [thread], search: '?frame=1004' });
    const board = { revision: 8, stamps: [{ kind: 'good-weight' as const, people: [OTIS] }] };
    const noteId = thread.notes[0]!.id;
    act(() =>
      applyEvent(client, SLUG, { ...from(8), kind: 'stamps:changed', payload: { takeId: take.id, noteId, board } }),
    );
    expect(await screen.findByRole('button', { name: 'Good weight: Otis Reed' })).toBeTruthy();
  });

  test('the next take of the shot is offered, nobody is moved', async () => {
    const { client, take } = showTake();
    const next = buildTake({ shotNumber: take.shotNumber, number: 2 });
    act(() => applyEvent(client, SLUG, buildTakeEvent(5, 'take:posted', next)));
    expect((await screen.findByRole('link', { name: 'Take 2 is newer' })).getAttribute('href')).toMatch(/takes\/2$/);
    expect(screen.getByRole('heading', { name: 'Kite over the yard' })).toBeTruthy();
  });
});

test('a phone has deciding under the thumb', () => {
  screenOf(390);
  showTake({ take: { postedBy: OTIS }, role: 'mentor' });
  expect(screen.getByRole('button', { name: 'Clear' })).toBeTruthy();
  expect(screen.getByRole('button', { name: 'More for this take' })).toBeTruthy();
});
