import { randomUUID } from 'node:crypto';
import { type Fleet, makeFleet, makePerson } from '@test/factories/organisation-factory';
import { makeWork } from '@test/factories/task-factory';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';

/** The factory's task is due on Wednesday 2026-06-10 and closes at the end of Friday the 12th. */
describe('deferring tasks', () => {
  let app: TestApp;
  let fleet: Fleet;
  let manager: Browser;

  beforeAll(async () => {
    app = await testApp();
    fleet = await makeFleet(app.db);
    const person = await makePerson(app.db, fleet.organisationId, 'regional-facility-manager');
    manager = await app.browser().signIn(person.email);
  });
  beforeEach(() => app.setNow('2026-06-09T15:00:00Z'));
  afterAll(() => app.close());

  const these = (...ids: string[]) => ({
    kind: 'tasks',
    tasks: ids.map((id) => ({ id, version: 0 })),
  });
  const taskOf = async (id: string) => (await manager.get(`/tasks/${id}`).expect(200)).body;
  const leftOf = (body: { results: { taskId: string; left: string | null }[] }) =>
    Object.fromEntries(body.results.map(({ taskId, left }) => [taskId, left]));

  it('defers with the window, but nothing that has closed, goes back, or goes too far', async () => {
    const task = await (await makeWork(app.db, fleet)).makeTask();
    const defer = (dueOn: string, version: number) =>
      manager.post('/tasks/defer', {
        id: randomUUID(),
        selection: { kind: 'tasks', tasks: [{ id: task, version }] },
        reason: 'Line is rebuilt',
        dueOn,
      });
    expect(leftOf((await defer('2026-06-10', 0)).body)).toEqual({ [task]: 'not-later' });
    expect(leftOf((await defer('2026-09-09', 0)).body)).toEqual({ [task]: 'too-far' });
    await defer('2026-06-17', 0).expect(200);
    expect(await taskOf(task)).toMatchObject({
      state: 'open',
      dueOn: '2026-06-17',
      dueLocal: '2026-06-17T09:00:00',
      closesOn: '2026-06-19',
      closesAt: '2026-06-20T05:00:00.000Z',
      opensAt: '2026-06-08T05:00:00.000Z',
      deferredFrom: '2026-06-10',
    });
    expect(leftOf((await defer('2026-06-18', 0)).body)).toEqual({ [task]: 'changed-meanwhile' });
    // Ninety days count from the first due day, however often it is put off.
    expect(leftOf((await defer('2026-09-09', 1)).body)).toEqual({ [task]: 'too-far' });
    await defer('2026-09-08', 1).expect(200);
    expect((await taskOf(task)).deferredFrom).toBe('2026-06-10');
    app.setNow('2026-09-12T15:00:00Z');
    expect(leftOf((await defer('2026-09-30', 2)).body)).toEqual({ [task]: 'window-closed' });
  });

  it('leaves a check of a shift in its shift', async () => {
    const shift = await makeWork(app.db, fleet, 'store');
    await app.db.owner.query(
      `UPDATE rules SET time_window = '{"kind":"hours","before":3,"after":2,"late":3,"dueSoon":1}'
       WHERE id = $1`,
      { bind: [shift.ruleId] },
    );
    const task = await shift.makeTask();
    const { body } = await manager.post('/tasks/defer', {
      id: randomUUID(),
      selection: these(task),
      reason: 'Later',
      dueOn: '2026-06-12',
    });
    expect(leftOf(body)).toEqual({ [task]: 'belongs-to-shift' });
  });
});
