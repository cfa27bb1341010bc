import { randomUUID } from 'node:crypto';
import type { Role, ScopeKind } from '@shared/access/role';
import { inTenant } from '@db/tenant-transaction';
import { syncSchedules } from '@server/programmes/sync-schedules';
import { generateTasks } from '@server/tasks/generate-tasks';
import { type Fleet, insert, makeFleet, makePerson } from '@test/factories/organisation-factory';
import { makeProcedure, ruleOf } from '@test/factories/programme-factory';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';

describe('programmes', () => {
  let it_: TestApp;
  let fleet: Fleet;
  /** Another store of the same chain, in another region. */
  let far: Fleet;
  let procedureId: string;
  let administrator: Browser;

  const as = async (
    role: Role,
    scope?: { kind: ScopeKind; id: string },
    organisationId?: string,
  ) => {
    const { email } = await makePerson(
      it_.db,
      organisationId ?? fleet.organisationId,
      role,
      scope ?? { kind: 'organisation', id: organisationId ?? fleet.organisationId },
    );
    return it_.browser().signIn(email);
  };
  const begin = async (browser = administrator) => {
    const id = randomUUID();
    const body = { id, name: `Programme ${id}`, description: '' };
    await browser.post('/programmes', body).expect(200);
    return id;
  };
  const addRule = async (programmeId: string, more: Parameters<typeof ruleOf>[1] = {}) => {
    const body = { id: randomUUID(), ...ruleOf(procedureId, more) };
    await administrator.post(`/programmes/${programmeId}/rules`, body).expect(200);
    return body;
  };
  const enrolment = (scopeKind: string, scopeId: string, more: object = {}) => ({
    id: randomUUID(),
    scopeKind,
    scopeId,
    exception: false,
    fromOn: '2026-01-01',
    untilOn: null,
    ...more,
  });
  const enrol = (programmeId: string, body: object, browser = administrator) =>
    browser.post(`/programmes/${programmeId}/enrolments`, body);
  /** Live schedules of a programme as "place from–until", in order. */
  const schedules = async (programmeId: string) => {
    const [rows] = await it_.db.owner.query(
      `SELECT sc.store_id, sc.unit_id, sc.from_on::text, sc.until_on::text FROM schedules sc
       JOIN rules r ON r.id = sc.rule_id WHERE r.programme_id = $1 AND sc.ended_at IS NULL`,
      { bind: [programmeId] },
    );
    const names = new Map([
      [fleet.storeId, 'near store'],
      [fleet.unitId, 'near unit'],
      [far.storeId, 'far store'],
      [far.unitId, 'far unit'],
    ]);
    return (rows as { store_id: string; unit_id: string; from_on: string; until_on: string }[])
      .map(
        (row) => `${names.get(row.unit_id ?? row.store_id)} ${row.from_on}–${row.until_on ?? ''}`,
      )
      .sort();
  };
  const sync = (now: string, scope = {}) =>
    inTenant(it_.db.app, fleet.organisationId, (tenant) =>
      syncSchedules(tenant, new Date(now), scope),
    );

  beforeAll(async () => {
    it_ = await testApp();
    it_.setNow('2026-12-01T12:00:00Z');
    fleet = await makeFleet(it_.db);
    const { organisationId, chainId } = fleet;
    far = await makeFleet(it_.db, { organisationId, chainId });
    procedureId = await makeProcedure(it_.db, organisationId);
    administrator = await as('administrator');
  });
  afterAll(() => it_.close());

  describe('schedules', () => {
    it('are made for every unit that an enrolment reaches, from today on', async () => {
      const id = await begin();
      await addRule(id);
      const { body } = await enrol(id, enrolment('chain', fleet.chainId)).expect(200);
      expect(body.reach).toEqual({ stores: 2, units: 2 });
      expect(await schedules(id)).toEqual(['far unit 2026-12-01–', 'near unit 2026-12-01–']);
    });

    it('are made for stores where the rule applies to stores', async () => {
      const id = await begin();
      await enrol(id, enrolment('region', fleet.regionId)).expect(200);
      await addRule(id, { appliesTo: 'store', audience: 'store' });
      expect(await schedules(id)).toEqual(['near store 2026-12-01–']);
    });

    it('give way to narrower exceptions, and those to narrower enrolments', async () => {
      const id = await begin();
      await addRule(id);
      await enrol(id, enrolment('chain', fleet.chainId)).expect(200);
      await enrol(id, enrolment('region', far.regionId, { exception: true })).expect(200);
      expect(await schedules(id)).toEqual(['near unit 2026-12-01–']);
      await enrol(id, enrolment('store', far.storeId)).expect(200);
      expect(await schedules(id)).toEqual(['far unit 2026-12-01–', 'near unit 2026-12-01–']);
      await enrol(id, enrolment('unit', far.unitId, { exception: true })).expect(200);
      expect(await schedules(id)).toEqual(['near unit 2026-12-01–']);
    });

    it('follow dates: an exception of some weeks splits them', async () => {
      const id = await begin();
      await addRule(id);
      await enrol(id, enrolment('store', fleet.storeId, { untilOn: '2027-06-30' })).expect(200);
      const refit = { exception: true, fromOn: '2027-01-10', untilOn: '2027-02-09' };
      await enrol(id, enrolment('store', fleet.storeId, refit)).expect(200);
      expect(await schedules(id)).toEqual(['near unit 2026-12-01–2027-01-09']);
      await sync('2027-01-20T12:00:00Z');
      expect(await schedules(id)).toEqual(['near unit 2027-02-10–2027-06-30']);
      await sync('2027-07-02T12:00:00Z');
      expect(await schedules(id)).toEqual([]);
      await sync('2026-12-01T12:00:00Z');
    });

    it('do not change when made again, and begin at the store’s own today', async () => {
      const id = await begin();
      await addRule(id);
      await enrol(id, enrolment('store', fleet.storeId)).expect(200);
      const nothing = { made: 0, changed: 0, ended: 0 };
      expect(await sync('2026-12-01T12:00:00Z', { programmeId: id })).toEqual(nothing);
      expect(await sync('2026-12-05T12:00:00Z', { programmeId: id })).toEqual(nothing);
      const late = await begin();
      // 05:30 UTC is still the evening before in Chicago (UTC−6 in winter).
      it_.setNow('2026-12-02T05:30:00Z');
      await addRule(late);
      await enrol(late, enrolment('store', fleet.storeId)).expect(200);
      it_.setNow('2026-12-01T12:00:00Z');
      expect(await schedules(late)).toEqual(['near unit 2026-12-01–']);
    });

    it('heed kind of unit, face of pump, and what is out of use', async () => {
      const store = { ...fleet, unitId: undefined, storeId: undefined };
      const place = await makeFleet(it_.db, store);
      await insert(it_.db, 'components', {
        organisation_id: fleet.organisationId,
        unit_id: place.unitId,
        kind: 'pump',
        pump_face: 'gasket',
        installed_on: '2025-01-01',
      });
      const count = async (more: object) => {
        const id = await begin();
        await addRule(id, more);
        await enrol(id, enrolment('store', place.storeId)).expect(200);
        return (await schedules(id)).length;
      };
      expect(await count({})).toBe(1);
      expect(await count({ unitKind: 'portable' })).toBe(0);
      expect(await count({ pumpFace: 'gasket' })).toBe(1);
      expect(await count({ pumpFace: 'drain-slot' })).toBe(0);
      await it_.db.owner.query(
        `UPDATE units SET out_of_service_since = '2026-11-30' WHERE id = $1`,
        { bind: [place.unitId] },
      );
      expect(await count({})).toBe(0);
    });

    it('end with their store and move with their unit', async () => {
      const { organisationId, chainId, regionId } = fleet;
      const place = await makeFleet(it_.db, { organisationId, chainId, regionId });
      const other = await makeFleet(it_.db, { organisationId, chainId, regionId });
      const id = await begin();
      await addRule(id);
      await enrol(id, enrolment('region', regionId)).expect(200);
      const before = (await schedules(id)).length;
      await it_.db.owner.query('UPDATE units SET store_id = $2, tag = $3 WHERE id = $1', {
        bind: [place.unitId, other.storeId, 'F-2'],
      });
      const moved = await sync('2026-12-01T12:00:00Z', {
        programmeId: id,
        storeIds: [place.storeId, other.storeId],
      });
      expect(moved).toEqual({ made: 0, changed: 1, ended: 0 });
      await it_.db.owner.query('UPDATE stores SET retired_at = now() WHERE id = $1', {
        bind: [other.storeId],
      });
      await sync('2026-12-01T12:00:00Z', { programmeId: id, storeIds: [other.storeId] });
      expect((await schedules(id)).length).toBe(before - 2);
    });

    it('end when the enrolment, the rule or the programme goes, and come back', async () => {
      const id = await begin();
      const rule = await addRule(id);
      const place = enrolment('store', fleet.storeId);
      await enrol(id, place).expect(200);
      await administrator.post(`/rules/${rule.id}/retire`, { version: 0 }).expect(200);
      expect(await schedules(id)).toEqual([]);
      await administrator.post(`/rules/${rule.id}/restore`, { version: 1 }).expect(200);
      expect(await schedules(id)).toHaveLength(1);
      await administrator.post(`/programmes/${id}/retire`, { version: 0 }).expect(200);
      expect(await schedules(id)).toEqual([]);
      await administrator.post(`/programmes/${id}/restore`, { version: 1 }).expect(200);
      expect(await schedules(id)).toHaveLength(1);
      await administrator.delete(`/enrolments/${place.id}`, { version: 0 }).expect(200);
      expect(await schedules(id)).toEqual([]);
    });
  });

  describe('rules', () => {
    it('keep every revision', async () => {
      const id = await begin();
      const { id: ruleId, ...rule } = await addRule(id, { name: 'Look at it' });
      const weekly = { ...rule.recurrence, rrules: ['FREQ=WEEKLY;BYDAY=MO'] };
      const { body } = await administrator
        .put(`/rules/${ruleId}`, { ...rule, recurrence: weekly, version: 0 })
        .expect(200);
      expect(body).toMatchObject({ revision: 2, version: 1, recurrence: weekly });
      await administrator.put(`/rules/${ruleId}`, { ...rule, version: 0 }).expect(409);
      const kept = await administrator.get(`/rules/${ruleId}/revisions`).expect(200);
      expect(
        kept.body.rows.map(
          (row: { definition: { recurrence: object } }) => row.definition.recurrence,
        ),
      ).toEqual([weekly, rule.recurrence]);
    });

    it('name the part at fault', async () => {
      const id = await begin();
      const bad = ruleOf(procedureId, {
        recurrence: {
          startsLocal: '2026-01-01T09:00:00',
          rrules: ['FREQ=MONTHLY;BYMONTHDAY=32', 'FREQ=FORTNIGHTLY;COUNT=2;UNTIL=20270101'],
          rdates: [],
          exdates: [],
        },
      });
      const { body } = await administrator
        .post(`/programmes/${id}/rules`, { id: randomUUID(), ...bad })
        .expect(422);
      expect(body.errors).toEqual(
        expect.arrayContaining([
          expect.objectContaining({
            field: 'recurrence.rrules.0',
            reason: 'out-of-range',
            params: expect.objectContaining({ part: 'BYMONTHDAY' }),
          }),
          expect.objectContaining({ field: 'recurrence.rrules.1', reason: 'unknown-frequency' }),
        ]),
      );
    });

    it('are shown what an edit would do to their tasks, which it then does', async () => {
      const programmeId = await begin();
      const weekly = (rrule: string, after = 1) => ({
        recurrence: {
          startsLocal: '2026-01-05T09:00:00',
          rrules: [rrule],
          rdates: [],
          exdates: [],
        },
        window: { kind: 'days', before: 1, after, late: 0, dueSoon: 1 } as const,
        horizonDays: 27,
      });
      const { id, ...rule } = await addRule(programmeId, weekly('FREQ=WEEKLY;BYDAY=TU,SA'));
      await enrol(programmeId, enrolment('store', fleet.storeId)).expect(200);
      const now = new Date('2026-12-01T12:00:00Z');
      const generate = () => generateTasks(it_.db.app, fleet.organisationId, now);
      await generate();
      const look = async (more: object, version = 0, browser = administrator) => {
        const body = { ...rule, ...more, version };
        return (await browser.post(`/rules/${id}/preview`, body).expect(200)).body as unknown;
      };
      // Tuesdays 1, 8, 15 and 22 December, of which the first has opened; Saturdays 5, 12, 19 and 26.
      expect(await look({ name: 'Another name' })).toEqual({
        added: 0,
        moved: 0,
        withdrawn: 0,
        unchanged: 7,
        leftAlone: 1,
      });
      expect(await look({ window: { ...rule.window, after: 2 } })).toMatchObject({
        moved: 7,
        unchanged: 0,
      });
      const edit = { ...rule, ...weekly('FREQ=WEEKLY;BYDAY=SA,SU', 2) };
      const foreseen = await look(edit);
      expect(foreseen).toEqual({ added: 4, moved: 4, withdrawn: 3, unchanged: 0, leftAlone: 1 });
      const { body: before } = await administrator.get(`/rules/${id}`).expect(200);
      expect(before).toMatchObject({ revision: 1, version: 0 });
      const kept = await administrator.get(`/rules/${id}/revisions`).expect(200);
      expect((kept.body as { rows: unknown[] }).rows).toHaveLength(1);

      await administrator.put(`/rules/${id}`, { ...edit, version: 0 }).expect(200);
      expect(await generate()).toEqual({ added: 4, moved: 4, withdrawn: 3 });
      expect(await look(edit, 1)).toMatchObject({ added: 0, moved: 0, withdrawn: 0 });
    });

    it('are shown what leaves when an edit no longer reaches a place', async () => {
      const programmeId = await begin();
      const { id, ...rule } = await addRule(programmeId, {
        recurrence: {
          startsLocal: '2026-01-05T09:00:00',
          rrules: ['FREQ=WEEKLY;BYDAY=SA'],
          rdates: [],
          exdates: [],
        },
        window: { kind: 'days', before: 1, after: 1, late: 0, dueSoon: 1 },
        horizonDays: 27,
      });
      await enrol(programmeId, enrolment('unit', fleet.unitId)).expect(200);
      await generateTasks(it_.db.app, fleet.organisationId, new Date('2026-12-01T12:00:00Z'));
      const body = { ...rule, unitKind: 'portable', version: 0 };
      const { body: seen } = await administrator.post(`/rules/${id}/preview`, body).expect(200);
      expect(seen).toEqual({ added: 0, moved: 0, withdrawn: 4, unchanged: 0, leftAlone: 0 });
      expect(await schedules(programmeId)).toHaveLength(1);
    });

    it('refuse to look ahead for the reasons that the edit itself has', async () => {
      const programmeId = await begin();
      const { id, ...rule } = await addRule(programmeId);
      await enrol(programmeId, enrolment('chain', fleet.chainId)).expect(200);
      const preview = (browser: Browser, more: object = {}) =>
        browser.post(`/rules/${id}/preview`, { ...rule, version: 0, ...more });
      await preview(administrator, { version: 3 }).expect(409);
      const bad = { ...rule.recurrence, rrules: ['FREQ=MONTHLY;BYMONTHDAY=32'] };
      await preview(administrator, { recurrence: bad }).expect(422);
      const region = await as('regional-facility-manager', { kind: 'region', id: fleet.regionId });
      await preview(region).expect(403);
    });

    it('need a published procedure in use, and real dates', async () => {
      const id = await begin();
      const body = { id: randomUUID(), ...ruleOf(randomUUID()) };
      const unknown = await administrator.post(`/programmes/${id}/rules`, body).expect(422);
      expect(unknown.body.errors).toMatchObject([{ field: 'procedureId', reason: 'unknown' }]);
      const noDay = await administrator
        .post(`/programmes/${id}/rules`, {
          ...body,
          procedureId,
          recurrence: { ...body.recurrence, startsLocal: '2026-02-30T09:00:00' },
          horizonDays: 0,
        })
        .expect(422);
      expect(noDay.body.errors.map(({ field }: { field: string }) => field).sort()).toEqual([
        'horizonDays',
        'recurrence.startsLocal',
      ]);
    });

    it('keep their procedure from being retired', async () => {
      const trainer = await as('trainer');
      const own = await makeProcedure(it_.db, fleet.organisationId);
      const id = await begin();
      const rule = { id: randomUUID(), ...ruleOf(own) };
      await administrator.post(`/programmes/${id}/rules`, rule).expect(200);
      const { body } = await trainer.post(`/procedures/${own}/retire`, { version: 0 }).expect(409);
      expect(body.code).toBe('in-use');
    });

    it('can be seen ahead', async () => {
      const ask = (rrules: string[], timeZone = 'America/Phoenix') =>
        administrator.post('/recurrence/preview', {
          recurrence: { startsLocal: '2026-01-31T06:00:00', rrules, rdates: [], exdates: [] },
          timeZone,
        });
      // Months without a 31st are skipped: RFC 5545, 3.3.10 ("invalid dates … must be ignored").
      const { body } = await ask(['FREQ=MONTHLY']).expect(200);
      expect(body.next.slice(0, 4)).toEqual([
        '2026-12-31T06:00:00',
        '2027-01-31T06:00:00',
        '2027-03-31T06:00:00',
        '2027-05-31T06:00:00',
      ]);
      expect(body.words).toEqual({
        en: 'Every month on the 31st at 06:00.',
        es: 'Cada mes el día 31 a las 06:00.',
      });
      const bad = await ask(['FREQ=DAILY;BYWEEKNO=3']).expect(200);
      expect(bad.body).toMatchObject({
        words: null,
        next: [],
        problems: [{ field: 'rrules.0', part: 'BYWEEKNO', code: 'not-with-frequency' }],
      });
      await ask(['FREQ=DAILY'], 'Mars/Olympus').expect(422);
    });
  });

  describe('who may', () => {
    it.each<[Role, number, number]>([
      ['administrator', 200, 200],
      ['regional-facility-manager', 200, 200],
      ['trainer', 200, 403],
      ['technician', 403, 403],
      ['store-manager', 403, 403],
      ['account-owner', 403, 403],
      ['shift-lead', 403, 403],
    ])('a %s reads with %d and begins with %d', async (role, reading, beginning) => {
      const browser = await as(role);
      await browser.get('/programmes').expect(reading);
      const id = randomUUID();
      const body = { id, name: `By ${role}`, description: '' };
      await browser.post('/programmes', body).expect(beginning);
    });

    it('enrol: only within one’s own region', async () => {
      const region = await as('regional-facility-manager', { kind: 'region', id: fleet.regionId });
      const id = await begin(region);
      await enrol(id, enrolment('region', fleet.regionId), region).expect(200);
      await enrol(id, enrolment('unit', fleet.unitId), region).expect(200);
      await enrol(id, enrolment('region', far.regionId), region).expect(403);
      await enrol(id, enrolment('store', far.storeId), region).expect(403);
      await enrol(id, enrolment('chain', fleet.chainId), region).expect(403);
    });

    it('change a programme: only who may plan wherever it is enrolled', async () => {
      const region = await as('regional-facility-manager', { kind: 'region', id: fleet.regionId });
      const id = await begin(region);
      await enrol(id, enrolment('store', fleet.storeId), region).expect(200);
      const rule = { id: randomUUID(), ...ruleOf(procedureId) };
      await region.post(`/programmes/${id}/rules`, rule).expect(200);
      await enrol(id, enrolment('store', far.storeId)).expect(200);
      const { body } = await region.get(`/programmes/${id}`).expect(200);
      expect(body.mayEdit).toBe(false);
      await region.post(`/rules/${rule.id}/retire`, { version: 0 }).expect(403);
      await region
        .patch(`/programmes/${id}`, { version: 0, name: 'Mine', description: '' })
        .expect(403);
    });

    it('not see or touch another organisation’s', async () => {
      const id = await begin();
      const rule = await addRule(id);
      const other = await makeFleet(it_.db);
      const stranger = await as('administrator', undefined, other.organisationId);
      await stranger.get(`/programmes/${id}`).expect(404);
      await stranger.get(`/rules/${rule.id}`).expect(404);
      await stranger.post(`/rules/${rule.id}/retire`, { version: 0 }).expect(404);
      await enrol(id, enrolment('store', other.storeId), stranger).expect(404);
      await enrol(id, enrolment('store', other.storeId)).expect(404);
      const listed = await stranger.get('/programmes?state=all').expect(200);
      expect(listed.body.total).toBe(0);
    });
  });

  it('refuses a second enrolment, a name taken, an end before the start, a stale version', async () => {
    const id = await begin();
    const place = enrolment('store', fleet.storeId);
    await enrol(id, place).expect(200);
    const again = await enrol(id, enrolment('store', fleet.storeId)).expect(422);
    expect(again.body.errors).toMatchObject([{ field: 'scopeId', reason: 'enrolled-already' }]);
    const early = enrolment('store', far.storeId, { untilOn: '2025-12-31' });
    const before = await enrol(id, early).expect(422);
    expect(before.body.errors).toMatchObject([{ field: 'untilOn', reason: 'before-start' }]);
    const dates = { fromOn: '2026-12-01', untilOn: '2027-12-01' };
    const edit = () => administrator.patch(`/enrolments/${place.id}`, { version: 0, ...dates });
    await edit().expect(200);
    await edit().expect(409);
    const name = `Programme ${id}`;
    await administrator
      .post('/programmes', { id: randomUUID(), name, description: '' })
      .expect(422);
  });

  it('offers the places that can be enrolled', async () => {
    const id = await begin();
    await enrol(id, enrolment('store', fleet.storeId)).expect(200);
    const region = await as('regional-facility-manager', { kind: 'region', id: fleet.regionId });
    const found = await region.get(`/programmes/${id}/places?kind=region`).expect(200);
    expect(found.body.rows.map((row: { id: string }) => row.id)).toEqual([fleet.regionId]);
    const units = await administrator.get(`/programmes/${id}/places?kind=unit&q=F-1`).expect(200);
    expect(units.body.rows.find((row: { id: string }) => row.id === far.unitId)).toMatchObject({
      reach: { stores: 1, units: 1 },
      enrolled: false,
    });
    const stores = await administrator.get(`/programmes/${id}/places?kind=store`).expect(200);
    const own = stores.body.rows.find((row: { id: string }) => row.id === fleet.storeId);
    expect(own.enrolled).toBe(true);
  });
});
