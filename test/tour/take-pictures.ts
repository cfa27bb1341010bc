// `npm run tour`: pictures of each role's main page for the README, from the product running with its
// demo world (http://localhost:4310, or BASE_URL).
import { mkdir, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import sharp from 'sharp';
import { desk, openBrowser, phone, signInAs, visit } from '../support/browser';

interface Stop {
  readonly name: string;
  readonly role: string;
  /** Path within the language; none for the role's own first page. */
  readonly path?: string;
  readonly viewport: typeof desk;
  readonly theme?: 'light' | 'dark';
}

const stops: readonly Stop[] = [
  { name: 'board', role: 'regional facility manager', path: 'board', viewport: desk },
  { name: 'visits', role: 'regional facility manager', path: 'visits', viewport: desk },
  { name: 'today', role: 'technician', path: 'today', viewport: phone },
  { name: 'shift', role: 'store manager', path: 'shift', viewport: phone, theme: 'dark' },
  { name: 'compliance', role: 'account owner', path: 'compliance', viewport: desk },
  { name: 'procedures', role: 'trainer', path: 'procedures', viewport: desk },
  { name: 'fleet', role: 'administrator', path: 'fleet', viewport: desk, theme: 'dark' },
];

const folder = join(__dirname, 'pictures');

async function takePictures(): Promise<void> {
  process.env['JOURNEY_URL'] ??= process.env['BASE_URL'] ?? 'http://localhost:4310';
  await mkdir(folder, { recursive: true });
  const browser = await openBrowser();
  try {
    for (const stop of stops) {
      const { page, context } = await visit(browser, stop);
      await signInAs(page, stop.role);
      if (stop.path) await page.goto(`/en/${stop.path}`);
      await page.waitForLoadState('networkidle');
      await page.evaluate('document.fonts.ready.then(() => undefined)');
      const picture = sharp(await page.screenshot()).webp({ quality: 72, effort: 6 });
      await writeFile(join(folder, `${stop.name}.webp`), await picture.toBuffer());
      await context.close();
    }
  } finally {
    await browser.close();
  }
}

takePictures().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exitCode = 1;
});
