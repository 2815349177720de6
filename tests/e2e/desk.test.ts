import type { Locator, Page } from 'playwright-core';
import { afterAll, beforeAll, expect, it } from 'vitest';
import type { Production } from '../../server/entities/Production.ts';
import type { User } from '../../server/entities/User.ts';
import { pinNote } from '../../server/services/threads.service.ts';
import { buildTake, PASSWORD } from '../support/factories.ts';
import { type Desk, openStage, see, seeGone, type Stage } from './stage.ts';

let stage: Stage;
let production: Production;
let animator: User;
let mentor: User;
let takeId: string;
let desk: Desk;

const SHOT = '010-0010';
const at = (rest = '') => `/p/${production.slug}/shots/${SHOT}/takes/1${rest}`;
const frameOf = (page: Page): Locator => page.getByRole('slider', { name: 'Frame' });

beforeAll(async () => {
  stage = await openStage();
  ({ user: animator, production } = await stage.hire('Ada Moss', 'animator'));
  ({ user: mentor } = await stage.hire('Rufus Pell', 'mentor', production));
  const posted = await buildTake(stage.server.deps, {
    production,
    user: animator,
    shotNumber: SHOT,
    frames: 14,
    read: true,
  });
  takeId = posted.take.id;
  desk = await stage.enter(mentor.email, at('?frame=1010'));
});

afterAll(async () => {
  await stage?.remove();
});

it('left and right step the frame in the picture, the score and the address', async () => {
  const { page } = desk;
  await see(page.locator('[data-layer="marks"]'));
  expect(await frameOf(page).inputValue()).toBe('1010');
  await page.keyboard.press('ArrowRight');
  await page.keyboard.press('ArrowRight');
  await page.waitForURL(/frame=1012/);
  expect(await frameOf(page).inputValue()).toBe('1012');
  await see(page.getByTestId('stage').locator(`[src$="/frames/12/picture"], [href$="/frames/12/picture"]`));
  await page.keyboard.press('ArrowLeft');
  await page.waitForURL(/frame=1011/);
});

it('an address with a frame and layers opens just so', async () => {
  const { page } = desk;
  await page.goto(at('?frame=1013&layers=marks'));
  await see(page.locator('[data-layer="marks"]'));
  expect(await frameOf(page).inputValue()).toBe('1013');
  expect(await page.locator('[data-layer="arc"]').count()).toBe(0);
  expect(await page.getByRole('button', { name: 'True arc' }).getAttribute('aria-pressed')).toBe('false');
});

it('the way from signing in to a pinned note goes by the keyboard alone', async () => {
  const keys = await stage.open();
  const { page } = keys;
  await page.goto('/sign-in');
  await tabTo(page, page.getByLabel('Email'));
  await page.keyboard.type(animator.email);
  await page.keyboard.press('Tab');
  await page.keyboard.type(PASSWORD);
  await page.keyboard.press('Enter');
  const card = page.getByRole('article').getByRole('link', { name: new RegExp(SHOT) });
  await see(card);
  await tabTo(page, card);
  await page.keyboard.press('Enter');
  await see(page.locator('[data-layer="marks"]'));
  for (let step = 1; step < 6; step += 1) await page.keyboard.press('ArrowRight');
  await page.waitForURL(/frame=1006/);
  await page.keyboard.press('n');
  await page.keyboard.type('Open this gap.');
  await page.keyboard.press('Control+Enter');
  await see(page.getByRole('article', { name: 'Note by Ada Moss' }));
  await page.keyboard.press('?');
  await see(page.getByRole('dialog', { name: 'Keys on this screen' }));
  await page.keyboard.press('Escape');
  await seeGone(page.getByRole('dialog', { name: 'Keys on this screen' }));
  expect(keys.problems).toEqual([]);
  await keys.context.close();
});

it('a page that was away catches up without being loaded again', async () => {
  const { page, context } = desk;
  await page.goto(at());
  await see(page.getByRole('button', { name: /^Note on frame 1006/ }));
  await page.evaluate(() => Object.assign(window, { neverReloaded: true }));
  await context.setOffline(true);
  await see(page.getByText('Reconnecting. What you write is kept.'));
  await pinNote(stage.server.deps, animator.id, takeId, { frame: 9, body: 'Written while the line was down.' });
  await context.setOffline(false);
  await see(page.getByRole('button', { name: /^Note on frame 1009/ }));
  await seeGone(page.getByText('Reconnecting. What you write is kept.'));
  expect(await page.evaluate(() => 'neverReloaded' in window)).toBe(true);
});

it('a take on the wrong shot is moved, and whoever looks at it goes with it', async () => {
  const other = await stage.enter(animator.email, at());
  await see(other.page.locator('[data-layer="marks"]'));
  const { page } = desk;
  await page.getByRole('button', { name: 'More for this take' }).click();
  await page.getByRole('menuitem', { name: 'Move to another shot…' }).click();
  await page.getByLabel('Shot number').fill('010-0090');
  await page.getByLabel('Title of the new shot').fill('The same ball, somewhere else');
  await page.getByRole('button', { name: 'Move it' }).click();
  await page.waitForURL('**/shots/010-0090/takes/1*');
  await other.page.waitForURL('**/shots/010-0090/takes/1*');
  await see(other.page.getByRole('heading', { name: 'The same ball, somewhere else' }));
  expect(other.problems).toEqual([]);
  await other.context.close();
});

it('signing out ends the other tabs of the same browser', async () => {
  const { page, context } = desk;
  const second = await context.newPage();
  await second.goto(`/p/${production.slug}`);
  await second.getByRole('button', { name: /menu$/ }).click();
  await second.getByRole('menuitem', { name: 'Sign out' }).click();
  await second.waitForURL('**/sign-in*');
  await see(page.getByRole('dialog'));
});

/** Presses Tab until something has the focus, and sees that the focus shows. */
async function tabTo(page: Page, target: Locator): Promise<void> {
  for (let presses = 0; presses < 60; presses += 1) {
    await page.keyboard.press('Tab');
    const there = await target.first().evaluate((element) => element === document.activeElement);
    if (!there) continue;
    const outline = await target.first().evaluate((element) => {
      const { outlineStyle, outlineWidth } = getComputedStyle(element);
      return outlineStyle === 'none' ? 0 : Number.parseFloat(outlineWidth);
    });
    expect(outline).toBeGreaterThan(0);
    return;
  }
  throw new Error('Tab does not lead there.');
}
