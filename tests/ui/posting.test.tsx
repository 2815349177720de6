import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { afterEach, describe, expect, test, vi } from 'vitest';
import type { Draft, Post } from '../../shared/api/drafts.ts';
import type { Grid } from '../../shared/finding/grid.ts';
import { ContactSheet } from '../../src/features/posting/ContactSheet.tsx';
import { GridEditor } from '../../src/features/posting/GridEditor.tsx';
import { PostForm, type PostFormProps } from '../../src/features/posting/PostForm.tsx';
import { PostStrip } from '../../src/features/posting/PostStrip.tsx';
import { RefusedFiles } from '../../src/features/posting/RefusedFiles.tsx';
import { UploadProgress } from '../../src/features/posting/UploadProgress.tsx';
import { ApiProblem } from '../../src/lib/ApiProblem.ts';
import { draftOptions } from '../../src/lib/queries/draft.ts';
import { sheetOptions } from '../../src/lib/queries/shots.ts';
import { buildShot, buildTake } from '../support/wire.ts';
import { filledClient, show, SLUG } from './show.tsx';

afterEach(() => {
  vi.unstubAllGlobals();
});

const draft = (given: Partial<Draft> = {}): Draft => ({
  id: crypto.randomUUID(),
  pictures: [],
  grid: null,
  firstFrame: null,
  missingFrames: [],
  refused: [],
  warnings: [],
  ready: true,
  ...given,
});

function showForm(given: Partial<PostFormProps> = {}) {
  const posts: Post[] = [];
  const props: PostFormProps = {
    slug: SLUG,
    shots: [
      buildShot({ number: '020-0140', title: 'Kite over the yard', takes: [buildTake(), buildTake({ number: 2 })] }),
    ],
    draft: draft(),
    shotNumber: null,
    notYet: null,
    posting: false,
    problem: null,
    onPost: (post) => posts.push(post),
    ...given,
  };
  const shown = show(<PostForm {...props} />);
  return { ...shown, posts, props };
}

