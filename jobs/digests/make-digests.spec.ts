import type { DigestContent } from '@shared/digests/digest-content';
import {
  type Fleet,
  insert,
  makeFleet,
  makeOrganisation,
  makePerson,
} from '@test/factories/organisation-factory';
import { makeWork } from '@test/factories/task-factory';
import { type TestApp, testApp } from '@test/support/test-app';
import { makeDigests } from './make-digests';

describe('making digests', () => {
  let app: TestApp;
  let organisationId: string;
  let fleet: Fleet;
  let honolulu: Fleet;
  let work: Awaited<ReturnType<typeof makeWork>>;
  let owner: { id: string; email: string };
  let finder: { id: string };

  beforeAll(async () => {
    app = await testApp();
    organisationId = await makeOrganisation(app.db);
    fleet = await makeFleet(app.db, { organisationId });
    const own = { organisation_id: organisationId };
    const storeId = await insert(app.db, 'stores', {
      ...own,
      chain_id: fleet.chainId,
      region_id: fleet.regionId,
      number: '9001',
      name: 'Ala Moana',
      latitude: 21.29,
      longitude: -157.84,
      position_from: 'coordinates',
      time_zone: 'Pacific/Honolulu',
    });
    honolulu = await makeFleet(app.db, { ...fleet, storeId, unitId: undefined });
    work = await makeWork(app.db, fleet);
    const chain = { kind: 'chain', id: fleet.chainId } as const;
    owner = await makePerson(app.db, organisationId, 'account-owner', chain, { locale: 'es' });
    finder = await makePerson(app.db, organisationId, 'technician', {
      kind: 'region',
      id: fleet.regionId,
    });
    // People whom this chain's month is none of.
    const other = await makeFleet(app.db, { organisationId });
    await makePerson(app.db, organisationId, 'account-owner', { kind: 'chain', id: other.chainId });
    await makePerson(app.db, organisationId, 'account-owner', chain, { disabled_at: new Date() });
    await makePerson(app.db, organisationId, 'administrator');
  });
  afterAll(() => app.close());

  beforeEach(async () => {
    for (const table of [
      'letters',
      'digests',
      'compliance_days',
      'stale_days',
      'repairs',
      'findings',
      'tasks',
    ]) {
      await app.db.owner.query(`DELETE FROM ${table}`);
    }
  });

  const run = (at: string) => makeDigests(app.services, new Date(at));
  const digests = async () => {
    const [rows] = await app.db.owner.query(
      `SELECT to_char(month, 'YYYY-MM') AS month, content FROM digests ORDER BY month`,
    );
    return rows as { month: string; content: DigestContent }[];
  };
  const letters = async () => {
    const [rows] = await app.db.owner.query(
      'SELECT person_id AS person, subject, plain, locale FROM letters ORDER BY dedupe_key',
    );
    return rows as { person: string; subject: string; plain: string; locale: string }[];
  };
  /** A task of the given day in June, its window closing as the day ends in Chicago. */
  const task = (day: number, row: object = {}) => {
    const closes = new Date(Date.UTC(2026, 5, day + 1, 5));
    return work.makeTask({
      occurs_local: `2026-06-${String(day).padStart(2, '0')}T09:00:00`,
      opens_at: '2026-05-01T00:00:00Z',
      due_soon_at: '2026-05-01T00:00:00Z',
      due_at: '2026-05-01T00:00:00Z',
      closes_at: closes,
      lapses_at: new Date(closes.getTime() + 5 * 86_400_000),
      closes_on: `2026-06-${String(day).padStart(2, '0')}`,
      ...row,
    });
  };
  const done = (at: string) => ({ outcome: 'done', outcome_at: at });
  const finding = (foundAt: string, row: object = {}) =>
    insert(app.db, 'findings', {
      organisation_id: organisationId,
      store_id: fleet.storeId,
      unit_id: fleet.unitId,
      cause: 'worn-seal',
      severity: 'plan',
      found_at: foundAt,
      found_by: finder.id,
      ...row,
    });

  it('tells the month of a chain to its account owner, in words and figures that agree', async () => {
    await task(3, done('2026-06-03T12:00:00Z'));
    await task(4, done('2026-06-05T06:00:00Z'));
    await task(28);
    await task(29, { outcome: 'excused', outcome_at: '2026-06-20T00:00:00Z' });
    // Done as the month ended, and so late: overdue at its end all the same.
    await task(30, done('2026-07-01T05:00:00Z'));
    await finding('2026-06-11T12:00:00Z', { settled_at: '2026-06-12T00:00:00Z' });
    const stop = await finding('2026-06-20T12:00:00Z', { severity: 'stop' });
    await finding('2026-06-21T12:00:00Z', { cause: 'cord-damage' });
    // 30 June 23:30 and 1 July 00:30 in Chicago.
    await finding('2026-07-01T04:30:00Z', { cause: 'cord-damage' });
    await finding('2026-07-01T05:30:00Z', { cause: 'cord-damage' });
    await insert(app.db, 'repairs', {
      organisation_id: organisationId,
      unit_id: fleet.unitId,
      cause: 'worn-seal',
      parts_cents: 12_000,
      labour_cents: 4_550,
      done_at: '2026-06-12T00:00:00Z',
      done_by: finder.id,
    });
    expect(await run('2026-07-01T11:00:00Z')).toBe(1);
    const [digest] = await digests();
    expect(digest?.content).toMatchObject({
      month: '2026-06',
      counts: { onTime: 1, late: 2, notDone: 1, excused: 1, covered: 0 },
      overdue: { count: 2, stores: [{ storeId: fleet.storeId, oldestClosedOn: '2026-06-28' }] },
      findings: {
        count: 4,
        unsettled: 3,
        byCause: [
          { cause: 'cord-damage', count: 2, stop: 0, unsettled: 2 },
          { cause: 'worn-seal', count: 2, stop: 1, unsettled: 1 },
        ],
      },
      repairs: { count: 1, partsCents: 12_000, labourCents: 4_550 },
      stopped: [{ findingId: stop, unitTag: 'F-1', foundOn: '2026-06-20' }],
    });
    const [letter, ...others] = await letters();
    expect(others).toEqual([]);
    expect(letter).toMatchObject({ person: owner.id, locale: 'es' });
    expect(letter?.subject).toMatch(/: mantenimiento de junio de 2026$/);
    expect(letter?.plain).toContain('Sello del eje gastado');
    expect(letter?.plain).toContain('$165.50');
    expect(letter?.plain).toContain(`http://localhost:4310/findings/${stop}`);
  });

  it('counts the last day’s window late where it was done after the month was over', async () => {
    await task(30, done('2026-07-01T05:00:00Z'));
    await run('2026-07-02T11:00:00Z');
    const [digest] = await digests();
    expect(digest?.content.counts).toMatchObject({ onTime: 0, late: 1, notDone: 0 });
  });

  it('waits for six in the morning of the organisation and for midnight of the last store', async () => {
    await task(3);
    expect(await run('2026-07-01T10:59:59Z')).toBe(0);
    expect(await run('2026-07-01T11:00:00Z')).toBe(1);
    // By an organisation in Guam the month is long over while Honolulu still cooks in it.
    await app.db.owner.query('DELETE FROM letters');
    await app.db.owner.query('DELETE FROM digests');
    const zone = (to: string) =>
      app.db.owner.query('UPDATE organisations SET time_zone = $1 WHERE id = $2', {
        bind: [to, organisationId],
      });
    await zone('Pacific/Guam');
    expect(await run('2026-07-01T09:59:59Z')).toBe(0);
    expect(await run('2026-07-01T10:00:00Z')).toBe(1);
    await zone('America/Chicago');
  });

  it('makes each digest and each letter once, run again and by four workers at once', async () => {
    await task(3);
    const made = await Promise.all([1, 2, 3, 4].map(() => run('2026-07-01T11:00:00Z')));
    expect(made.reduce((sum, it) => sum + it, 0)).toBe(1);
    expect(await run('2026-07-01T11:15:00Z')).toBe(0);
    expect(await run('2026-07-31T11:00:00Z')).toBe(0);
    expect(await digests()).toHaveLength(1);
    expect(await letters()).toHaveLength(1);
  });

  it('skips no month after weeks without a worker, and tells each as it had ended', async () => {
    await task(3);
    await run('2026-07-01T11:00:00Z');
    const july = { closes_at: '2026-07-11T05:00:00Z', lapses_at: '2026-08-20T05:00:00Z' };
    await task(10, { ...july, closes_on: '2026-07-10', ...done('2026-08-05T12:00:00Z') });
    const august = { closes_at: '2026-08-11T05:00:00Z', lapses_at: '2026-08-20T05:00:00Z' };
    await task(11, { ...august, closes_on: '2026-08-10' });
    expect(await run('2026-09-20T12:00:00Z')).toBe(2);
    const all = await digests();
    expect(all.map(({ month }) => month)).toEqual(['2026-06', '2026-07', '2026-08']);
    expect(all.map(({ content }) => content.overdue.count)).toEqual([0, 1, 0]);
    expect(await letters()).toHaveLength(3);
  });

  it('keeps digest and letters together: neither stays when the other fails', async () => {
    await task(3);
    await app.db.owner.query('ALTER TABLE letters ADD CONSTRAINT broken CHECK (false) NOT VALID');
    expect(await run('2026-07-01T11:00:00Z')).toBe(0);
    expect(await digests()).toEqual([]);
    await app.db.owner.query('ALTER TABLE letters DROP CONSTRAINT broken');
    expect(await run('2026-07-01T11:15:00Z')).toBe(1);
    expect(await letters()).toHaveLength(1);
  });

  it('waits while a day of the month is being changed', async () => {
    await task(3);
    await app.db.owner.query(
      `INSERT INTO stale_days (organisation_id, store_id, day) VALUES ($1, $2, '2026-06-03')`,
      { bind: [organisationId, fleet.storeId] },
    );
    const writer = await app.db.owner.transaction();
    await app.db.owner.query('SELECT FROM stale_days FOR KEY SHARE', { transaction: writer });
    expect(await run('2026-07-01T11:00:00Z')).toBe(0);
    await writer.commit();
    expect(await run('2026-07-01T11:15:00Z')).toBe(1);
  });

  it('compares with the month before, by chain and by store', async () => {
    await task(3, done('2026-06-03T12:00:00Z'));
    const july = (day: string, row: object) => ({
      closes_at: `2026-07-${day}T05:00:00Z`,
      lapses_at: `2026-07-${day}T05:00:00Z`,
      closes_on: `2026-07-${String(Number(day) - 1).padStart(2, '0')}`,
      ...row,
    });
    await task(5, july('08', done('2026-07-07T12:00:00Z')));
    await task(6, july('09', {}));
    await run('2026-08-01T11:00:00Z');
    const [digest] = await digests();
    expect(digest?.content).toMatchObject({
      month: '2026-07',
      rate: 0.5,
      previousRate: 1,
      change: -50,
      months: [{}, {}, {}, {}, { month: '2026-06', rate: 1 }, { month: '2026-07', rate: 0.5 }],
    });
    expect(
      digest?.content.stores.map(({ storeId, rate, change }) => [storeId, rate, change]),
    ).toEqual([
      [fleet.storeId, 0.5, -50],
      [honolulu.storeId, null, null],
    ]);
  });

  it('says nothing of a month in which nothing happened', async () => {
    expect(await run('2026-07-01T11:00:00Z')).toBe(0);
    expect(await letters()).toEqual([]);
  });
});
