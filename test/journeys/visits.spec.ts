import type { Browser, Page } from 'playwright-core';
import { demoSignIns } from '@db/seeds/demo-sign-ins.mjs';
import { axeFindings, openBrowser, phone, signInAs, visit } from '@test/support/browser';

const technician = demoSignIns.find(({ role }) => role === 'technician')?.name ?? '';

/** The column of the demo technician. */
const column = (page: Page) =>
  page.locator('vw-route-column').filter({ has: page.getByRole('heading', { name: technician }) });

const stops = async (page: Page) =>
  (await column(page).locator('vw-visit-card .name').allInnerTexts()).map((text) => text.trim());

/** The technician's day as their own page is told it. */
async function today(page: Page): Promise<{ date: string; stops: string[] }> {
  const day = (await page.evaluate(async () => (await fetch('/api/v1/today')).json())) as {
    date: string;
    visits: { store: { number: string; name: string } }[];
  };
  return { date: day.date, stops: day.visits.map(({ store }) => `${store.number} ${store.name}`) };
}

/** Gives a store that waits, and is not on the day yet, to the technician. */
async function addOne(page: Page): Promise<void> {
  const there = await stops(page);
  const waiting = await page.locator('vw-unplanned-list .store .name').allInnerTexts();
  const index = waiting.findIndex((name) => !there.includes(name.trim()));
  const store = page.locator('vw-unplanned-list .store').nth(index);
  await store.getByRole('button', { name: /^Add to…/ }).click();
  await page.getByRole('menuitem', { name: technician }).click();
  await column(page).locator('vw-visit-card').nth(there.length).waitFor();
}

describe('visits', () => {
  let browser: Browser;
  beforeAll(async () => {
    browser = await openBrowser();
  });
  afterAll(() => browser.close());

  it('are planned by key, ordered nearest-next, published, and driven in that order', async () => {
    const driver = await visit(browser, { viewport: phone });
    await signInAs(driver.page, 'technician');
    const { page, context, complaints } = await visit(browser);
    await signInAs(page, 'regional facility manager');
    await page.goto(`/en/visits?on=${(await today(driver.page)).date}`);
    await column(page).waitFor();
    const before = (await stops(page)).length;
    const count = Math.max(before + 1, 3);
    await page.locator('vw-unplanned-list .store').first().waitFor();
    for (let next = before + 1; next <= count; next += 1) await addOne(page);

    const [first = '', second = '', ...rest] = await stops(page);
    await column(page)
      .getByRole('button', { name: /later$/ })
      .first()
      .click();
    await column(page).locator('vw-visit-card').nth(1).getByText(first, { exact: true }).waitFor();
    expect(await stops(page)).toEqual([second, first, ...rest]);
    const focused = () => page.evaluate(() => document.activeElement?.textContent?.trim() ?? '');
    expect(await focused()).toBe(`${first} later`);

    await column(page).getByRole('button', { name: 'Order nearest-next' }).click();
    await page
      .getByText(/nearest stop to the next|nearest-next already/)
      .first()
      .waitFor();
    await column(page)
      .getByRole('button', { name: /^Publish/ })
      .click();
    await column(page).getByText('published', { exact: true }).waitFor();
    expect(await axeFindings(page)).toEqual([]);
    expect((await today(driver.page)).stops).toEqual(await stops(page));

    await column(page)
      .getByRole('button', { name: /^More for/ })
      .last()
      .click();
    await page.getByRole('menuitem', { name: 'Take off this day' }).click();
    await column(page).getByText('changed since published').waitFor();
    await page.getByRole('button', { name: 'Undo' }).click();
    await column(page)
      .locator('vw-visit-card')
      .nth(count - 1)
      .waitFor();
    await column(page).getByRole('button', { name: 'Publish the changes' }).click();
    await column(page).getByText('published', { exact: true }).waitFor();
    expect(complaints).toEqual([]);
    await Promise.all([context.close(), driver.context.close()]);
  });

  it('tell a store who comes when', async () => {
    const { page, context, complaints } = await visit(browser, { viewport: phone });
    await signInAs(page, 'store manager');
    await page.goto('/en/visits');
    await page.waitForURL(/visits\/coming/);
    await page.getByRole('heading', { name: 'Who comes when' }).waitFor();
    expect(await axeFindings(page)).toEqual([]);
    expect(complaints).toEqual([]);
    await context.close();
  });

  it.each([
    ['light', 'en-US', phone],
    ['dark', 'es-US', undefined],
  ] as const)('have a desk without findings in %s, %s', async (theme, locale, viewport) => {
    const { page, context } = await visit(browser, {
      theme,
      locale,
      ...(viewport ? { viewport } : {}),
    });
    await signInAs(page, 'regional facility manager');
    await page.goto('/visits');
    await page.locator('vw-route-column').first().waitFor();
    expect(await axeFindings(page)).toEqual([]);
    await context.close();
  });
});
