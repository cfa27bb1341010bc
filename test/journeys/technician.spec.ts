import type { Browser, Page } from 'playwright-core';
import sharp from 'sharp';
import { axeFindings, openBrowser, phone, signInAs, visit } from '@test/support/browser';
import { taskDueNow } from '@test/support/journey-task';

const walt = 'walt.brennan@lanternline.example';

describe('a technician on a phone', () => {
  let browser: Browser;
  let photo: Buffer;
  beforeAll(async () => {
    browser = await openBrowser();
    photo = await sharp({ create: { width: 900, height: 600, channels: 3, background: '#a63' } })
      .jpeg()
      .toBuffer();
  });
  afterAll(() => browser.close());

  const sheetOf = async (page: Page, taskId: string) => {
    await page.locator(`vw-stop-card a[href*="${taskId}"]`).click();
    await page.getByRole('button', { name: 'I have read the cautions' }).waitFor();
  };
  const answerAll = async (page: Page) => {
    for (const fieldset of await page.locator('vw-step-field fieldset').all()) {
      await fieldset.locator('label').first().click();
    }
    for (const number of await page.locator('vw-step-field input[inputmode=decimal]').all()) {
      await number.fill('350');
    }
    for (const file of await page.locator('vw-step-field input[type=file]').all()) {
      await file.setInputFiles({ name: 'seal.jpg', mimeType: 'image/jpeg', buffer: photo });
    }
  };

  it('does a task: cautions, a reading out of limit, a photo, closing and undo', async () => {
    const taskId = await taskDueNow('Pump seal at the drain slot', walt);
    const { page, context, complaints } = await visit(browser, { viewport: phone });
    await signInAs(page, 'technician');
    await page.waitForURL(/\/en\/today/);
    expect(await axeFindings(page)).toEqual([]);

    await sheetOf(page, taskId);
    expect(await page.locator('vw-caution').count()).toBeGreaterThan(1);
    expect(await page.locator('vw-step-field').count()).toBe(0);
    expect(await axeFindings(page)).toEqual([]);
    await page.getByRole('button', { name: 'I have read the cautions' }).click();

    await answerAll(page);
    const number = page.locator('vw-step-field', { has: page.locator('input[inputmode=decimal]') });
    await number.getByText('Limit', { exact: true }).first().waitFor();
    await number.getByText('Out of limit.').first().waitFor();
    await number
      .getByText(/Makes a finding: /)
      .first()
      .waitFor();

    await page.locator('vw-photo-strip img[src*="/thumbnail"]').waitFor();
    expect(await axeFindings(page)).toEqual([]);

    await page.reload();
    await number.first().waitFor();
    expect(await number.first().locator('input').inputValue()).toBe('350');
    expect(await page.locator('vw-photo-strip img').count()).toBe(1);

    await page.getByRole('button', { name: 'Close the task' }).click();
    await page.getByRole('heading', { name: 'Findings' }).waitFor();
    await page.locator('vw-closed-sheet a[href*="/findings/"]').first().waitFor();
    expect(await axeFindings(page)).toEqual([]);

    await page.getByRole('button', { name: 'Undo' }).click();
    await number.first().waitFor();
    expect(await number.first().locator('input').inputValue()).toBe('350');
    await page.getByText('Taken back', { exact: true }).waitFor();
    expect(complaints).toEqual([]);
    await context.close();
  });

  it('is led to what is missing, and says why a task could not be done', async () => {
    const taskId = await taskDueNow('Motor current and overload', walt);
    const { page, context, complaints } = await visit(browser, { viewport: phone, theme: 'dark' });
    await signInAs(page, 'technician');
    await sheetOf(page, taskId);
    await page.getByRole('button', { name: 'I have read the cautions' }).click();
    await page.getByRole('button', { name: 'Close the task' }).click();
    await page.getByText('This step needs an answer.').first().waitFor();
    await page.getByRole('button', { name: 'Could not be done' }).click();
    await page.getByRole('radio', { name: 'In use, could not be stopped' }).check();
    expect(await axeFindings(page)).toEqual([]);
    await page.getByRole('button', { name: 'Report it' }).click();
    await page.getByText('Last try:').waitFor();
    await page.goto('/en/today');
    await page.getByText('In use, could not be stopped').first().waitFor();
    expect(complaints).toEqual([]);
    await context.close();
  });

  it('loses nothing to a dead spot', async () => {
    const taskId = await taskDueNow('Pump seal at the drain slot', walt);
    const { page, context } = await visit(browser, { viewport: phone });
    await signInAs(page, 'technician');
    await sheetOf(page, taskId);
    await page.getByRole('button', { name: 'I have read the cautions' }).click();
    await answerAll(page);
    await page.locator('vw-photo-strip img[src*="/thumbnail"]').waitFor();
    await context.setOffline(true);
    await page.getByRole('button', { name: 'Close the task' }).click();
    await page
      .getByText(/Your answers are kept on this device/)
      .first()
      .waitFor();
    await context.setOffline(false);
    await page.getByRole('button', { name: 'Close the task' }).click();
    await page.getByRole('heading', { name: 'What was entered' }).waitFor();
    await context.close();
  });
});
