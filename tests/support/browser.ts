import { existsSync } from 'node:fs';
import { type Browser, chromium } from 'playwright-core';

/** Where Debian's package puts Chromium; `CHROMIUM_PATH` names another. */
const CHROMIUM = process.env.CHROMIUM_PATH ?? '/usr/bin/chromium';

/**
 * A real browser without a window. Chromium's own sandbox does not start as root, which is what a container runs as.
 * @throws {Error} naming the package to install when Chromium is missing
 */
export function launchBrowser(): Promise<Browser> {
  if (!existsSync(CHROMIUM)) {
    throw new Error(`There is no Chromium at ${CHROMIUM}. Run "apt-get install chromium", or set CHROMIUM_PATH.`);
  }
  return chromium.launch({ executablePath: CHROMIUM, args: ['--no-sandbox', '--disable-dev-shm-usage'] });
}
