import type { Browser } from 'playwright-core';
import { axeFindings, openBrowser, phone, signInAs, visit } from '@test/support/browser';

describe('findings', () => {
  let browser: Browser;
  beforeAll(async () => {
    browser = await openBrowser();
  });
  afterAll(() => browser.close());

  it('are reported, settled in words, taken back, and settled with a repair', async () => {
    const { page, context, complaints } = await visit(browser);
    await signInAs(page, 'regional facility manager');
    await page.goto('/en/findings/new');
    await page.getByRole('button', { name: 'Report it' }).click();
    await page.getByText('Please look at this again').waitFor();

    await page.getByLabel('Store', { exact: true }).fill('0101');
    await page.getByRole('option', { name: /^0101/ }).click();
    await page.getByRole('combobox', { name: 'Unit' }).click();
    await page.getByRole('option').nth(1).click();
    await page.getByRole('combobox', { name: 'What it looks like' }).click();
    await page.getByRole('option', { name: 'Worn shaft seal' }).click();
    await page.getByLabel('Plan a repair').check();
    const note = `Oil at the drain slot, seen ${Date.now()}.`;
    await page.getByLabel('What you saw').fill(note);
    await page.getByRole('button', { name: 'Report it' }).click();
    await page.getByRole('heading', { name: 'Worn shaft seal' }).waitFor();
    expect(await page.getByText(note).isVisible()).toBe(true);
    expect(await axeFindings(page)).toEqual([]);

    const dialog = page.getByRole('dialog');
    await page.getByRole('button', { name: 'Settle' }).click();
    await dialog.getByLabel('What was done').fill('Wiped, watched for an hour, no drops.');
    await dialog.getByRole('button', { name: 'Settle' }).click();
    await page.getByRole('button', { name: 'Undo' }).click();
    await page.getByText('Nothing yet: this is open.').waitFor();

    await page.getByRole('button', { name: 'Settle' }).click();
    await dialog.getByLabel('What was done').fill('New pump fitted.');
    await dialog.getByLabel('A repair was made').check();
    await dialog.getByLabel('Parts, $').fill('many');
    await dialog.getByRole('button', { name: 'Settle' }).click();
    await dialog.getByText('Give an amount in dollars').first().waitFor();
    await dialog.getByLabel('Parts, $').fill('84.50');
    await dialog.getByRole('button', { name: 'Settle' }).click();
    await page.getByText('New pump fitted.').waitFor();
    expect(complaints).toEqual([]);
    await context.close();
  });

  it('are filtered by an address that can be shared', async () => {
    const { page, context } = await visit(browser);
    await signInAs(page, 'regional facility manager');
    await page.goto('/en/findings?settled=all&severity=plan');
    await page.locator('tbody tr.row').first().waitFor();
    const words = await page.locator('tbody vw-severity-mark').allInnerTexts();
    expect(new Set(words)).toEqual(new Set(['Plan a repair']));
    await page.getByRole('button', { name: /Plan a repair/ }).click();
    await page.waitForURL((url) => !url.search.includes('severity'));
    await context.close();
  });

  describe.each(['/findings?pageSize=25', '/findings/new'])('at %s', (path) => {
    it.each([
      ['light', 'en', undefined],
      ['dark', 'es', phone],
    ] as const)('nothing is found by axe in %s, %s', async (theme, language, viewport) => {
      const { page, context } = await visit(browser, {
        theme,
        viewport,
        locale: language === 'es' ? 'es-US' : 'en-US',
      });
      await signInAs(page, 'regional facility manager');
      await page.goto(`/${language}${path}`);
      await page.locator('h1').waitFor();
      await page.waitForLoadState('networkidle');
      expect(await axeFindings(page)).toEqual([]);
      await context.close();
    });
  });
});
