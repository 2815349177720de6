import { afterAll, beforeAll, expect, it } from 'vitest';
import type { Production } from '../../server/entities/Production.ts';
import { DEMO_STRIPS } from '../../server/scripts/demo/strips.ts';
import { PASSWORD } from '../support/factories.ts';
import { chooseFrames, type Desk, openStage, postShot, see, seeGone, type Stage } from './stage.ts';

let stage: Stage;
let production: Production;
let animator: Desk;
let mentor: Desk;
let animatorEmail: string;

const SHOT = '010-0060';
const strip = DEMO_STRIPS['010-0060/1'];

beforeAll(async () => {
  stage = await openStage();
  const hired = await stage.hire('Ada Moss', 'animator');
  production = hired.production;
  animatorEmail = hired.user.email;
  const { user } = await stage.hire('Rufus Pell', 'mentor', production);
  mentor = await stage.enter(user.email, `/p/${production.slug}`);
  animator = await stage.open();
});

afterAll(async () => {
  await stage?.remove();
});

it('an animator signs in and is told what the empty feed is for', async () => {
  const { page } = animator;
  await page.goto('/');
  await page.getByLabel('Email').fill(animatorEmail);
  await page.getByLabel('Password').fill(PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL(`**/p/${production.slug}`);
  await see(page.getByRole('heading', { name: 'Feed' }));
  // Whoever reloads loses this; the story ends without a reload.
  await page.evaluate(() => Object.assign(window, { neverReloaded: true }));
});

it('posts a strip and sees how far the reading is, in frames', async () => {
  const { page } = animator;
  await page.getByRole('link', { name: 'Post a strip' }).first().click();
  await chooseFrames(page, await stage.draw('010-0060/1'));
  await see(page.getByRole('heading', { name: '28 frames' }));
  expect(await page.getByLabel('First frame').inputValue()).toBe('1001');
  const progress = see(
    page.getByRole('progressbar', { name: /Opening the frames|Finding the thing|Reading the flight/ }),
  );
  await postShot(page, { number: SHOT, title: 'Egg across the kitchen', changed: 'Held the top for the look.' });
  await progress;
  await see(page.getByRole('heading', { name: 'Egg across the kitchen' }));
});

it('the mentor sees it arrive on the feed, and then what the reading says', async () => {
  const card = mentor.page.getByRole('article').filter({ hasText: 'Egg across the kitchen' });
  await see(card);
  await see(card.getByText('Apex sits late'));
  await card.getByRole('link', { name: /Egg across the kitchen/ }).click();
  await mentor.page.waitForURL(`**/shots/${SHOT}/takes/1`);
});

it('the marks, the true arc and the finding lie over the picture where the thing was drawn', async () => {
  const { page } = animator;
  await see(page.getByRole('button', { name: 'Apex sits late', exact: true }));
  for (const layer of ['marks', 'arc', 'findings']) await see(page.locator(`[data-layer="${layer}"]`));

  const marks = await page
    .locator('[data-layer="marks"] circle')
    .evaluateAll((dots) =>
      dots.map((dot) => ({ x: Number(dot.getAttribute('cx')), y: Number(dot.getAttribute('cy')) })),
    );
  const inFlight = strip.path.slice(4, 24);
  for (const place of inFlight) {
    const nearest = Math.min(...marks.map((mark) => Math.hypot(mark.x - place.x, mark.y - place.y)));
    expect(nearest).toBeLessThan(1);
  }
  const image = page.getByTestId('stage').locator('image, img').first();
  const width = await image.evaluate((picture) => picture.getBoundingClientRect().width);
  expect(width).toBeGreaterThan(300);
});

it('a layer goes off and on, and the address says so', async () => {
  const { page } = animator;
  await page.getByRole('button', { name: 'Marks', exact: true }).click();
  await page.waitForURL(/layers=/);
  await seeGone(page.locator('[data-layer="marks"]'));
  await page.getByRole('button', { name: 'Marks', exact: true }).click();
  await see(page.locator('[data-layer="marks"]'));
});

it('the mentor pins a note to a frame and stamps it; the animator sees both', async () => {
  const { page } = mentor;
  await page.goto(`/p/${production.slug}/shots/${SHOT}/takes/1?frame=1018`);
  await see(page.locator('[data-layer="marks"]'));
  await page.keyboard.press('n');
  await page
    .getByRole('textbox', { name: 'Note on frame 1018' })
    .fill('It still climbs on 1017. The top belongs on 1014.');
  await page.getByRole('button', { name: 'Pin it here' }).click();
  const note = page.getByRole('article', { name: 'Note by Rufus Pell' });
  await see(note);
  await note.getByRole('button', { name: 'Good weight' }).click();

  const pin = animator.page.getByRole('button', { name: /^Note on frame 1018/ });
  await see(pin);
  if ((await pin.getAttribute('aria-expanded')) === 'false') await pin.click();
  const seen = animator.page.getByRole('article', { name: 'Note by Rufus Pell' });
  await see(seen.getByText('The top belongs on'));
  await see(seen.getByRole('button', { name: 'Good weight: Rufus Pell' }));
});

it('the animator stamps and answers; the mentor sees both', async () => {
  const { page } = animator;
  await page.getByRole('article', { name: 'Note by Rufus Pell' }).getByRole('button', { name: 'On it' }).click();
  await page.getByRole('textbox', { name: 'Reply on frame 1018' }).fill('Moving the top back to 1014.');
  await page.getByRole('button', { name: 'Reply', exact: true }).click();

  await see(mentor.page.getByRole('button', { name: 'On it: Ada Moss' }));
  await see(mentor.page.getByRole('article', { name: 'Note by Ada Moss' }).getByText('Moving the top back'));
});

it('the mentor asks for another pass, and nobody decides on their own take', async () => {
  const { page } = mentor;
  await page.getByRole('button', { name: 'Another pass…' }).click();
  await page.getByLabel('What should the next take do?').fill('Bring the top back to 1014.');
  await page.getByRole('button', { name: 'Ask for another pass' }).click();

  await see(animator.page.getByText('Another pass', { exact: true }));
  await see(animator.page.getByText('Bring the top back to 1014.'));
  expect(await animator.page.getByRole('button', { name: 'Clear this shot' }).count()).toBe(0);
});

it('the animator posts take 2, the mentor clears it, and the sheet shows it live', async () => {
  const { page } = animator;
  await page.getByRole('link', { name: 'Post a strip' }).first().click();
  const frames = await stage.draw('010-0060/1', { path: DEMO_STRIPS['010-0020/3'].path });
  await chooseFrames(page, frames);
  await see(page.getByRole('heading', { name: '28 frames' }));
  await postShot(page, { number: SHOT, changed: 'The top is on 1014.' });
  await see(page.getByText(/Reads true/));

  await mentor.page.getByRole('link', { name: 'Take 2 is newer' }).click();
  await mentor.page.waitForURL('**/takes/2*');
  await page.getByRole('link', { name: 'Shot sheet' }).click();
  await see(page.getByRole('heading', { name: 'Shot sheet' }));
  await see(page.getByText('Waiting', { exact: true }));
  await mentor.page.getByRole('button', { name: 'Clear this shot' }).click();
  await see(page.getByText('Cleared', { exact: true }));
});

it('all of it without a reload, an error, or a word to another host', async () => {
  expect(await animator.page.evaluate(() => 'neverReloaded' in window)).toBe(true);
  expect(animator.problems).toEqual([]);
  expect(mentor.problems).toEqual([]);
});
