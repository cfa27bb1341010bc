import type { Browser, Locator } from 'playwright-core';
import { axeFindings, openBrowser, phone, signInAs, visit } from '@test/support/browser';
import { taskDueNow } from '@test/support/journey-task';

describe('a store manager on a phone', () => {
  let browser: Browser;
  beforeAll(async () => {
    browser = await openBrowser();
  });
  afterAll(() => browser.close());

  it.each([
    ['light', 'en-US', /^I have read this$/, /^Yes to the/, /^Acknowledge/, /acknowledged\./],
    ['dark', 'es-US', /^He leído esto$/, /^Sí a las/, /^Confirmar/, /confirmadas?\./],
  ] as const)(
    'acknowledges a check in under ten touches (%s, %s)',
    async (theme, locale, read, yes, acknowledge, told) => {
      const taskId = await taskDueNow('Filter paper, each shift');
      const { page, context, complaints } = await visit(browser, {
        viewport: phone,
        theme,
        locale,
      });
      await signInAs(page, 'store manager');
      await page.waitForURL(/\/shift/);
      expect(await axeFindings(page)).toEqual([]);
      let touches = 0;
      const touch = async (what: Locator) => {
        const box = await what.boundingBox();
        expect(box?.height).toBeGreaterThanOrEqual(44);
        await what.click();
        touches += 1;
      };
      await touch(page.getByRole('button', { name: read }));
      const card = page.locator('vw-check-card', { has: page.locator(`[id^="step-${taskId}"]`) });
      expect(await axeFindings(page)).toEqual([]);
      await touch(card.getByRole('button', { name: yes }));
      for (const choice of await card.locator('.stack').all()) {
        await touch(choice.locator('label').first());
      }
      await touch(page.getByRole('button', { name: acknowledge }));
      await page.getByText(told).first().waitFor();
      expect(touches).toBeLessThan(10);
      await page.locator(`vw-done-today a[href*="${taskId}"]`).waitFor();
      expect(complaints).toEqual([]);
      await context.close();
    },
  );

  it('says why a check could not be done', async () => {
    const taskId = await taskDueNow('Filter paper, each shift');
    const { page, context } = await visit(browser, { viewport: phone });
    await signInAs(page, 'store manager');
    await page.getByRole('button', { name: 'I have read this' }).click();
    const card = page.locator('vw-check-card', { has: page.locator(`[id^="step-${taskId}"]`) });
    await card.getByRole('button', { name: /^Could not be done/ }).click();
    await page.getByRole('radio', { name: 'The unit is out of service' }).check();
    await page.getByRole('button', { name: 'Report it' }).click();
    await page.getByText('Whoever plans your store sees it.').first().waitFor();
    await page.getByText('The unit is out of service').first().waitFor();
    await context.close();
  });
});