describe('the form beside a strip', () => {
  test('knows a shot by its number, says its title and which take this becomes', async () => {
    const { user } = showForm();
    expect(screen.getByLabelText('Title of the new shot')).toBeTruthy();
    await user.type(screen.getByLabelText('Shot number'), '020-0140');
    expect(screen.getByText(/This becomes take 3\./).textContent).toBe('Kite over the yard. This becomes take 3.');
    expect(screen.getByRole('button', { name: 'Post take 3 of 020-0140' })).toBeTruthy();
    expect(screen.queryByLabelText('Title of the new shot')).toBeNull();
  });

  test('posts exact values for a shot that is there', async () => {
    const { user, posts } = showForm({ draft: draft({ firstFrame: 1001 }) });
    await user.type(screen.getByLabelText('Shot number'), '020-0140');
    await user.selectOptions(screen.getByLabelText('Frames a second'), '23.976 (24000/1001)');
    await user.selectOptions(screen.getByLabelText('Drawings'), 'on twos');
    await user.type(screen.getByLabelText('What changed'), 'Apex moved.');
    await user.click(screen.getByRole('button', { name: /^Post take 3/ }));
    expect(posts).toEqual([
      {
        shotNumber: '020-0140',
        shotTitle: undefined,
        fps: { num: 24000, den: 1001 },
        hold: 2,
        firstFrame: 1001,
        changed: 'Apex moved.',
        intended: '',
      },
    ]);
  });

  test('asks for what is missing at its own field, and posts nothing', async () => {
    const { user, posts } = showForm();
    await user.click(screen.getByRole('button', { name: 'Post the strip' }));
    expect(screen.getByLabelText('Shot number').getAttribute('aria-invalid')).toBe('true');
    expect(screen.getByText('Which shot is it? Write its number, such as 020-0140.')).toBeTruthy();
    expect(screen.getByText('This shot is new. Give it a title.')).toBeTruthy();
    expect(posts).toEqual([]);
  });

  test('takes another rate as it is written', async () => {
    const { user, posts } = showForm();
    await user.type(screen.getByLabelText('Shot number'), '030-0010');
    await user.type(screen.getByLabelText('Title of the new shot'), 'Hoop');
    await user.selectOptions(screen.getByLabelText('Frames a second'), 'another rate');
    await user.type(screen.getByLabelText('The rate'), 'fast');
    await user.click(screen.getByRole('button', { name: 'Post the strip' }));
    expect(screen.getByText(/Write frames a second between 1 and 240/)).toBeTruthy();
    await user.clear(screen.getByLabelText('The rate'));
    await user.type(screen.getByLabelText('The rate'), '12.5');
    await user.click(screen.getByRole('button', { name: 'Post the strip' }));
    expect(posts[0]?.fps).toEqual({ num: 25, den: 2 });
  });

  test('fills in the first frame from the names, and 1 where they carry none', () => {
    showForm({ draft: draft({ firstFrame: 1001 }) });
    expect((screen.getByLabelText('First frame') as HTMLInputElement).value).toBe('1001');
    expect(screen.getByText('from the file names')).toBeTruthy();
  });

  test('starts at 1 where the names carry no number', () => {
    showForm();
    expect((screen.getByLabelText('First frame') as HTMLInputElement).value).toBe('1');
  });

  test('holds the button and says why while the strip cannot be posted', () => {
    showForm({ notYet: 'The frames are still on their way.' });
    const button = screen.getByRole('button', { name: 'Post the strip' }) as HTMLButtonElement;
    expect(button.disabled).toBe(true);
    expect(screen.getByText('The frames are still on their way.')).toBeTruthy();
  });

  test('puts what the server says at the field it is about', () => {
    const problem = new ApiProblem({
      code: 'invalid_request',
      status: 422,
      detail: 'Something in the post is not right.',
      fields: [{ path: 'shotTitle', message: 'Give the shot a title.' }],
    });
    showForm({ problem });
    expect(screen.getByText('Something in the post is not right.')).toBeTruthy();
    expect(screen.getByText('Give the shot a title.')).toBeTruthy();
  });

  test('posts once, however fast someone clicks', async () => {
    const client = filledClient();
    const ready = draft({ firstFrame: 1001 });
    const picture = { width: 640, height: 360 };
    const pictures = [1001, 1002].map((number) => ({ ...picture, name: `a.${number}.png`, number }));
    client.setQueryData(draftOptions(ready.id).queryKey, { ...ready, pictures });
    client.setQueryData(sheetOptions(SLUG).queryKey, { shots: [] });
    const at = `/p/${SLUG}/post?draft=${ready.id}`;
    const { user } = show(<PostStrip slug={SLUG} />, { client, at });
    await user.type(screen.getByLabelText('Shot number'), '020-0150');
    await user.type(screen.getByLabelText('Title of the new shot'), 'Lantern');
    // A server that takes its time, and then cannot be reached.
    let sent = 0;
    let lose = () => {};
    const wire = new Promise<Response>((_, reject) => (lose = () => reject(new TypeError('the line is cut'))));
    vi.stubGlobal('fetch', () => {
      sent += 1;
      return wire;
    });
    const form = screen.getByRole('button', { name: 'Post the strip' }).closest('form')!;
    fireEvent.submit(form);
    fireEvent.submit(form);
    await screen.findByRole('button', { name: 'Posting…' });
    expect(sent).toBe(1);
    lose();
    await screen.findByRole('alert');
    await user.click(screen.getByRole('button', { name: 'Post the strip' }));
    await waitFor(() => expect(sent).toBe(2));
  });

  test('starts anew where the address names a post that is gone', async () => {
    const asked: string[] = [];
    vi.stubGlobal('fetch', async (address: string, { method }: RequestInit) => {
      asked.push(`${method} ${address}`);
      const code = 'not_found';
      const problem = { type: 'about:blank', title: 'Not found', status: 404, detail: 'There is no such post.', code };
      return Response.json(problem, { status: 404 });
    });
    const client = filledClient();
    client.setQueryData(sheetOptions(SLUG).queryKey, { shots: [] });
    const { user, container } = show(<PostStrip slug={SLUG} />, { client, at: `/p/${SLUG}/post?draft=old` });
    await screen.findByText('There is no such post. Frames you choose here start a new one.');
    const frames = [1, 2].map((number) => new File(['x'], `a.${number}.png`, { type: 'image/png' }));
    await user.upload(container.querySelector<HTMLInputElement>('input[type=file]')!, frames);
    await waitFor(() => expect(asked).toHaveLength(2));
    expect(asked).toEqual(['GET /api/drafts/old', `POST /api/productions/${SLUG}/drafts`]);
  });

  test('leads to the take when the answer to an earlier try was lost', async () => {
    const problem = new ApiProblem({ code: 'draft_closed', status: 409, detail: 'This strip is posted already.' });
    const { user } = showForm({ problem });
    await user.type(screen.getByLabelText('Shot number'), '020-0140');
    expect(screen.getByRole('link', { name: 'See it' }).getAttribute('href')).toMatch(/takes\/2$/);
  });

  test('warns where footage may be posted', () => {
    showForm();
    expect(
      screen.getByText(/Throws, falls and jumps are filmed only with those trained for it, under local rules/),
    ).toBeTruthy();
  });

  test('still holds what was written when the page was left and opened again', async () => {
    const { user, unmount, props } = showForm();
    await user.type(screen.getByLabelText('What is intended'), 'It hangs on a wire.');
    unmount();
    show(<PostForm {...props} />);
    expect((screen.getByLabelText('What is intended') as HTMLTextAreaElement).value).toBe('It hangs on a wire.');
  });
});

