import type { Browser } from 'playwright-core';
import { axeFindings, openBrowser, phone, signInAs, visit } from '@test/support/browser';

const lastMonth = () => {
  const now = new Date();
  return new Date(Date.UTC(now.getUTCFullYear(), now.getUTCMonth() - 1, 1))
    .toISOString()
    .slice(0, 7);
};

describe('compliance', () => {
  let browser: Browser;
  beforeAll(async () => {
    browser = await openBrowser();
  });
  afterAll(() => browser.close());

  it('leads a facility manager from a rate to exactly the tasks that it is made of', async () => {
    const { page, context, complaints } = await visit(browser);
    await signInAs(page, 'regional facility manager');
    const month = lastMonth();
    await page.goto(`/en/compliance?from=${month}&to=${month}`);
    const row = page.locator('vw-data-table tbody tr').first();
    await row.locator('a.rate').waitFor();
    expect(await axeFindings(page)).toEqual([]);
    const counts = /of ([\d,]+)/.exec(await row.innerText())?.[1]?.replace(',', '');
    await row.locator('a.rate').click();
    await page.waitForURL(/\/tasks\?.*end=onTime/);
    await page.locator('mat-paginator').getByText(`of ${counts}`).waitFor();
    await page.goBack();
    await row.locator('a.rate').waitFor();
    expect(page.url()).toContain(`from=${month}`);
    expect(complaints).toEqual([]);
    await context.close();
  });

  it('narrows by months, grouping and filters, all kept in the address', async () => {
    const { page, context } = await visit(browser);
    await signInAs(page, 'regional facility manager');
    await page.goto('/en/compliance');
    await page.getByRole('button', { name: '12 months' }).click();
    await page.waitForURL(/from=/);
    await page.getByRole('combobox', { name: /^By\b/ }).selectOption({ label: 'Rule' });
    await page.waitForURL(/by=rule/);
    await page.getByRole('columnheader', { name: 'Window' }).waitFor();
    await page.getByRole('link', { name: 'Stores by month' }).click();
    await page.locator('vw-heat-table td').first().waitFor();
    expect(await page.locator('vw-heat-table thead th').count()).toBe(13);
    expect(await axeFindings(page)).toEqual([]);
    await page.reload();
    await page.locator('vw-heat-table td').first().waitFor();
    expect(await page.locator('vw-heat-table thead th').count()).toBe(13);
    await context.close();
  });

  it('shows a store’s manager one store, on a phone, in Spanish and in the dark', async () => {
    const { page, context } = await visit(browser, {
      viewport: phone,
      theme: 'dark',
      locale: 'es-US',
    });
    await signInAs(page, 'store manager');
    await page.goto('/es/compliance');
    await page.locator('a.rate').first().waitFor();
    expect(await page.locator('vw-data-table tbody tr').count()).toBe(1);
    expect(await page.locator('vw-data-table tbody').innerText()).toContain('0101');
    expect(await axeFindings(page)).toEqual([]);
    await context.close();
  });

  it('shows an administrator each letter and its state', async () => {
    const { page, context, complaints } = await visit(browser);
    await signInAs(page, 'administrator');
    await page.goto('/en/letters?kind=digest&state=sent');
    await page.locator('.row-link').first().waitFor();
    expect(await axeFindings(page)).toEqual([]);
    await page.locator('.row-link').first().click();
    const letter = page.frameLocator('iframe');
    await letter.getByText('What to decide').waitFor();
    // The letter runs no script, axe's neither; it is looked at on its own.
    await page.locator('iframe').evaluate((frame) => frame.remove());
    expect(await axeFindings(page)).toEqual([]);
    expect(complaints).toEqual([]);
    await context.close();
  });
});
