import type { Browser, Page } from 'playwright-core';
import { axeFindings, desk, openBrowser, phone, signInAs, visit } from '@test/support/browser';

/** How far the page reaches beyond the right edge of the window, in CSS pixels. */
const overflow = (page: Page): Promise<number> =>
  page.evaluate('document.documentElement.scrollWidth - window.innerWidth');

describe('procedures', () => {
  let browser: Browser;
  beforeAll(async () => {
    browser = await openBrowser();
  });
  afterAll(() => browser.close());

  it('lets a trainer write a new version, be told what is missing, and publish it', async () => {
    const { page, context, complaints } = await visit(browser);
    await signInAs(page, 'trainer');
    await page.goto('/en/procedures');
    await page.getByRole('link', { name: 'Pan and O-ring, weekly' }).click();
    await page.getByRole('button', { name: 'New version' }).click();
    await page.waitForURL('**/edit');
    const minutes = page.getByLabel('Minutes');
    const before = await minutes.inputValue();
    await minutes.fill('17');
    await page.getByRole('button', { name: 'Add a step' }).click();
    await page.getByRole('menuitem', { name: 'Number' }).click();
    const step = page.locator('vw-step-editor');
    await step.getByLabel('Text · English').fill('Measure the depth of the oil left in the pan');
    await step.getByLabel('Unit', { exact: true }).fill('mm');
    await step.getByLabel('At most').fill('5');

    await page.getByRole('button', { name: 'Publish' }).click();
    const summary = page.getByRole('alert').filter({ hasText: 'Please look at this again' });
    await summary.getByRole('link', { name: /Step \d+, .*Español/ }).click();
    const spanish = step.getByLabel('Text · Español');
    await spanish.and(page.locator(':focus')).waitFor();
    expect(await minutes.inputValue()).toBe('17');

    await spanish.fill('Mida la altura del aceite que queda en la bandeja');
    await page.getByRole('button', { name: 'Publish' }).click();
    await page.getByText(/^Version 2, published/).waitFor();
    await page.getByText('Measure the depth of the oil left in the pan').waitFor();

    await page.getByRole('combobox', { name: 'Compare with' }).click();
    await page.getByRole('option', { name: 'version 1' }).click();
    const changes = page.locator('vw-version-changes');
    await changes.waitFor();
    expect(await changes.locator('del').allTextContents()).toContain(before);
    expect(await changes.locator('ins').allTextContents()).toContain('17');

    await page.getByRole('radio', { name: 'Español' }).click();
    await page.getByText('Mida la altura del aceite que queda en la bandeja').first().waitFor();
    expect(complaints).toEqual([]);
    await context.close();
  });

  it('keeps a half-written draft and asks before unsaved work is left', async () => {
    const { page, context } = await visit(browser);
    await signInAs(page, 'trainer');
    await page.goto('/en/procedures/new');
    await page.getByLabel('Title · English').fill('Look at the lid');
    await page.getByLabel('Code').fill('look-at-the-lid');
    await page.getByRole('link', { name: 'Back' }).click();
    await page.getByRole('alertdialog').getByRole('button', { name: 'Stay here' }).click();
    await page.getByRole('button', { name: 'Save draft' }).click();
    await page.waitForURL('**/edit');
    await page.reload();
    expect(await page.getByLabel('Title · English').inputValue()).toBe('Look at the lid');
    await context.close();
  });

  it.each([
    ['light', 'en-US', desk],
    ['dark', 'es-US', desk],
    ['light', 'es-US', phone],
    ['dark', 'en-US', phone],
  ] as const)('has pages without findings in %s, %s, %j', async (theme, locale, viewport) => {
    const { page, context, complaints } = await visit(browser, { theme, locale, viewport });
    await signInAs(page, 'trainer');
    await page.goto(`/${locale.slice(0, 2)}/procedures`);
    await page.locator('vw-data-table a').first().waitFor();
    expect(await axeFindings(page)).toEqual([]);

    await page.locator('vw-data-table a').first().click();
    await page.locator('vw-procedure-view').waitFor();
    expect(await axeFindings(page)).toEqual([]);

    await page.goto(`/${locale.slice(0, 2)}/procedures/new`);
    await page.locator('vw-step-list button').first().click();
    await page.getByRole('menuitem').nth(2).click();
    await page.locator('vw-step-editor').waitFor();
    expect(await axeFindings(page)).toEqual([]);
    expect(await overflow(page)).toBeLessThanOrEqual(0);
    expect(complaints).toEqual([]);
    await context.close();
  });
});
