import { readFile } from 'node:fs/promises';
import path from 'node:path';
import type { Locator } from 'playwright-core';
import { afterAll, afterEach, beforeAll, beforeEach, expect, it } from 'vitest';
import type { User } from '../../server/entities/User.ts';
import { MAX_FRAMES } from '../../shared/api/drafts.ts';
import { drawToss } from '../support/pictures.ts';
import { brokenFiles, goodFrames, manyFrames, stripPicture } from './badFiles.ts';
import { chooseFrames, type Desk, openStage, postShot, see, seeGone, type Stage } from './stage.ts';

let stage: Stage;
let slug: string;
let animator: User;
let desk: Desk;
let bad: Awaited<ReturnType<typeof brokenFiles>>;
let good: string[];

beforeAll(async () => {
  stage = await openStage();
  const { user, production } = await stage.hire('Ada Moss', 'animator');
  animator = user;
  slug = production.slug;
  good = await goodFrames(path.join(stage.folder, 'good'), 12);
  bad = await brokenFiles(path.join(stage.folder, 'bad'));
});

beforeEach(async () => {
  desk = await stage.enter(animator.email, `/p/${slug}/post`);
});

afterEach(async () => {
  const { problems } = desk;
  await desk.context.close();
  expect(problems).toEqual([]);
});

afterAll(async () => {
  await stage?.remove();
});

/** The lines of the files that were left out, each by its name. */
const refusal = (name: string): Locator => desk.page.getByRole('listitem').filter({ hasText: name });

it('names every file that cannot be used with its reason, and keeps the rest', async () => {
  await chooseFrames(desk.page, [...good, ...Object.values(bad)]);
  await see(refusal('toss.1101.png').getByText(/text file, not a picture/));
  await see(refusal('toss.1102.png').getByText(/empty/));
  await see(refusal('toss.1103.jpg').getByText(/cut off or damaged/));
  await see(refusal('toss.1104.png').getByText(/20,000 × 20,000 px/));
  await see(refusal('toss.1105.png').getByText(/300 × 200 px; the other frames are 320 × 180 px/));
  await see(desk.page.getByRole('heading', { name: '5 files were left out' }));
  await see(desk.page.getByRole('heading', { name: /^12 frames/ }));
  await postShot(desk.page, { number: '010-0010', title: 'A ball crosses the yard' });
});

it('says which frames are missing, and posts with the gap left open', async () => {
  await chooseFrames(desk.page, [...good.slice(0, 4), ...good.slice(6)]);
  await see(desk.page.getByText(/Frames 1005–1006 are missing/));
  await see(desk.page.getByText('1005–1006', { exact: true }));
  await postShot(desk.page, { number: '010-0020', title: 'A ball with a gap' });
  await see(desk.page.getByText(/frames, 2 missing/));
});

it('says that one frame is not a flight, and does not post it', async () => {
  await chooseFrames(desk.page, good.slice(0, 1));
  await see(desk.page.getByText(/One frame is not a flight/));
  expect(await desk.page.getByRole('button', { name: 'Post the strip' }).isDisabled()).toBe(true);
  // Nothing is lost: the others may follow.
  await chooseFrames(desk.page, good.slice(1));
  await see(desk.page.getByRole('heading', { name: /^12 frames/ }));
});

it('takes 4,000 frames down to what a strip holds, says so at once, and can be stopped', async () => {
  const files = await manyFrames(path.join(stage.folder, 'many'), 4000);
  await chooseFrames(desk.page, files);
  await see(
    desk.page
      .getByRole('heading', { name: `${(4000 - MAX_FRAMES).toLocaleString('en')} files were left out` })
      .or(desk.page.getByRole('heading', { name: `${4000 - MAX_FRAMES} files were left out` })),
  );
  await see(refusal('many.12001.png').getByText(/holds up to 2,000 frames/));
  await see(desk.page.getByRole('heading', { name: /^\d+ frames/ }));
  await desk.page.getByRole('button', { name: 'Cancel' }).click();
  await seeGone(desk.page.getByRole('progressbar'));
  await see(desk.page.getByRole('heading', { name: /^\d+ frames/ }));
});

