import AxeBuilder from '@axe-core/playwright';
import { type Browser, type BrowserContext, type Page, chromium } from 'playwright-core';
import { demoSignIns } from '@db/seeds/demo-sign-ins.mjs';

const flags = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
  '--disable-dev-shm-usage',
];

export const desk = { width: 1440, height: 900 };
export const phone = { width: 390, height: 844 };

/** Debian's Chromium; playwright's own download is not used. */
export const openBrowser = (): Promise<Browser> =>
  chromium.launch({
    executablePath: process.env['CHROMIUM_PATH'] || '/usr/bin/chromium',
    args: flags,
  });

export interface Visitor {
  readonly context: BrowserContext;
  readonly page: Page;
  /** What the console complained of: policy violations and errors. */
  readonly complaints: string[];
}

/** A new visitor who has never been here. */
export async function visit(
  browser: Browser,
  {
    viewport = desk,
    theme = 'light',
    locale = 'en-US',
  }: { viewport?: typeof desk; theme?: 'light' | 'dark'; locale?: string } = {},
): Promise<Visitor> {
  const context = await browser.newContext({
    baseURL: process.env['JOURNEY_URL'] ?? '',
    viewport,
    colorScheme: theme,
    locale,
    reducedMotion: 'reduce',
  });
  const page = await context.newPage();
  const complaints: string[] = [];
  page.on('console', (message) => {
    // A refused request is logged by the browser itself; pages answer for those on screen.
    if (message.type() === 'error' && !message.text().startsWith('Failed to load resource')) {
      complaints.push(message.text());
    }
  });
  page.on('pageerror', (error) => complaints.push(error.message));
  return { context, page, complaints };
}

/** Signs in as the demo person of a role and waits for their first page. */
export async function signInAs(page: Page, role: string): Promise<void> {
  const person = demoSignIns.find((it) => it.role === role);
  if (!person) throw new Error(`No demo sign-in for ${role}`);
  await page.goto('/');
  await page.locator('input[type=email]').fill(person.email);
  await page.locator('input[type=password]').fill(person.password);
  await page.locator('button[type=submit]').click();
  await page.waitForURL((url) => !url.pathname.includes('sign-in'));
}

/** Everything that axe finds on the page, one line each. */
export async function axeFindings(page: Page): Promise<string[]> {
  const { violations } = await new AxeBuilder({ page }).analyze();
  return violations.flatMap(({ id, nodes }) =>
    nodes.map(({ target }) => `${id}: ${target.join(' ')}`),
  );
}
