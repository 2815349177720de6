import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { Browser, BrowserContext, BrowserContextOptions, Locator, Page } from 'playwright-core';
import type { Production } from '../../server/entities/Production.ts';
import type { User } from '../../server/entities/User.ts';
import { drawStrip, type StripDrawing } from '../../server/scripts/demo/drawStrip.ts';
import { DEMO_STRIPS, type DemoStripId } from '../../server/scripts/demo/strips.ts';
import { ensureClientBuilt } from '../../server/scripts/start/clientBuild.ts';
import type { Role } from '../../shared/api/people.ts';
import { launchBrowser } from '../support/browser.ts';
import { buildMember, buildProduction, buildUser, PASSWORD } from '../support/factories.ts';
import { createTestServer, type TestServer } from '../support/testServer.ts';

const ROOT = path.resolve(import.meta.dirname, '../..');
/** Longest wait for something to appear. Nothing waits this long when all is well. */
const PATIENCE = 15_000;

/** A browser tab of one person, and what went wrong in it. */
export interface Desk {
  context: BrowserContext;
  page: Page;
  /** Errors on the console, uncaught errors, and requests to another host. */
  problems: string[];
}

/** The real server with the built client, a real browser, and a folder for drawn strips. */
export interface Stage {
  server: TestServer;
  browser: Browser;
  folder: string;
  hire(name: string, role: Role, production?: Production): Promise<{ user: User; production: Production }>;
  /** Opens a tab at the sign-in page. */
  open(options?: BrowserContextOptions): Promise<Desk>;
  /** Opens a tab of someone who is signed in, at a path. */
  enter(email: string, at: string, options?: BrowserContextOptions, password?: string): Promise<Desk>;
  /** Draws one of the demo's strips; answers its files. */
  draw(id: DemoStripId, changes?: Partial<StripDrawing>): Promise<string[]>;
  remove(): Promise<void>;
}

/** Sets everything up. `env` goes to the server. */
export async function openStage(env: Parameters<typeof createTestServer>[0] = {}): Promise<Stage> {
  await ensureClientBuilt(ROOT, new AbortController().signal);
  const server = await createTestServer(env);
  const browser = await launchBrowser();
  const folder = await mkdtemp(path.join(tmpdir(), 'spandrel-e2e-'));
  let drawn = 0;
  const open = async (options: BrowserContextOptions = {}): Promise<Desk> => {
    const context = await browser.newContext({
      viewport: { width: 1440, height: 900 },
      baseURL: server.url,
      reducedMotion: 'reduce',
      ...options,
    });
    context.setDefaultTimeout(PATIENCE);
    const page = await context.newPage();
    return { context, page, problems: watch(page, server.url) };
  };
  return {
    server,
    browser,
    folder,
    open,
    async hire(name, role, production) {
      const initials = name.replaceAll(/[^A-Z]/g, '').slice(0, 3);
      const user = await buildUser(server.deps, { name, initials });
      return buildMember(server.deps, { user, role, production: production ?? (await buildProduction(server.deps)) });
    },
    async enter(email, at, options, password = PASSWORD) {
      const desk = await open(options);
      const answer = await desk.context.request.post('/api/session', {
        data: { email, password },
        headers: { Origin: server.url },
      });
      if (!answer.ok()) throw new Error(`${email} could not sign in: ${await answer.text()}`);
      await desk.page.goto(at);
      return desk;
    },
    async draw(id, changes) {
      drawn += 1;
      return drawStrip({ ...DEMO_STRIPS[id], ...changes }, path.join(folder, `strip-${drawn}`));
    },
    async remove() {
      await browser.close();
      await server.remove();
      await rm(folder, { recursive: true, force: true });
    },
  };
}

function watch(page: Page, ours: string): string[] {
  const problems: string[] = [];
  page.on('console', (message) => {
    if (message.type() !== 'error') return;
    const { url } = message.location();
    // Asking who is signed in answers 401 to nobody, and the browser notes that by itself.
    if (message.text().includes('401') && new URL(url).pathname === '/api/session') return;
    problems.push(`console: ${message.text()} (${url})`);
  });
  page.on('pageerror', (error) => problems.push(`uncaught: ${error.message}`));
  page.on('request', (request) => {
    const { protocol, origin } = new URL(request.url());
    if (protocol.startsWith('http') && origin !== new URL(ours).origin) problems.push(`foreign: ${request.url()}`);
  });
  return problems;
}

/** Waits until it can be seen. */
export async function see(locator: Locator): Promise<void> {
  await locator.first().waitFor({ state: 'visible' });
}

/** Waits until it can no longer be seen. */
export async function seeGone(locator: Locator): Promise<void> {
  await locator.first().waitFor({ state: 'hidden' });
}

/** Chooses files in the posting page. */
export async function chooseFrames(page: Page, files: string[]): Promise<void> {
  await page.getByLabel('Frames of the strip').setInputFiles(files);
}

export interface ShotWords {
  number: string;
  title?: string;
  changed?: string;
}

/** Fills in what the pictures cannot say and posts; answers when the take page is there. */
export async function postShot(page: Page, { number, title, changed }: ShotWords): Promise<void> {
  await page.getByLabel('Shot number').fill(number);
  if (title !== undefined) await page.getByLabel('Title of the new shot').fill(title);
  if (changed !== undefined) await page.getByLabel('What changed').fill(changed);
  await page.getByRole('button', { name: /^Post (the strip|take)/ }).click();
  await page.waitForURL(/\/takes\/\d+/);
}
