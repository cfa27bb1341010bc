import { randomUUID } from 'node:crypto';
import { type Fleet, insert, makeFleet, makePerson } from '@test/factories/organisation-factory';
import { makeWork } from '@test/factories/task-factory';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';

describe('doing a task', () => {
  let app: TestApp;
  let fleet: Fleet;
  let work: Awaited<ReturnType<typeof makeWork>>;
  let technician: Browser;
  let colleague: Browser;
  let colleagueId: string;
  let taskId: string;
  let occurrence = 10;

  beforeAll(async () => {
    app = await testApp();
    app.setNow('2026-06-10T15:00:00Z');
    fleet = await makeFleet(app.db);
    work = await makeWork(app.db, fleet);
    await insert(app.db, 'components', {
      organisation_id: fleet.organisationId,
      unit_id: fleet.unitId,
      kind: 'motor',
      nameplate: { volts: 115, amps: 9.8 },
      installed_on: '2025-01-01',
    });
    const region = { kind: 'region', id: fleet.regionId } as const;
    const makeTechnician = () => makePerson(app.db, fleet.organisationId, 'technician', region);
    technician = await app.browser().signIn((await makeTechnician()).email);
    const other = await makeTechnician();
    colleagueId = other.id;
    colleague = await app.browser().signIn(other.email);
  });
  afterAll(() => app.close());

  beforeEach(async () => {
    occurrence += 1;
    taskId = await work.makeTask({ occurs_local: `2026-06-10T09:00:${occurrence}` });
    app.setNow('2026-06-10T15:00:00Z');
  });

  const inspection = (readings?: object[], more: object = {}) => ({
    id: randomUUID(),
    procedureVersionId: work.procedureVersionId,
    startedAt: null,
    note: '',
    readings: readings ?? [
      { step: 'vents', kind: 'check', ok: true },
      { step: 'amps', kind: 'number', value: 9.8 },
    ],
    ...more,
  });

  it('shows the procedure with the limit of the motor that is in the unit', async () => {
    const { body } = await technician.get(`/tasks/${taskId}/sheet`).expect(200);
    expect(body.task.state).toBe('due-soon');
    // NEC 430.6(A): the nameplate, not the table, is what a running motor is held against.
    expect(body.limits.amps).toEqual({ low: null, high: 9.8 });
    expect(body.mayClose).toBe(true);
  });

  it('closes a task within limits without a finding', async () => {
    const { body } = await technician.put(`/tasks/${taskId}/inspection`, inspection()).expect(200);
    expect(body).toEqual({ state: 'done', findings: 0 });
    const sheet = await technician.get(`/tasks/${taskId}/sheet`).expect(200);
    expect(sheet.body.inspection.readings).toHaveLength(2);
    expect(sheet.body.mayClose).toBe(false);
  });

  it('makes a finding on the component for each reading out of limit', async () => {
    const { body } = await technician
      .put(
        `/tasks/${taskId}/inspection`,
        inspection([
          { step: 'vents', kind: 'check', ok: true },
          { step: 'amps', kind: 'number', value: 9.9 },
          { step: 'seal', kind: 'choice', choice: 'drips' },
        ]),
      )
      .expect(200);
    expect(body.findings).toBe(2);
    const [rows] = await app.db.owner.query(
      `SELECT cause, severity, component_id IS NOT NULL AS known FROM findings
       WHERE inspection_id IN (SELECT id FROM inspections WHERE task_id = '${taskId}') ORDER BY cause`,
    );
    expect(rows).toEqual([
      { cause: 'bearing', severity: 'plan', known: true },
      { cause: 'worn-seal', severity: 'stop', known: false },
    ]);
  });

  it('tells on the sheet what was found and who may take the closing back', async () => {
    const drips = { step: 'seal', kind: 'choice', choice: 'drips' };
    const amps = { step: 'amps', kind: 'number', value: 12 };
    const vents = { step: 'vents', kind: 'check', ok: true };
    await technician
      .put(`/tasks/${taskId}/inspection`, inspection([vents, amps, drips]))
      .expect(200);
    const own = await technician.get(`/tasks/${taskId}/sheet`).expect(200);
    expect(own.body.inspection.findings).toMatchObject([
      { cause: 'worn-seal', severity: 'stop', componentKind: 'pump', settled: false },
      { cause: 'bearing', severity: 'plan', componentKind: 'motor', settled: false },
    ]);
    expect(own.body.mayUndo).toBe(true);
    const seen = await colleague.get(`/tasks/${taskId}/sheet`).expect(200);
    expect(seen.body.mayUndo).toBe(false);
  });

  it('remembers who did what to a task', async () => {
    await colleague
      .post(`/tasks/${taskId}/could-not`, { reason: 'in-use', note: 'Lunch rush' })
      .expect(204);
    await technician.put(`/tasks/${taskId}/inspection`, inspection()).expect(200);
    await technician.delete(`/tasks/${taskId}/inspection`).expect(200);
    const { body } = await technician.get(`/tasks/${taskId}/history`).expect(200);
    const [undone, done, couldNot] = body.events;
    expect(body.events).toHaveLength(3);
    expect([undone.action, done.action, couldNot.action]).toEqual(['undone', 'done', 'could-not']);
    expect(done.findings).toBe(0);
    expect(couldNot).toMatchObject({ reason: 'in-use', note: 'Lunch rush' });
    expect(undone.by).toBe(done.by);
    expect(couldNot.by).not.toBe(done.by);
  });

  it('names every step that lacks an answer or does not fit', async () => {
    const { body } = await technician
      .put(
        `/tasks/${taskId}/inspection`,
        inspection([
          { step: 'amps', kind: 'text', text: 'nine' },
          { step: 'seal', kind: 'choice', choice: 'sprays' },
        ]),
      )
      .expect(422);
    expect(body.errors.map((it: { field: string }) => it.field)).toEqual([
      'readings.vents',
      'readings.amps',
      'readings.seal',
    ]);
  });

  it('takes the same inspection twice as one, and refuses a second one', async () => {
    const first = inspection();
    await technician.put(`/tasks/${taskId}/inspection`, first).expect(200);
    await technician.put(`/tasks/${taskId}/inspection`, first).expect(200);
    await colleague.put(`/tasks/${taskId}/inspection`, inspection()).expect(409);
  });

  it('is late after the window and impossible before it or once it has lapsed', async () => {
    app.setNow('2026-06-16T05:00:00Z');
    await technician.put(`/tasks/${taskId}/inspection`, inspection()).expect(409);
    app.setNow('2026-06-08T04:59:59Z');
    await technician.put(`/tasks/${taskId}/inspection`, inspection()).expect(409);
    app.setNow('2026-06-13T05:00:00Z');
    const { body } = await technician.put(`/tasks/${taskId}/inspection`, inspection()).expect(200);
    expect(body.state).toBe('done-late');
    const [stale] = await app.db.owner.query(`SELECT day FROM stale_days`);
    expect(stale).toEqual([{ day: '2026-06-12' }]);
  });

  it('is given back by an undo, which keeps the inspection on record', async () => {
    await technician.put(`/tasks/${taskId}/inspection`, inspection()).expect(200);
    await colleague.delete(`/tasks/${taskId}/inspection`).expect(403);
    const { body } = await technician.delete(`/tasks/${taskId}/inspection`).expect(200);
    expect(body.state).toBe('due-soon');
    const [kept] = await app.db.owner.query(
      `SELECT undone_at IS NOT NULL AS undone FROM inspections WHERE task_id = '${taskId}'`,
    );
    expect(kept).toEqual([{ undone: true }]);
  });

  it('leaves another technician’s task alone', async () => {
    await app.db.owner.query(
      `UPDATE tasks SET assigned_to = '${colleagueId}' WHERE id = '${taskId}'`,
    );
    await technician.put(`/tasks/${taskId}/inspection`, inspection()).expect(403);
    await colleague.put(`/tasks/${taskId}/inspection`, inspection()).expect(200);
  });

  it('keeps a task open with the reason it could not be done', async () => {
    await technician
      .post(`/tasks/${taskId}/could-not`, { reason: 'no-access', note: 'Line blocked' })
      .expect(204);
    const { body } = await technician.get(`/tasks/${taskId}/sheet`).expect(200);
    expect(body.task.couldNot).toBe('no-access: Line blocked');
    expect(body.task.state).toBe('due-soon');
  });

  it('does not exist for another organisation', async () => {
    const other = await makeFleet(app.db);
    const person = await makePerson(app.db, other.organisationId, 'technician');
    const stranger = await app.browser().signIn(person.email);
    await stranger.get(`/tasks/${taskId}/sheet`).expect(404);
    await stranger.get(`/tasks/${taskId}/history`).expect(404);
  });
});
