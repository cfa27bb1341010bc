import type { Browser, Page } from 'playwright-core';
import { axeFindings, openBrowser, phone, signInAs, visit } from '@test/support/browser';

const planner = 'regional facility manager';

/** The table, once it has answered what the address asks for. */
async function openTable(page: Page, query: string): Promise<void> {
  await page.goto(`/en/tasks?${query}`);
  await page.locator('tbody tr.row').first().waitFor();
}

describe('planning tasks', () => {
  let browser: Browser;
  beforeAll(async () => {
    browser = await openBrowser();
  });
  afterAll(() => browser.close());

  it('filters by address, and keeps the filters as a view', async () => {
    const { page, context, complaints } = await visit(browser);
    await signInAs(page, planner);
    await openTable(page, 'audience=technician');
    await page.getByRole('button', { name: 'overdue' }).click();
    await page.waitForURL(/state=open%2Cdue-soon|state=open,due-soon/);
    const words = await page.locator('tbody vw-state-word').allInnerTexts();
    expect(words.length).toBeGreaterThan(0);
    expect(words).not.toContain('overdue');

    const name = `Technicians ${Date.now()}`;
    await page.getByRole('button', { name: 'Views' }).click();
    await page.getByRole('menuitem', { name: 'Save this view…' }).click();
    await page.getByLabel('Name').fill(name);
    await page.getByRole('button', { name: 'Save', exact: true }).click();
    await page.getByRole('button', { name }).waitFor();

    await page.goto('/en/tasks');
    await page.getByRole('button', { name: 'Views' }).click();
    await page.getByRole('menuitem', { name }).click();
    await page.waitForURL(/audience=technician/);
    await page.getByRole('button', { name: 'overdue', pressed: false }).waitFor();
    expect(complaints).toEqual([]);
    await context.close();
  });

  it('assigns three tasks, defers one with a reason, and takes that back', async () => {
    const { page, context, complaints } = await visit(browser);
    await signInAs(page, planner);
    // Far ahead nothing stands on a published route, whose tasks could not be moved.
    const farAhead = 'audience=technician&state=planned&unassigned=yes&sort=-due';
    await openTable(page, farAhead);
    for (const row of [0, 1, 2]) {
      await page.locator('tbody tr.row').nth(row).getByRole('checkbox').check();
    }
    await page.getByText('3 tasks chosen').waitFor();
    await page.getByRole('button', { name: 'Assign', exact: true }).click();
    await page.getByRole('combobox', { name: 'Technician' }).last().click();
    await page.getByRole('option', { name: 'Walt Brennan' }).click();
    await page.getByRole('dialog').getByRole('button', { name: 'Assign' }).click();
    await page.getByText('3 tasks assigned.').last().waitFor();

    await openTable(page, farAhead);
    const first = page.locator('tbody tr.row').first();
    const link = first.locator('a.row-link');
    const address = (await link.getAttribute('href')) ?? '';
    await first.getByRole('checkbox').check();
    await page.getByRole('button', { name: 'Defer', exact: true }).click();
    const due = await taskDue(page, address);
    await page.getByLabel('New due day').fill(daysAfter(due, 7));
    await page.getByRole('dialog').getByRole('button', { name: 'Defer' }).click();
    await page.getByText('This is needed.').waitFor();
    await page.getByLabel('Reason').fill('The store is being painted.');
    await page.getByRole('dialog').getByRole('button', { name: 'Defer' }).click();
    await page.getByText('1 task deferred.').last().waitFor();
    expect(await taskDue(page, address)).toBe(daysAfter(due, 7));

    await page.getByRole('button', { name: 'Undo' }).click();
    await page.getByText('Taken back.').last().waitFor();
    expect(await taskDue(page, address)).toBe(due);
    expect(complaints).toEqual([]);
    await context.close();
  });

  it('moves over the board by arrow keys and opens a cell', async () => {
    const { page, context, complaints } = await visit(browser);
    await signInAs(page, planner);
    await page.goto('/en/board');
    const cell = (row: number, column: number) =>
      page.locator(`[data-row="${row}"][data-column="${column}"]`);
    await cell(0, 0).waitFor();
    await page.locator('td[tabindex="0"]').focus();
    await page.keyboard.press('Control+Home');
    expect(await focusedCell(page)).toEqual(['0', '0']);
    await page.keyboard.press('ArrowRight');
    await page.keyboard.press('ArrowDown');
    await page.keyboard.press('ArrowDown');
    expect(await focusedCell(page)).toEqual(['2', '1']);
    await page.keyboard.press('End');
    expect(await focusedCell(page)).toEqual(['2', '34']);
    expect(await page.locator('td[tabindex="0"]').count()).toBe(1);

    await page.keyboard.press('Enter');
    await page.getByRole('dialog').waitFor();
    await page.keyboard.press('Escape');
    await page.getByRole('dialog').waitFor({ state: 'detached' });
    expect(await focusedCell(page)).toEqual(['2', '34']);
    expect(complaints).toEqual([]);
    await context.close();
  });

  it('opens a day of the month, and keeps the filters from view to view', async () => {
    const { page, context } = await visit(browser);
    await signInAs(page, planner);
    await page.goto('/en/tasks/month?audience=technician');
    await page.getByRole('grid').waitFor();
    const busy = page.locator('[data-date]:has(.line)').first();
    const day = await busy.getAttribute('data-date');
    await busy.click();
    await page.waitForURL(new RegExp(`day=${day}`));
    await page.locator('vw-task-lines li').first().waitFor();

    const views = page.getByRole('navigation', { name: 'Views of the tasks' });
    await views.getByRole('link', { name: 'Board' }).click();
    await page.waitForURL(/\/board\?.*audience=technician/);
    await views.getByRole('link', { name: 'Table' }).click();
    await page.waitForURL(/\/tasks\?.*audience=technician/);
    await context.close();
  });

  it('says why a task is here', async () => {
    const { page, context } = await visit(browser);
    await signInAs(page, planner);
    await openTable(page, 'audience=technician');
    await page.locator('a.row-link').first().click();
    await page.getByRole('heading', { name: 'Why is this task here?' }).waitFor();
    await page.locator('vw-why-task p').first().waitFor();
    expect(await axeFindings(page)).toEqual([]);
    await context.close();
  });

  describe.each(['/tasks?pageSize=25', '/tasks/month', '/board?q=010'])('at %s', (path) => {
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

const focusedCell = (page: Page) =>
  page.evaluate(() => {
    const { row, column } = (document.activeElement as HTMLElement).dataset;
    return [row, column];
  });

/** The day on which the server says that the task behind a link is due. */
const taskDue = (page: Page, href: string): Promise<string> =>
  page.evaluate(async (id) => {
    const reply = await fetch(`/api/v1/tasks/${id}`);
    return ((await reply.json()) as { dueOn: string }).dueOn;
  }, href.split('/').at(-1)?.split('?')[0]);

function daysAfter(date: string, days: number): string {
  return new Date(Date.parse(`${date}T00:00:00Z`) + days * 86_400_000).toISOString().slice(0, 10);
}
