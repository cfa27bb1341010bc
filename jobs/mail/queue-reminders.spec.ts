import {
  type Fleet,
  makeFleet,
  makeOrganisation,
  makePerson,
} from '@test/factories/organisation-factory';
import { makeWork } from '@test/factories/task-factory';
import { type TestApp, testApp } from '@test/support/test-app';
import { queueReminders } from './queue-reminders';

type Work = Awaited<ReturnType<typeof makeWork>>;

describe('queueing reminders', () => {
  let app: TestApp;
  let fleet: Fleet;
  let elsewhere: Fleet;
  let technical: Work;
  let ofStore: Work;
  let technician: { id: string; email: string };
  let regional: { id: string };
  let manager: { id: string };

  beforeAll(async () => {
    app = await testApp();
    const organisationId = await makeOrganisation(app.db);
    fleet = await makeFleet(app.db, { organisationId });
    elsewhere = await makeFleet(app.db, { organisationId });
    technical = await makeWork(app.db, fleet);
    ofStore = await makeWork(app.db, fleet, 'store');
    const region = { kind: 'region', id: fleet.regionId } as const;
    const make = (
      ...more: [Parameters<typeof makePerson>[2], { kind: 'region' | 'store'; id: string }, object?]
    ) => makePerson(app.db, organisationId, ...more);
    technician = await make('technician', region);
    regional = await make('regional-facility-manager', region);
    manager = await make(
      'store-manager',
      { kind: 'store', id: fleet.storeId },
      {
        locale: 'es',
        time_zone: 'America/Phoenix',
      },
    );
    // People whom none of it concerns.
    await make('store-manager', { kind: 'store', id: elsewhere.storeId });
    await make('technician', region);
    await make('technician', region, { disabled_at: new Date() });
  });
  afterAll(() => app.close());

  beforeEach(async () => {
    for (const table of ['task_notices', 'letters', 'tasks']) {
      await app.db.owner.query(`DELETE FROM ${table}`);
    }
  });

  /** On 10 June the task of the factory is due soon; its window closes on the 13th at 05:00Z. */
  const morning = (day: number, time = '11:30') => new Date(`2026-06-${day}T${time}:00Z`);
  const run = (at: Date) => queueReminders(app.services, at);
  const noticesOf = async (personId: string) => {
    const [rows] = await app.db.owner.query(
      'SELECT task_id AS task, kind FROM task_notices WHERE person_id = $1 ORDER BY kind',
      { bind: [personId] },
    );
    return rows as { task: string; kind: string }[];
  };
  const lettersOf = async (personId: string) => {
    const [rows] = await app.db.owner.query(
      `SELECT subject, plain, dedupe_key FROM letters WHERE person_id = $1 ORDER BY created_at`,
      { bind: [personId] },
    );
    return rows as { subject: string; plain: string; dedupe_key: string }[];
  };

  it('tells the technician of an assigned task once when due soon, once when overdue', async () => {
    const task = await technical.makeTask({ assigned_to: technician.id });
    // 06:29 in Chicago is too early, and one minute later is not.
    expect(await run(morning(10, '11:29'))).toBe(0);
    expect(await run(morning(10))).toBe(1);
    expect(await run(morning(10))).toBe(0);
    expect(await run(morning(10, '20:00'))).toBe(0);
    expect(await run(morning(11))).toBe(0);
    expect(await noticesOf(technician.id)).toEqual([{ task, kind: 'due-soon' }]);
    await run(morning(13));
    await run(morning(14));
    expect(await noticesOf(technician.id)).toEqual([
      { task, kind: 'due-soon' },
      { task, kind: 'overdue' },
    ]);
    const [soon, overdue] = await lettersOf(technician.id);
    expect(soon?.subject).toBe('Vatwright: 1 due soon');
    expect(soon?.plain).toContain('Motor current (F-1), until Fri, Jun 12, 11:59 PM CDT');
    expect(soon?.plain).toContain(`http://localhost:4310/tasks/${task}`);
    expect(overdue?.subject).toBe('Vatwright: 1 overdue');
  });

  it('bundles what concerns a store’s manager, in her language and zone', async () => {
    await ofStore.makeTask();
    await ofStore.makeTask({ occurs_local: '2026-06-10T17:00:00' });
    await technical.makeTask();
    // 06:30 in Chicago is 04:30 in Phoenix, which keeps no daylight saving time.
    await run(morning(10));
    expect(await lettersOf(manager.id)).toEqual([]);
    await run(morning(10, '13:30'));
    const [letter] = await lettersOf(manager.id);
    expect(letter?.subject).toBe('Vatwright: 2 vencen pronto');
    expect(letter?.plain).toContain('Motor current (es)');
    expect(letter?.plain).toMatch(/hasta el vie, 12 (de )?jun.*9:59.*MST/);
    expect(await noticesOf(manager.id)).toHaveLength(2);
  });

  it('tells the region of what is overdue, and of what comes due with nobody assigned', async () => {
    const orphan = await technical.makeTask();
    const assigned = await technical.makeTask({
      occurs_local: '2026-06-10T10:00:00',
      assigned_to: technician.id,
    });
    const check = await ofStore.makeTask();
    await run(morning(10));
    expect(await noticesOf(regional.id)).toEqual([{ task: orphan, kind: 'due-soon' }]);
    await run(morning(13));
    const overdue = (await noticesOf(regional.id)).filter(({ kind }) => kind === 'overdue');
    expect(overdue.map(({ task }) => task).sort()).toEqual([orphan, assigned, check].sort());
  });

  it('says nothing of tasks that are done or excused', async () => {
    const done = { outcome_at: '2026-06-09T12:00:00Z', assigned_to: technician.id };
    await technical.makeTask({ ...done, outcome: 'done' });
    await technical.makeTask({ ...done, occurs_local: '2026-06-10T10:00:00', outcome: 'excused' });
    expect(await run(morning(10))).toBe(0);
    expect(await run(morning(13))).toBe(0);
  });

  it('skips nobody after days without a worker: what lapsed meanwhile is told as missed', async () => {
    const first = await technical.makeTask({ assigned_to: technician.id });
    await run(morning(10));
    // Opens, closes and lapses while no worker runs.
    const lapsed = await technical.makeTask({
      occurs_local: '2026-06-11T09:00:00',
      assigned_to: technician.id,
      opens_at: '2026-06-11T05:00:00Z',
      due_soon_at: '2026-06-11T12:00:00Z',
      due_at: '2026-06-11T14:00:00Z',
      closes_at: '2026-06-11T18:00:00Z',
      lapses_at: '2026-06-12T05:00:00Z',
      closes_on: '2026-06-11',
    });
    await run(morning(20));
    await run(morning(21));
    const letters = await lettersOf(technician.id);
    expect(letters.map(({ subject }) => subject)).toEqual([
      'Vatwright: 1 due soon',
      'Vatwright: 2 missed',
    ]);
    const told = (await noticesOf(technician.id)).filter(({ kind }) => kind === 'overdue');
    expect(told.map(({ task }) => task).sort()).toEqual([first, lapsed].sort());
  });

  it('leaves history alone before a first letter', async () => {
    await technical.makeTask({ assigned_to: technician.id });
    expect(await run(morning(25))).toBe(0);
  });

  it('queues one letter when four workers come at once, and the notices fit it', async () => {
    for (let hour = 10; hour < 22; hour += 1) {
      await technical.makeTask({
        occurs_local: `2026-06-10T${hour}:00:00`,
        assigned_to: technician.id,
      });
    }
    const queued = await Promise.all([1, 2, 3, 4].map(() => run(morning(10))));
    expect(queued.reduce((sum, it) => sum + it, 0)).toBe(1);
    expect(await lettersOf(technician.id)).toHaveLength(1);
    expect(await noticesOf(technician.id)).toHaveLength(12);
  });

  it('keeps letter and notices together: neither stays when the other fails', async () => {
    await technical.makeTask({ assigned_to: technician.id });
    await app.db.owner.query(
      `ALTER TABLE task_notices ADD CONSTRAINT broken CHECK (false) NOT VALID`,
    );
    expect(await run(morning(10))).toBe(0);
    expect(await lettersOf(technician.id)).toEqual([]);
    await app.db.owner.query('ALTER TABLE task_notices DROP CONSTRAINT broken');
    expect(await run(morning(10))).toBe(1);
  });

  it('writes to one letter per local day though the person moves a zone westward', async () => {
    const zone = (timeZone: string) =>
      app.db.owner.query('UPDATE people SET time_zone = $1 WHERE id = $2', {
        bind: [timeZone, technician.id],
      });
    await technical.makeTask({ assigned_to: technician.id });
    await run(morning(10));
    await technical.makeTask({ assigned_to: technician.id, occurs_local: '2026-06-10T12:00:00' });
    await zone('America/Los_Angeles');
    await run(morning(10, '14:00'));
    expect(await lettersOf(technician.id)).toHaveLength(1);
    await run(morning(11, '14:00'));
    expect(await lettersOf(technician.id)).toHaveLength(2);
    await zone('America/Chicago');
  });

  it('belongs to one organisation: another one’s people hear nothing', async () => {
    const other = await makeFleet(app.db);
    const stranger = await makePerson(app.db, other.organisationId, 'regional-facility-manager');
    await technical.makeTask();
    await run(morning(13));
    expect(await lettersOf(stranger.id)).toEqual([]);
  });
});
