import { readFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import type { AxeResults } from 'axe-core';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { DEMO_PASSWORD, DEMO_PEOPLE } from '../../server/scripts/demo/people.ts';
import { type Desk, openStage, see, type Stage } from './stage.ts';

let stage: Stage;
let axe: string;

const AT = '/p/stilt-bakery';

/** Every screen with what shows that it is there. */
const SCREENS: { name: string; path: string; shown: (page: Page) => Promise<void> }[] = [
  { name: 'feed', path: AT, shown: (page) => see(page.getByRole('article').getByText('Floats more than the rest')) },
  { name: 'sheet', path: `${AT}/shots`, shown: (page) => see(page.getByText('Dough ball into the trough')) },
  { name: 'people', path: `${AT}/people`, shown: (page) => see(page.getByText('Wendel Marsh')) },
  { name: 'post', path: `${AT}/post`, shown: (page) => see(page.getByRole('button', { name: 'Choose files' })) },
  {
    name: 'take',
    path: `${AT}/shots/010-0060/takes/1?frame=1018`,
    shown: async (page) => {
      await see(page.getByRole('button', { name: 'Apex sits late', exact: true }));
      await see(page.locator('[data-layer="arc"]'));
      await see(page.getByRole('article', { name: 'Note by Thea Lindgate' }));
    },
  },
];

beforeAll(async () => {
  axe = await readFile(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');
  stage = await openStage({ DEMO: true });
});

afterAll(async () => {
  await stage?.remove();
});

/** What axe has against the page as it is now: rule, and where. */
async function violations(page: Page): Promise<string[]> {
  await page.evaluate(axe);
  const results = await page.evaluate(() => (window as unknown as { axe: { run(): Promise<AxeResults> } }).axe.run());
  return results.violations.flatMap(({ id, nodes }) => nodes.map((node) => `${id}: ${node.target.join(' ')}`));
}

const sideways = (page: Page) =>
  page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);

describe.each([
  { width: 1440, height: 900 },
  { width: 390, height: 844 },
])('at $width × $height', (viewport) => {
  describe.each(['light', 'dark'] as const)('in %s', (colorScheme) => {
    let desk: Desk;
    const phone = viewport.width < 500;

    beforeAll(async () => {
      desk = await stage.open({ viewport, colorScheme, hasTouch: phone, isMobile: phone });
    });

    afterAll(async () => {
      await desk?.context.close();
    });

    it('the sign-in screen is sound, and leads in', async () => {
      const { page } = desk;
      await page.goto('/sign-in');
      await see(page.getByRole('heading', { name: 'Sign in' }));
      expect(await violations(page)).toEqual([]);
      expect(await sideways(page)).toBe(0);
      await page.getByLabel('Email').fill(DEMO_PEOPLE.osric.email);
      await page.getByLabel('Password').fill(DEMO_PASSWORD);
      await page.getByRole('button', { name: 'Sign in' }).click();
      await page.waitForURL(`**${AT}`);
    });

    it.each(SCREENS)('the $name screen is sound', async ({ path, shown }) => {
      const { page } = desk;
      await page.goto(path);
      await shown(page);
      expect(await violations(page)).toEqual([]);
      expect(await sideways(page)).toBe(0);
    });

    it('so are the list of keys and the dialog of a decision', async () => {
      const { page } = desk;
      // The shot's only take, so that it is still to be decided on.
      await page.goto(`${AT}/shots/020-0090/takes/1`);
      await page.getByRole('button', { name: 'Another pass…' }).locator('visible=true').click();
      await see(page.getByRole('dialog', { name: 'Another pass' }));
      expect(await violations(page)).toEqual([]);
      await page.keyboard.press('Escape');
      await page.keyboard.press('?');
      await see(page.getByRole('dialog', { name: 'Keys on this screen' }));
      expect(await violations(page)).toEqual([]);
    });

    it('nothing went wrong and no other host was asked', () => {
      expect(desk.problems).toEqual([]);
    });
  });
});
