import { type Fleet, makeFleet, makePerson } from '@test/factories/organisation-factory';
import { type TaskWorld, makeTaskWorld } from '@test/factories/task-world';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';

describe('lists of tasks', () => {
  let app: TestApp;
  let fleet: Fleet;
  let other: Fleet;
  let manager: Browser;
  let technician: TaskWorld['technician'];
  let ids: TaskWorld['ids'];
  let namesOf: TaskWorld['namesOf'];

  beforeAll(async () => {
    app = await testApp();
    ({ fleet, other, manager, technician, ids, namesOf } = await makeTaskWorld(app));
  });
  afterAll(() => app.close());

  const list = async (query: string) => {
    const { body } = await manager.get(`/tasks?${query}`).expect(200);
    return namesOf(body.rows);
  };

  it('shows the tasks in sight, the first due first, each in its state', async () => {
    const { body } = await manager.get('/tasks').expect(200);
    expect(namesOf(body.rows)).toEqual([
      'late',
      'inTime',
      'missed',
      'excused',
      'overdue',
      'dueSoon',
      'open',
      'planned',
    ]);
    expect(body.rows.map((it: { state: string }) => it.state)).toEqual([
      'done-late',
      'done',
      'missed',
      'excused',
      'overdue',
      'due-soon',
      'open',
      'planned',
    ]);
    expect(body).toMatchObject({ total: 8, more: false });
    expect(body.rows[5]).toMatchObject({
      dueLocal: '2026-06-10T09:00:00',
      timeZone: 'America/Chicago',
      procedureTitle: { en: 'Motor current' },
      unitTag: 'F-1',
      assignee: { id: technician.id },
      end: null,
      mayPlan: true,
    });
  });

  it.each([
    ['state=due-soon,overdue', ['overdue', 'dueSoon']],
    ['end=late,notDone', ['late', 'missed', 'overdue']],
    ['end=onTime&closesFrom=2026-05-15&closesTo=2026-05-15', ['inTime']],
    ['end=onTime&closesFrom=2026-05-16', []],
    ['from=2026-06-10&to=2026-06-11', ['dueSoon', 'open']],
    ['unassigned=yes&state=open,due-soon', ['open']],
    ['audience=store&sort=-due', ['planned', 'overdue']],
    ['q=f-1%20motor', []],
    ['state=', []],
  ])('finds by %s', async (query, expected) => {
    expect(await list(query)).toEqual(expected);
  });

  it('finds by places, people, rules and words', async () => {
    expect(await list(`store=${other.storeId}`)).toEqual(['overdue', 'planned']);
    expect(await list(`technician=${technician.id}`)).toEqual(['dueSoon']);
    expect(await list(`rule=${ids['othersRule']}&sort=-closes`)).toEqual(['planned', 'overdue']);
    expect(await list(`unit=${fleet.unitId}&state=open`)).toEqual(['open']);
    const { body } = await manager.get('/tasks?state=open').expect(200);
    const words = `${body.rows[0].storeNumber} f-1`;
    expect(await list(`state=open&q=${encodeURIComponent(words)}`)).toEqual(['open']);
  });

  it('pages, and refuses to page for ever', async () => {
    expect(await list('page=2&pageSize=3')).toEqual(['excused', 'overdue', 'dueSoon']);
    const { body } = await manager.get('/tasks?page=9000&pageSize=50').expect(422);
    expect(body.errors[0].field).toBe('page');
  });

  it('hides single tasks of other regions', async () => {
    const { body } = await manager.get(`/tasks/${ids['overdue']}`).expect(200);
    expect(body.state).toBe('overdue');
    await manager.get(`/tasks/${ids['hidden']}`).expect(404);
  });

  it('gives a list away as a file', async () => {
    const { text } = await manager.get('/tasks/export?format=csv&state=due-soon,overdue&sort=-due');
    const [heading, ...rows] = text.replaceAll('"', '').trim().split('\r\n');
    expect(heading).toContain('Store,Store name,Unit,Rule,Procedure,State');
    expect(rows).toHaveLength(2);
    expect(rows[0]).toContain('Motor current,due soon,2026-06-10 09:00,America/Chicago,2026-06-12');
    expect(rows[1]).toContain('overdue');
    const { headers } = await manager.get('/tasks/export?format=xlsx&state=open').expect(200);
    expect(headers['content-disposition']).toBe('attachment; filename="tasks-2026-06-09.xlsx"');
  });

  it('explains why a task is there', async () => {
    const { body } = await manager.get(`/tasks/${ids['dueSoon']}/why`).expect(200);
    expect(body).toMatchObject({
      rule: { id: ids['ownRule'], revision: 1, currentRevision: 1 },
      occursLocal: '2026-06-10T09:00:00',
      window: { kind: 'days', before: 2, after: 2 },
      scheduleFrom: '2026-01-05',
      events: [],
    });
    expect(body.sentences.en[2]).toContain('Wednesday, June 10, 2026');
    expect(body.sentences.es).toHaveLength(body.sentences.en.length);
    await manager.get(`/tasks/${ids['hidden']}/why`).expect(404);
  });

  it('never shows another organisation’s tasks', async () => {
    const foreign = await makeFleet(app.db);
    const person = await makePerson(app.db, foreign.organisationId, 'administrator');
    const browser = await app.browser().signIn(person.email);
    const { body } = await browser.get('/tasks').expect(200);
    expect(body.total).toBe(0);
    await browser.get(`/tasks/${ids['open']}`).expect(404);
  });
});
