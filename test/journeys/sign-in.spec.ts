import type { Browser } from 'playwright-core';
import { axeFindings, openBrowser, phone, signInAs, visit } from '@test/support/browser';

describe('signing in', () => {
  let browser: Browser;
  beforeAll(async () => {
    browser = await openBrowser();
  });
  afterAll(() => browser.close());

  it('tells a wrong password in words and keeps what was typed', async () => {
    const { page, context } = await visit(browser);
    await page.goto('/');
    await page.locator('input[type=email]').fill('walt.brennan@lanternline.example');
    await page.locator('input[type=password]').fill('wrong password');
    await page.locator('button[type=submit]').click();
    await page.getByRole('alert').first().waitFor();
    expect(await page.locator('input[type=email]').inputValue()).toContain('walt.brennan');
    await context.close();
  });

  it('lets a technician in and out again, on a phone', async () => {
    const { page, context, complaints } = await visit(browser, { viewport: phone });
    await signInAs(page, 'technician');
    expect(page.url()).toContain('/en/');
    const session = await page.evaluate(async () => (await fetch('/api/v1/session')).status);
    expect(session).toBe(200);
    expect(complaints).toEqual([]);
    await context.close();
  });

  it.each([
    ['light', 'en-US'],
    ['dark', 'en-US'],
    ['light', 'es-US'],
  ] as const)('has a sign-in page without findings in %s, %s', async (theme, locale) => {
    const { page, context } = await visit(browser, { theme, locale });
    await page.goto('/');
    await page.locator('button[type=submit]').waitFor();
    expect(page.url()).toContain(`/${locale.slice(0, 2)}/`);
    expect(await axeFindings(page)).toEqual([]);
    await context.close();
  });
});
