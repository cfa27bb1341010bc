import type { Browser, Page } from 'playwright-core';
import { axeFindings, desk, openBrowser, phone, signInAs, visit } from '@test/support/browser';

/** Chooses an option of a select by the name of its field. */
async function choose(page: Page, field: string, option: string): Promise<void> {
  await page.getByRole('combobox', { name: field }).click();
  await page.getByRole('option', { name: option, exact: true }).click();
  await page.getByRole('listbox').waitFor({ state: 'detached' });
}

const field = (page: Page, name: string) => page.getByRole('textbox', { name, exact: true });
const save = (page: Page) => page.getByRole('button', { name: 'Save', exact: true }).click();

/** How far the page reaches beyond the right edge of the window, in CSS pixels. */
const overflow = (page: Page): Promise<number> =>
  page.evaluate('document.documentElement.scrollWidth - window.innerWidth');

/** Adds a store as the facility manager and waits for its page. */
async function addStore(page: Page, number: string, name: string): Promise<void> {
  await page.goto('/en/fleet/stores/new');
  await field(page, 'Number').fill(number);
  await field(page, 'Name').fill(name);
  await choose(page, 'Chain', 'Peck & Ember');
  await choose(page, 'Region', 'Upper Ohio');
  await field(page, 'ZIP code').fill('43215');
  await save(page);
  await page.getByRole('heading', { name: `${number} ${name}` }).waitFor();
}