it('reads a strip in which nothing moves and says so', async () => {
  const still = await drawToss(path.join(stage.folder, 'still'), { frames: 10, still: true });
  await chooseFrames(
    desk.page,
    still.frames.map((frame) => frame.path),
  );
  await see(desk.page.getByRole('heading', { name: /^10 frames/ }));
  await postShot(desk.page, { number: '010-0030', title: 'A ball that stays' });
  await see(desk.page.getByRole('heading', { name: 'Nothing moves in this strip' }));
});

it('reads a strip in which two things move, each as its own', async () => {
  const two = await drawToss(path.join(stage.folder, 'two'), { frames: 24, balls: 2, width: 640, height: 360 });
  await chooseFrames(
    desk.page,
    two.frames.map((frame) => frame.path),
  );
  await see(desk.page.getByRole('heading', { name: /^24 frames/ }));
  await postShot(desk.page, { number: '010-0040', title: 'Two balls' });
  await see(desk.page.getByText('A and B move here; each is read on its own.'));
  await see(desk.page.getByRole('button', { name: 'Thing B' }));
  await see(desk.page.getByRole('heading', { name: /Flight A1/ }));
  await see(desk.page.getByRole('heading', { name: /Flight B1/ }));
  await desk.page.getByRole('button', { name: 'Thing B' }).click();
  expect(await desk.page.getByRole('button', { name: 'Thing B' }).getAttribute('aria-pressed')).toBe('true');
});

it('takes frames that are dropped on it', async () => {
  const dropped = await desk.page.evaluateHandle(
    (files) => {
      const transfer = new DataTransfer();
      for (const { name, bytes } of files) {
        transfer.items.add(
          new File([Uint8Array.from(atob(bytes), (c) => c.charCodeAt(0))], name, { type: 'image/png' }),
        );
      }
      return transfer;
    },
    await Promise.all(
      good.map(async (file) => ({ name: path.basename(file), bytes: await readFile(file, { encoding: 'base64' }) })),
    ),
  );
  const zone = desk.page.getByText('Drop the frames here');
  await zone.dispatchEvent('dragover', { dataTransfer: dropped });
  await zone.dispatchEvent('drop', { dataTransfer: dropped });
  await see(desk.page.getByRole('heading', { name: /^12 frames/ }));
  expect(await desk.page.getByLabel('First frame').inputValue()).toBe('1001');
});

it('finds the grid of a strip picture by itself, and takes a correction', async () => {
  const picture = await stripPicture(path.join(stage.folder, 'strip.png'), good, 4, 6);
  await chooseFrames(desk.page, [picture]);
  await see(desk.page.getByRole('img', { name: /12 frames, 4 across and 3 down/ }));
  await desk.page.getByLabel('Frames', { exact: true }).fill('11');
  await see(desk.page.getByRole('heading', { name: 'A strip of 11 frames' }));
  await desk.page.getByLabel('Columns').fill('40000');
  await see(desk.page.getByText(/1 to 500 columns/));
  await desk.page.getByLabel('Columns').fill('4');
  await desk.page.getByLabel('Gutter across, px').fill('6');
  await desk.page.getByLabel('Frames', { exact: true }).fill('12');
  await see(desk.page.getByRole('img', { name: /12 frames, 4 across and 3 down/ }));
  await postShot(desk.page, { number: '010-0050', title: 'A ball on a sheet' });
  await see(desk.page.getByText('12 frames'));
  await see(desk.page.locator('[data-layer="marks"]'));
});

it('keeps what was written when the page is loaded again', async () => {
  await chooseFrames(desk.page, good);
  await see(desk.page.getByRole('heading', { name: /^12 frames/ }));
  await desk.page.getByLabel('What changed').fill('Opened the gaps out of the hand.');
  await desk.page.reload();
  await see(desk.page.getByRole('heading', { name: /^12 frames/ }));
  expect(await desk.page.getByLabel('What changed').inputValue()).toBe('Opened the gaps out of the hand.');
});

it('asks for what is missing in the form, field by field', async () => {
  await chooseFrames(desk.page, good);
  await see(desk.page.getByRole('heading', { name: /^12 frames/ }));
  await desk.page.getByRole('button', { name: 'Post the strip' }).click();
  await see(desk.page.getByText('Which shot is it? Write its number, such as 020-0140.'));
  await see(desk.page.getByText('This shot is new. Give it a title.'));
});
