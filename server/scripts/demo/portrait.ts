import path from 'node:path';
import { chromium } from 'playwright-core';
import { DEMO_PASSWORD, DEMO_PEOPLE, DEMO_PRODUCTION } from './people.ts';

/**
 * Takes the README's picture of the take page from a running demo:
 * `npx tsx server/scripts/demo/portrait.ts http://127.0.0.1:4310`.
 */
const address = process.argv[2] ?? 'http://127.0.0.1:4310';
const file = path.resolve(import.meta.dirname, '../../docs/take-page.png');

const browser = await chromium.launch({
  executablePath: process.env.CHROMIUM_PATH ?? '/usr/bin/chromium',
  args: ['--no-sandbox'],
});
try {
  const page = await browser.newPage({ viewport: { width: 1440, height: 900 }, reducedMotion: 'reduce' });
  await page.goto(`${address}/sign-in?next=/p/${DEMO_PRODUCTION.slug}/shots/010-0060/takes/1?frame=1018`);
  await page.getByLabel('Email').fill(DEMO_PEOPLE.thea.email);
  await page.getByLabel('Password').fill(DEMO_PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.locator('[data-layer="findings"]').waitFor();
  await page.getByRole('article', { name: `Note by ${DEMO_PEOPLE.thea.name}` }).waitFor();
  await page.waitForLoadState('networkidle');
  await page.screenshot({ path: file });
  console.log(`Saved ${file}`);
} finally {
  await browser.close();
}
