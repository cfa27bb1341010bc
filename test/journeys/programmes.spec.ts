import type { Browser, Page } from 'playwright-core';
import { axeFindings, desk, openBrowser, phone, signInAs, visit } from '@test/support/browser';

/** Chooses an option of a select by the name of its field. */
async function choose(page: Page, field: string, option: string | RegExp): Promise<void> {
  await page.getByRole('combobox', { name: field, exact: true }).click();
  await page.getByRole('option', { name: option }).first().click();
  await page.getByRole('listbox').waitFor({ state: 'detached' });
}

/** How far the page reaches beyond the right edge of the window, in CSS pixels. */
const overflow = (page: Page): Promise<number> =>
  page.evaluate('document.documentElement.scrollWidth - window.innerWidth');

describe('programmes', () => {
  let browser: Browser;
  beforeAll(async () => {
    browser = await openBrowser();
  });
  afterAll(() => browser.close());

  it('lets a facility manager add a rule in words, be told what is wrong with its text, and enrol a region', async () => {
    const { page, context, complaints } = await visit(browser);
    await signInAs(page, 'regional facility manager');

    await page.goto('/en/programmes');
    await page.getByRole('button', { name: 'New programme' }).click();
    await page.getByLabel('Name').fill('Winter watch');
    await page.getByLabel('What it is for').fill('What cold hoses and thick oil ask for.');
    await page.getByRole('button', { name: 'Save' }).click();
    await page.getByRole('heading', { level: 1, name: 'Winter watch' }).waitFor();

    await page.getByRole('link', { name: 'Add a rule' }).click();
    await page.getByLabel('Name of the rule').fill('Hoses, monthly');
    await choose(page, 'Procedure', /hoses/i);
    await page.getByLabel('At, on the store’s clock').fill('07:30');
    await choose(page, 'On', 'a weekday of the month');
    await choose(page, 'Which', 'second');
    await choose(page, 'Weekday', 'Tuesday');
    await choose(page, 'At a store in', /Phoenix/);
    const told = page.locator('vw-next-dates');
    await told.getByText('Every month on the second Tuesday at 07:30.').waitFor();
    const dates = await told.getByRole('listitem').allTextContents();
    expect(dates).toHaveLength(12);
    for (const date of dates) expect(date).toMatch(/^Tue, .* 7:30 AM MST$/);

    await page.getByRole('button', { name: 'Write it as RRULE text' }).click();
    const text = page.getByLabel('RRULE, one on a line');
    expect(await text.inputValue()).toBe('FREQ=MONTHLY;BYDAY=2TU');
    await text.fill('FREQ=MONTHLY;BYMONTHDAY=32');
    await told.getByText('BYMONTHDAY: 32 is outside').waitFor();
    await page.getByRole('button', { name: 'Save' }).click();
    const summary = page.getByRole('alert').filter({ hasText: 'Please look at this again' });
    await summary.getByRole('link', { name: /How often: BYMONTHDAY/ }).click();
    await text.and(page.locator(':focus')).waitFor();
    expect(await text.inputValue()).toBe('FREQ=MONTHLY;BYMONTHDAY=32');
    expect(await page.getByLabel('Name of the rule').inputValue()).toBe('Hoses, monthly');

    await text.fill('FREQ=MONTHLY;BYDAY=2TU,4TU');
    await told.getByText('Every month on the second Tuesday and the fourth Tuesday').waitFor();
    await page.getByRole('button', { name: 'Save' }).click();
    await page.getByRole('link', { name: 'Hoses, monthly' }).waitFor();
    expect(new URL(page.url()).pathname).toMatch(/^\/en\/programmes\/[0-9a-f-]{36}$/);

    await page.getByRole('button', { name: 'Enrol' }).click();
    await page.getByLabel('Which one').click();
    await page.getByRole('option', { name: /Upper Ohio/ }).click();
    await page.getByText(/^Reaches [1-9]\d* stores, [1-9]\d* units$/).waitFor();
    await page.getByRole('button', { name: 'Save' }).click();
    const enrolled = page.getByRole('listitem').filter({ hasText: 'Region ·' });
    expect(await enrolled.textContent()).toMatch(/Upper Ohio.*[1-9]\d* stores, [1-9]\d* units/s);
    await page.getByText(/Technician · each unit · [1-9]\d* stores, [1-9]\d* units/).waitFor();

    await enrolled.getByRole('button', { name: /^Remove/ }).click();
    await page.getByText('Nothing is enrolled yet').waitFor();
    await page.getByRole('button', { name: 'Undo' }).click();
    await enrolled.waitFor();
    expect(complaints).toEqual([]);
    await context.close();
  });

  it('keeps each revision of a rule and asks before unsaved work is left', async () => {
    const { page, context, complaints } = await visit(browser);
    await signInAs(page, 'administrator');
    await page.goto('/en/programmes');
    await page.getByRole('link', { name: 'Filter care' }).click();
    await page.getByRole('link', { name: 'Pump cover off, quarterly' }).first().click();
    const rank = page.getByLabel('Rank');
    const before = Number(await rank.inputValue());
    await rank.fill(String(before + 1));

    await page.getByRole('link', { name: 'Filter care' }).click();
    const question = page.getByRole('alertdialog', { name: 'Leave without saving?' });
    await question.getByRole('button', { name: 'Stay here' }).click();
    expect(await rank.inputValue()).toBe(String(before + 1));

    await page.getByRole('button', { name: 'Save' }).click();
    const preview = page.getByRole('dialog', { name: 'What this changes' });
    await preview.getByText('withdrawn', { exact: true }).waitFor();
    expect(await preview.locator('ins').allTextContents()).toEqual([String(before + 1)]);
    await preview.getByRole('button', { name: 'Save as revision 2' }).click();
    await page.getByRole('heading', { name: 'Revision 2 in force' }).waitFor();
    const revision = page.locator('vw-rule-history li').first();
    expect(await revision.locator('del').allTextContents()).toEqual([String(before)]);
    expect(await revision.locator('ins').allTextContents()).toEqual([String(before + 1)]);

    await page.getByRole('button', { name: 'Retire' }).click();
    await page.getByText('This rule is retired: it makes no more tasks.').waitFor();
    await page.getByRole('button', { name: 'Undo' }).click();
    await page.getByText('This rule is retired').waitFor({ state: 'detached' });
    expect(complaints).toEqual([]);
    await context.close();
  });

  it.each([
    ['light', 'en-US', desk],
    ['dark', 'es-US', desk],
    ['light', 'es-US', phone],
    ['dark', 'en-US', phone],
  ] as const)('has pages without findings in %s, %s, %j', async (theme, locale, viewport) => {
    const { page, context, complaints } = await visit(browser, { theme, locale, viewport });
    await signInAs(page, 'administrator');
    const language = locale.slice(0, 2);
    await page.goto(`/${language}/programmes`);
    await page.getByRole('link', { name: 'Filter care' }).waitFor();
    expect(await axeFindings(page)).toEqual([]);

    await page.getByRole('link', { name: 'Filter care' }).click();
    await page.locator('vw-rule-card').first().waitFor();
    expect(await axeFindings(page)).toEqual([]);

    await page.locator('vw-rule-card h3 a').first().click();
    await page.locator('vw-rule-history li').first().waitFor();
    expect(await axeFindings(page)).toEqual([]);

    await page.getByRole('button', { name: /RRULE/ }).click();
    await page.locator('#field-recurrence').fill('FREQ=NEVER');
    await page.locator('vw-next-dates').getByText('FREQ').waitFor();
    await page.locator('button[type=submit]').click();
    await page.getByRole('alert').first().waitFor();
    expect(await axeFindings(page)).toEqual([]);
    expect(await overflow(page)).toBeLessThanOrEqual(0);
    expect(complaints).toEqual([]);
    await context.close();
  });
});
