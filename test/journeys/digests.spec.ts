import type { Browser } from 'playwright-core';
import { axeFindings, openBrowser, phone, signInAs, visit } from '@test/support/browser';

interface Message {
  readonly id: string;
  readonly subject: string;
}

/** The account owner's letter about the month just over, once the worker has sent it. */
async function digestLetter(to: string): Promise<string> {
  const inbox = process.env['JOURNEY_INBOX'] ?? '';
  for (let tries = 0; tries < 240; tries += 1) {
    const reply = await fetch(`${inbox}/api/messages?to=${encodeURIComponent(to)}`);
    const { messages } = (await reply.json()) as { messages: Message[] };
    const letter = messages.find(({ subject }) => subject.includes(': maintenance in '));
    if (letter) return (await fetch(`${inbox}/api/messages/${letter.id}`)).text();
    await new Promise((resolve) => setTimeout(resolve, 500));
  }
  throw new Error(`No digest came to ${to}.`);
}

describe('the month of a chain', () => {
  let browser: Browser;
  beforeAll(async () => {
    browser = await openBrowser();
  });
  afterAll(() => browser.close());

  it('comes to its account owner by mail, and the letter leads to the same figures', async () => {
    const letter = await digestLetter('colin.avery@lanternline.example');
    const path = /\/digests\/[0-9a-f-]{36}/.exec(letter)?.[0];
    if (!path) throw new Error('The letter leads nowhere.');
    const { page, context, complaints } = await visit(browser);
    await signInAs(page, 'account owner');
    await page.goto(`/en${path}`);
    await page.getByRole('heading', { name: 'What to decide' }).waitFor();
    const rate = (
      await page.locator('vw-digest-blocks vw-figure .value').first().innerText()
    ).trim();
    expect(rate).toMatch(/^\d+\.\d%$/);
    expect(letter).toContain(rate);
    const basis = await page.locator('vw-digest-blocks section p').first().innerText();
    const counts = /^([\d,]+ of [\d,]+) tasks/.exec(basis)?.[1];
    expect(counts).toBeDefined();
    expect(letter).toContain(counts);
    expect(await axeFindings(page)).toEqual([]);
    expect(complaints).toEqual([]);
    await context.close();
  });

  it.each([
    ['light', 'en-US', phone],
    ['dark', 'es-US', undefined],
  ] as const)('reads in %s, %s, from the list to the page', async (theme, locale, viewport) => {
    const { page, context } = await visit(browser, {
      theme,
      locale,
      ...(viewport ? { viewport } : {}),
    });
    await signInAs(page, 'account owner');
    const language = locale.slice(0, 2);
    await page.goto(`/${language}/digests`);
    await page.locator('.row-link').first().waitFor();
    expect(await axeFindings(page)).toEqual([]);
    await page.locator('.row-link').first().click();
    await page.locator('vw-month-bars svg').waitFor();
    expect(await axeFindings(page)).toEqual([]);
    await context.close();
  });
});