describe('the cut of a strip picture', () => {
  const picture = { name: 'kite.png', width: 800, height: 100, number: null };
  const found: Grid = {
    columns: 8,
    rows: 1,
    cellWidth: 100,
    cellHeight: 100,
    gutterX: 0,
    gutterY: 0,
    marginX: 0,
    marginY: 0,
    count: 8,
  };
  function showGrid(grid: Grid | null) {
    const sent: (Grid | null)[] = [];
    const wrong: boolean[] = [];
    const shown = show(
      <GridEditor
        picture={picture}
        address="blob:kite"
        grid={grid}
        onGrid={(next) => sent.push(next)}
        onWrong={(now) => wrong.push(now)}
        onRemove={() => {}}
        problem={null}
      />,
    );
    return { ...shown, sent, wrong };
  }

  test('is drawn over the picture as it was found', () => {
    showGrid(found);
    expect(screen.getByRole('heading', { name: 'A strip of 8 frames' })).toBeTruthy();
    expect(screen.getByRole('img', { name: 'The cut: 8 frames, 8 across and 1 down' })).toBeTruthy();
    expect(
      within(screen.getByRole('list', { name: 'The frames as they are cut' })).getAllByRole('listitem'),
    ).toHaveLength(8);
  });

  test('follows a correction at once and sends it', async () => {
    const { user, sent } = showGrid(found);
    await user.clear(screen.getByLabelText('Columns'));
    await user.type(screen.getByLabelText('Columns'), '4');
    expect(screen.getByRole('img', { name: 'The cut: 4 frames, 4 across and 1 down' })).toBeTruthy();
    expect(sent.at(-1)).toMatchObject({ columns: 4, cellWidth: 200, count: 4 });
  });

  test('does not lose the count while a number is written digit by digit', async () => {
    const { user, sent } = showGrid({ ...found, count: 7 });
    await user.clear(screen.getByLabelText('Columns'));
    await user.type(screen.getByLabelText('Columns'), '10');
    expect(sent.at(-1)).toMatchObject({ columns: 10, cellWidth: 80, count: 7 });
  });

  test('that cannot be made is said, not sent, and holds the post', async () => {
    const { user, sent, wrong } = showGrid(found);
    await user.clear(screen.getByLabelText('Gutter across, px'));
    await user.type(screen.getByLabelText('Gutter across, px'), '400');
    expect(screen.getByRole('alert').textContent).toContain('No room is left for the frames');
    expect(wrong.at(-1)).toBe(true);
    expect(sent.some((grid) => grid?.gutterX === 400)).toBe(false);
  });

  test('can be undone and begun anew', async () => {
    const { user, sent } = showGrid(found);
    await user.click(screen.getByRole('button', { name: 'This is one frame, not a strip' }));
    expect(sent).toEqual([null]);
  });

  test('is offered for one picture', async () => {
    const { user, sent } = showGrid(null);
    await user.click(screen.getByRole('button', { name: 'Cut it into frames' }));
    expect(sent[0]).toMatchObject({ columns: 8, rows: 1, count: 8 });
  });
});

describe('a post on its way', () => {
  const upload = { sent: 24, total: 48, problem: null, refused: [] };

  test('counts frames and can be stopped', async () => {
    let cancelled = false;
    const { user } = show(
      <UploadProgress
        upload={{ ...upload, status: 'sending' }}
        onCancel={() => (cancelled = true)}
        onRetry={() => {}}
      />,
    );
    expect(screen.getByText('24 of 48 frames')).toBeTruthy();
    await user.click(screen.getByRole('button', { name: 'Cancel' }));
    expect(cancelled).toBe(true);
  });

  test('that stopped says what arrived and sends the rest', async () => {
    let again = false;
    const { user } = show(
      <UploadProgress
        upload={{ ...upload, status: 'failed', problem: 'The server did not answer.' }}
        onCancel={() => {}}
        onRetry={() => (again = true)}
      />,
    );
    expect(screen.getByRole('alert').textContent).toContain('24 of 48 frames arrived. The server did not answer.');
    await user.click(screen.getByRole('button', { name: 'Send the rest' }));
    expect(again).toBe(true);
  });

  test('names each file that was left out with its reason', () => {
    show(<RefusedFiles files={[{ name: 'notes.png', reason: 'It is a text file.' }]} />);
    expect(screen.getByRole('heading', { name: 'One file was left out' })).toBeTruthy();
    expect(screen.getByText('notes.png')).toBeTruthy();
    expect(screen.getByText('It is a text file.')).toBeTruthy();
  });

  test('leaves the gap open where a frame is missing', async () => {
    const removed: string[] = [];
    const picture = (number: number) => ({ name: `kite_${number}.png`, width: 640, height: 360, number });
    const { user } = show(
      <ContactSheet
        pictures={[picture(1001), picture(1004)]}
        addresses={new Map()}
        missing={[1002, 1003]}
        onRemove={(name) => removed.push(name)}
      />,
    );
    expect(screen.getByRole('heading', { name: /^2 frames/ })).toBeTruthy();
    expect(screen.getByText('1002–1003')).toBeTruthy();
    await user.click(screen.getByRole('button', { name: 'Take out kite_1004.png' }));
    expect(removed).toEqual(['kite_1004.png']);
  });
});