describe('the fleet', () => {
  let browser: Browser;
  beforeAll(async () => {
    browser = await openBrowser();
  });
  afterAll(() => browser.close());

  it('tells what a new store lacks and what is taken, and keeps the rest', async () => {
    const { page, context, complaints } = await visit(browser);
    await signInAs(page, 'regional facility manager');
    await page.goto('/en/fleet/stores');
    await page.getByRole('link', { name: 'New store' }).click();
    await save(page);
    await page.getByRole('alert').getByText('Name: This is needed.').waitFor();
    expect(await axeFindings(page)).toEqual([]);

    await field(page, 'Number').fill('0101');
    await field(page, 'Name').fill('Brass Kettle Ln');
    await choose(page, 'Chain', 'Peck & Ember');
    await choose(page, 'Region', 'Upper Ohio');
    await field(page, 'ZIP code').fill('43215');
    await page.getByText('This is Columbus, OH').waitFor();
    await save(page);
    await page
      .getByRole('alert')
      .getByText('Number: Another store of this chain has this number.')
      .waitFor();
    expect(await field(page, 'Name').inputValue()).toBe('Brass Kettle Ln');

    await field(page, 'Number').fill('9101');
    await save(page);
    await page.getByRole('heading', { name: '9101 Brass Kettle Ln' }).waitFor();
    await page.getByText('Columbus, OH 43215').waitFor();
    await page.getByText('America/New_York').waitFor();
    await page.getByRole('link', { name: 'Marguerite Hale' }).waitFor();
    expect(complaints).toEqual([]);
    await context.close();
  });

  it('adds a unit with its motor, corrects it, replaces the motor, and undoes a retirement', async () => {
    const { page, context, complaints } = await visit(browser);
    await signInAs(page, 'regional facility manager');
    await addStore(page, '9102', 'Copper Spoon Way');
    await page.getByRole('link', { name: 'Add a unit' }).click();
    await field(page, 'Tag').fill('F-7');
    await page.getByRole('spinbutton', { name: 'Vats' }).fill('40');
    await page.getByRole('button', { name: 'Motor' }).click();
    await field(page, 'Serial number').fill('MO-77');
    await page.getByLabel('Fitted on').fill('2025-02-03');
    await page.getByRole('spinbutton', { name: 'Volts' }).fill('115');
    await save(page);
    await page.getByRole('alert').getByText('Vats: This must be 12 or less.').waitFor();
    await page.getByRole('spinbutton', { name: 'Vats' }).fill('4');
    await save(page);
    await page.getByRole('heading', { name: 'F-7', exact: true }).waitFor();
    await page.getByText('115 V').waitFor();
    expect(await axeFindings(page)).toEqual([]);

    await page.getByRole('button', { name: 'Replace' }).click();
    await choose(page, 'Cause', 'Motor winding');
    await field(page, 'Serial number').fill('MO-78');
    expect(await axeFindings(page)).toEqual([]);
    await page.getByRole('dialog').getByRole('button', { name: 'Replace' }).click();
    await page.getByRole('dialog').waitFor({ state: 'detached' });
    await page.getByRole('list', { name: 'Life of the unit' }).getByText('MO-78').waitFor();
    await page.getByText('Parts that came off (1)').waitFor();

    await page.getByRole('button', { name: 'Retire' }).click();
    await page.getByText('Nothing is scheduled for it').waitFor();
    await page.getByRole('button', { name: 'Undo' }).click();
    await page.getByRole('link', { name: 'Edit' }).waitFor();
    expect(await page.getByText('Nothing is scheduled for it').count()).toBe(0);
    expect(complaints).toEqual([]);
    await context.close();
  });

  it('sets what two people wrote side by side and lets one choose', async () => {
    const { page, context } = await visit(browser);
    await signInAs(page, 'regional facility manager');
    await addStore(page, '9103', 'Tin Ladle Ct');
    await page.getByRole('link', { name: 'Edit' }).click();
    await field(page, 'Phone').fill('555-0142');
    const other = await context.newPage();
    await other.goto(page.url());
    await field(other, 'Phone').fill('555-0199');
    await save(other);
    await other.getByRole('link', { name: '555-0199' }).waitFor();

    await save(page);
    const conflict = page.getByRole('alert').filter({ hasText: 'Somebody else saved this' });
    await conflict.getByRole('row', { name: /Phone.*555-0199.*555-0142/ }).waitFor();
    await conflict.getByRole('button', { name: 'Save mine over it' }).click();
    await page.getByRole('link', { name: '555-0142' }).waitFor();
    await context.close();
  });

  it('keeps filters and order in the address', async () => {
    const { page, context } = await visit(browser);
    await signInAs(page, 'regional facility manager');
    await page.goto('/en/fleet/units');
    await page.getByRole('combobox', { name: 'Kind' }).selectOption('Portable filter');
    await page.getByRole('button', { name: 'Vats' }).click();
    await page.waitForURL(/kind=portable.*sort=vats/);
    await page.reload();
    const cells = page.getByRole('cell', { name: 'Portable filter' });
    await cells.first().waitFor();
    expect(await page.getByRole('cell', { name: 'Built-in filter' }).count()).toBe(0);
    await context.close();
  });

  it('takes in the good rows of a spreadsheet and says what is wrong with the other', async () => {
    const { page, context, complaints } = await visit(browser, { viewport: phone });
    await signInAs(page, 'administrator');
    await page.goto('/en/fleet/imports/new');
    await page.locator('input[type=file]').setInputFiles({
      name: 'fryers.csv',
      mimeType: 'text/csv',
      buffer: Buffer.from(
        [
          'Chain,Region,Site number,Site name,ZIP,Fryer,Vat count,Remark',
          'Peck & Ember,Upper Ohio,9201,Slate Roof Rd,43215,F-1,3,none',
          'Peck & Ember,Upper Ohio,9201,Slate Roof Rd,43215,F-2,two,none',
          'Peck & Ember,Upper Ohio,9202,Gravel Pit Rd,44101,F-1,2,none',
        ].join('\n'),
      ),
    });
    await page.getByRole('button', { name: 'Send and see the columns' }).click();
    await page.getByRole('heading', { name: 'What each column holds' }).waitFor();
    const remark = page.getByRole('combobox', { name: 'Remark' });
    expect(await remark.inputValue()).toBe('');
    expect(await page.getByRole('combobox', { name: 'Vat count' }).inputValue()).toBe('vats');
    expect([await axeFindings(page), await overflow(page)]).toEqual([[], 0]);

    await page.getByRole('combobox', { name: 'Fryer' }).selectOption('passed over');
    await page.getByText('No column holds: Unit').waitFor();
    await page.getByRole('combobox', { name: 'Fryer' }).selectOption('Unit');
    await page.getByRole('button', { name: 'Look the rows over' }).click();
    await page.getByText('1 of 3 rows have problems').waitFor();
    await page.getByText('“two” is not a number.').waitFor();
    expect([await axeFindings(page), await overflow(page)]).toEqual([[], 0]);

    await page.reload();
    await page.getByText('1 of 3 rows have problems').waitFor();
    expect(await page.getByRole('radio', { name: 'All 3 rows or nothing' }).isDisabled()).toBe(
      true,
    );
    await page.getByRole('button', { name: 'Take in 2 rows' }).click();
    await page.getByText('Rows left out: 1.').waitFor();
    expect([await axeFindings(page), await overflow(page)]).toEqual([[], 0]);

    await page.goto('/en/fleet/units?q=9201');
    await page.getByRole('link', { name: 'F-1' }).waitFor();
    expect(await page.getByRole('link', { name: 'F-2' }).count()).toBe(0);
    expect(complaints).toEqual([]);
    await context.close();
  });

  // Few rows say as much as many, and are looked over sooner.
  const lists = ['stores?pageSize=5', 'units?pageSize=5', 'chains'];
  const pages = ['stores/:store', 'stores/:store/edit', 'units/:unit', 'units/new'];
  it.each([
    ['light', phone, 'en', lists],
    ['light', phone, 'en', pages],
    ['dark', desk, 'en', ['parts?pageSize=5', 'regions']],
    ['dark', desk, 'en', pages],
    ['dark', phone, 'es', pages],
  ] as const)(
    'has pages without findings: %s, %o, %s, %j',
    async (theme, viewport, lang, paths) => {
      const { page, context } = await visit(browser, { theme, viewport, locale: `${lang}-US` });
      await signInAs(page, 'regional facility manager');
      const first = async (what: string): Promise<string> =>
        page.evaluate(
          async (path) => (await (await fetch(`/api/v1/${path}?pageSize=1`)).json()).rows[0].id,
          what,
        );
      const ids = { ':store': await first('stores'), ':unit': await first('units') };
      for (const path of paths) {
        const address = path.replace(/:\w+/, (name) => ids[name as keyof typeof ids]);
        await page.goto(`/${lang}/fleet/${address}`);
        await page.getByRole('heading', { level: 1 }).first().waitFor();
        await page.waitForLoadState('networkidle');
        expect([path, await axeFindings(page), await overflow(page)]).toEqual([path, [], 0]);
      }
      await context.close();
    },
  );
});
