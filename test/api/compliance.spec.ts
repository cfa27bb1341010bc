import { rollUpCompliance } from '@jobs/compliance/roll-up';
import { countWindows, type CountedTask } from '@shared/compliance/window-end';
import {
  type Fleet,
  makeFleet,
  makeOrganisation,
  makePerson,
} from '@test/factories/organisation-factory';
import { makeWork } from '@test/factories/task-factory';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';

const HOUR = 3_600_000;

describe('compliance', () => {
  let app: TestApp;
  let organisationId: string;
  let north: Fleet;
  let south: Fleet;
  let weekly: Awaited<ReturnType<typeof makeWork>>;
  let daily: Awaited<ReturnType<typeof makeWork>>;
  let regional: Browser;
  let serial = 0;

  const now = new Date('2026-07-02T12:00:00Z');

  /** A task whose window closes at the end of the given day in Chicago. */
  const closing = (
    work: typeof weekly,
    day: string,
    outcome: 'onTime' | 'late' | 'notDone' | 'excused' | 'covered',
    row: object = {},
  ) => {
    const closesAt = Date.parse(`${day}T05:00:00Z`) + 24 * HOUR;
    const at = (hours: number) => new Date(closesAt + hours * HOUR);
    const ends = {
      onTime: { outcome: 'done', outcome_at: at(-0.001) },
      // The window's end is already outside it.
      late: { outcome: 'done', outcome_at: at(0) },
      notDone: {},
      excused: { outcome: 'excused', outcome_at: at(-9) },
      covered: { outcome: 'covered', outcome_at: at(-9) },
    };
    serial += 1;
    return work.makeTask({
      occurs_local: `${day}T09:00:${String(serial % 60).padStart(2, '0')}`,
      opens_at: at(-24),
      due_soon_at: at(-24),
      due_at: at(-12),
      closes_at: at(0),
      lapses_at: at(48),
      due_on: day,
      closes_on: day,
      ...ends[outcome],
      ...row,
    });
  };
  const rollUp = (at = now) => rollUpCompliance(app.services, at);
  const table = (browser: Browser, query: string) =>
    browser.get(`/compliance?${query}`).expect(200);
  const markStale = () =>
    app.db.owner.query(
      `INSERT INTO stale_days (organisation_id, store_id, day) VALUES ($1, $2, '2025-03-10')`,
      { bind: [organisationId, north.storeId] },
    );
  type Named = { name: string };

  beforeAll(async () => {
    app = await testApp();
    organisationId = await makeOrganisation(app.db);
    north = await makeFleet(app.db, { organisationId });
    const { chainId } = north;
    south = await makeFleet(app.db, { organisationId, chainId });
    weekly = await makeWork(app.db, north);
    daily = await makeWork(app.db, south, 'store');
    const person = await makePerson(app.db, organisationId, 'regional-facility-manager');
    regional = await app.browser().signIn(person.email);
    // North in June: 3 of 5 on time, one excused, one covered. In May: 1 of 2.
    for (const day of ['01', '02', '30']) await closing(weekly, `2026-06-${day}`, 'onTime');
    await closing(weekly, '2026-06-04', 'late');
    await closing(weekly, '2026-06-05', 'notDone');
    await closing(weekly, '2026-06-06', 'excused');
    await closing(weekly, '2026-06-07', 'covered');
    await closing(weekly, '2026-05-31', 'onTime');
    await closing(weekly, '2026-05-01', 'notDone');
    // South in June: 1 of 1; in April: 0 of 1.
    await closing(daily, '2026-06-15', 'onTime');
    await closing(daily, '2026-04-15', 'notDone');
    // Closes after "now": counts nowhere yet.
    await closing(daily, '2026-07-02', 'onTime');
    await rollUp();
  });
  afterAll(() => app.close());

  it('says the rate of each store, what it is made of, and the change against the month before', async () => {
    const { body } = await table(regional, 'from=2026-06&to=2026-06&by=store&sort=rate');
    expect(body.total).toBe(2);
    expect(body.rows[0]).toMatchObject({
      id: north.storeId,
      counts: { onTime: 3, late: 1, notDone: 1, excused: 1, covered: 1 },
      rate: 0.6,
      previousCounts: { onTime: 1, late: 0, notDone: 1, excused: 0, covered: 0 },
      previousRate: 0.5,
      change: 10,
    });
    expect(body.rows[1]).toMatchObject({
      id: south.storeId,
      rate: 1,
      previousRate: null,
      change: null,
    });
    expect(body.totals).toMatchObject({ rate: 4 / 6, previousRate: 0.5, change: 16.7 });
    expect(body.countedOn).toBe('2026-06-30');
  });

  it('compares a range of months with as many months just before', async () => {
    const { body } = await table(regional, 'from=2026-05&to=2026-06&by=store&sort=-rate');
    const [first, second] = body.rows;
    expect(first).toMatchObject({ id: south.storeId, rate: 1, previousRate: 0, change: 100 });
    expect(second).toMatchObject({ id: north.storeId, rate: 4 / 7, previousRate: null });
  });

  it('groups by region, chain and rule, and gives a rule’s window with its rate', async () => {
    const by = async (group: string) =>
      (await table(regional, `from=2026-06&to=2026-06&by=${group}&sort=name`)).body;
    expect((await by('region')).rows.map((it: { id: string }) => it.id).sort()).toEqual(
      [north.regionId, south.regionId].sort(),
    );
    const chains = await by('chain');
    expect(chains.rows).toHaveLength(1);
    expect(chains.rows[0]).toMatchObject({ id: north.chainId, rate: 4 / 6, number: null });
    const rules = await by('rule');
    const ofNorth = rules.rows.find((it: { id: string }) => it.id === weekly.ruleId);
    expect(ofNorth).toMatchObject({
      rate: 0.6,
      window: { kind: 'days', before: 2, after: 2, late: 3, dueSoon: 1 },
    });
  });

  it('sorts by what is shown and keeps rows without a rate at the end', async () => {
    const ids = async (sort: string) =>
      (await table(regional, `from=2026-06&to=2026-06&sort=${sort}`)).body.rows.map(
        (it: { id: string }) => it.id,
      );
    expect(await ids('-rate')).toEqual([south.storeId, north.storeId]);
    expect(await ids('change')).toEqual([north.storeId, south.storeId]);
    expect(await ids('-change')).toEqual([north.storeId, south.storeId]);
    expect(await ids('-notDone')).toEqual([north.storeId, south.storeId]);
    expect(await ids('notDone')).toEqual([south.storeId, north.storeId]);
    expect(await ids('-name')).toEqual([south.storeId, north.storeId]);
  });

  it('filters by place, rule, audience and name, and pages', async () => {
    const total = async (query: string) =>
      (await table(regional, `from=2026-06&to=2026-06&${query}`)).body.total;
    expect(await total(`store=${south.storeId}`)).toBe(1);
    expect(await total(`region=${north.regionId}`)).toBe(1);
    expect(await total(`chain=${north.chainId}`)).toBe(2);
    expect(await total(`rule=${daily.ruleId}`)).toBe(1);
    expect(await total('audience=store')).toBe(1);
    expect(await total('q=no%20such%20store')).toBe(0);
    expect(await total('q=%25')).toBe(0);
    const { body } = await table(regional, 'from=2026-06&to=2026-06&sort=name&page=2&pageSize=1');
    expect(body).toMatchObject({ total: 2, page: 2, rows: [{ id: south.storeId }] });
  });

  it('draws stores by month, empty months too', async () => {
    const { body } = await regional.get('/compliance/picture?from=2026-04&to=2026-06').expect(200);
    expect(body.months).toEqual(['2026-04', '2026-05', '2026-06']);
    expect(
      body.rows.map((row: { cells: { rate: number }[] }) => row.cells.map((c) => c.rate)),
    ).toEqual([
      [null, 0.5, 0.6],
      [0, null, 1],
    ]);
    expect(body.rows[0].rate).toBeCloseTo(4 / 7, 10);
    const second = await regional
      .get('/compliance/picture?from=2026-04&to=2026-06&page=2&pageSize=1')
      .expect(200);
    expect(second.body).toMatchObject({ total: 2, rows: [{ storeId: south.storeId }] });
  });

  it('agrees with the pure rule on many tasks', async () => {
    const fleet = await makeFleet(app.db);
    const work = await makeWork(app.db, fleet);
    const outcomes = ['none', 'done', 'excused', 'covered'] as const;
    const tasks: CountedTask[] = [];
    for (let n = 0; n < 120; n += 1) {
      const closesAt = Date.parse('2026-06-20T05:00:00Z') + n * 3 * HOUR;
      const outcome = outcomes[(n * 7) % 4] as (typeof outcomes)[number];
      const outcomeAt = outcome === 'none' ? null : closesAt + (((n * 11) % 9) - 4) * HOUR;
      tasks.push({ outcome, outcomeAt, closesAt });
      const at = new Date(closesAt);
      await work.makeTask({
        occurs_local: `2026-06-10T${String(n % 24).padStart(2, '0')}:${String(n % 60).padStart(2, '0')}:${String(Math.floor(n / 60))}1`,
        opens_at: '2026-06-08T05:00:00Z',
        due_soon_at: '2026-06-08T05:00:00Z',
        due_at: '2026-06-10T14:00:00Z',
        closes_at: at,
        lapses_at: at,
        closes_on: new Date(closesAt - 5 * HOUR - 1).toISOString().slice(0, 10),
        outcome,
        outcome_at: outcomeAt === null ? null : new Date(outcomeAt),
      });
    }
    await rollUp();
    const reader = await makePerson(app.db, fleet.organisationId, 'account-owner');
    const browser = await app.browser().signIn(reader.email);
    const { body } = await table(browser, 'from=2026-06&to=2026-07');
    const expected = countWindows(tasks, now.getTime());
    for (const count of Object.values(expected)) expect(count).toBeGreaterThan(3);
    expect(body.totals.counts).toEqual(expected);
  });

  it('names every filter that it cannot use', async () => {
    const fields = async (query: string) =>
      (await regional.get(`/compliance?${query}`).expect(422)).body.errors.map(
        (it: { field: string }) => it.field,
      );
    expect(await fields('from=2026-6&to=2026-06')).toEqual(['from']);
    expect(await fields('from=2026-07&to=2026-06')).toEqual(['to']);
    expect(await fields('from=2020-01&to=2026-06')).toEqual(['to']);
    expect((await fields('store=1&by=moon')).sort()).toEqual(['by', 'from', 'store', 'to']);
    await regional.get('/compliance/picture?from=2026-07&to=2026-06').expect(422);
  });

  it('offers filters by name, and the name of the store that was asked for', async () => {
    const { body } = await regional.get(`/compliance/filters?store=${north.storeId}`).expect(200);
    expect(body.chains.map((it: { id: string }) => it.id)).toEqual([north.chainId]);
    expect(body.regions).toHaveLength(2);
    expect(body.rules.map(({ name }: Named) => name)).toHaveLength(2);
    expect(body.store.id).toBe(north.storeId);
  });

  it('gives the table away as a file, in the order and the language of its reader', async () => {
    const file = await regional
      .get('/compliance/export?from=2026-06&to=2026-06&sort=rate&format=csv')
      .expect(200);
    const [head, first, second, ...rest] = file.text.replace(/^\ufeff/, '').split('\r\n');
    expect(head).toMatch(/^Number,Store,"On-time rate","Change in points","On time"/);
    expect(first).toContain(',0.6,10,3,1,1,5,1,1,0.5,');
    expect(second).toContain(',1,,1,0,0,1,0,0,,');
    expect(rest).toEqual(['']);
    expect(file.headers['content-disposition']).toMatch(/compliance-.*\.csv"$/);
    await regional.get('/compliance/export?from=2026-06&to=2026-06&format=doc').expect(422);
  });

  it('shows a store’s manager the own store only, whatever is asked', async () => {
    const scope = { kind: 'store', id: south.storeId } as const;
    const person = await makePerson(app.db, organisationId, 'store-manager', scope);
    const manager = await app.browser().signIn(person.email);
    const all = await table(manager, 'from=2026-06&to=2026-06');
    expect(all.body.rows.map((it: { id: string }) => it.id)).toEqual([south.storeId]);
    expect(all.body.totals.rate).toBe(1);
    const other = await table(manager, `from=2026-06&to=2026-06&store=${north.storeId}`);
    expect(other.body).toMatchObject({ total: 0, totals: { rate: null } });
    const picture = await manager.get('/compliance/picture?from=2026-06&to=2026-06').expect(200);
    expect(picture.body.total).toBe(1);
    const filters = await manager.get(`/compliance/filters?store=${north.storeId}`).expect(200);
    expect(filters.body.store).toBeNull();
    expect(filters.body.rules.map(({ id }: { id: string }) => id)).toEqual([daily.ruleId]);
  });

  it('is closed to technicians, and empty to another organisation', async () => {
    const technician = await makePerson(app.db, organisationId, 'technician');
    const browser = await app.browser().signIn(technician.email);
    for (const path of ['', '/picture']) {
      await browser.get(`/compliance${path}?from=2026-06&to=2026-06`).expect(403);
    }
    await browser.get('/compliance/filters').expect(403);
    await browser.get('/compliance/export?from=2026-06&to=2026-06&format=csv').expect(403);
    const foreign = await makePerson(app.db, await makeOrganisation(app.db), 'account-owner');
    const stranger = await app.browser().signIn(foreign.email);
    const { body } = await table(stranger, 'from=2026-06&to=2026-06');
    expect(body).toMatchObject({ total: 0, countedOn: null, totals: { rate: null } });
  });

  it('counts a day again after a task of it was changed, and only then', async () => {
    const task = await closing(weekly, '2025-03-10', 'notDone');
    await markStale();
    const march = async () =>
      (await table(regional, `from=2025-03&to=2025-03&store=${north.storeId}`)).body.totals.counts;
    expect((await march()).notDone).toBe(0);
    await rollUp();
    expect((await march()).notDone).toBe(1);
    await app.db.owner.query(
      `UPDATE tasks SET outcome = 'excused', outcome_at = '2025-03-10T12:00:00Z' WHERE id = $1`,
      { bind: [task] },
    );
    await rollUp();
    expect((await march()).notDone).toBe(1);
    await markStale();
    await rollUp();
    expect(await march()).toMatchObject({ notDone: 0, excused: 1 });
  });
});
