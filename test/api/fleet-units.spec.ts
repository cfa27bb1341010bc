import type { Role, ScopeKind } from '@shared/access/role';
import { type Fleet, insert, makeFleet, makePerson } from '@test/factories/organisation-factory';
import { partBody, storeBody, unitBody } from '@test/factories/fleet-bodies';
import { makeWork } from '@test/factories/task-factory';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';

describe('units and their parts', () => {
  let it_: TestApp;
  let fleet: Fleet;
  let other: Fleet;
  let administrator: Browser;

  const as = async (
    role: Role,
    scope?: { kind: ScopeKind; id: string },
    organisationId?: string,
  ) => {
    const of = organisationId ?? fleet.organisationId;
    const { email } = await makePerson(it_.db, of, role, scope ?? { kind: 'organisation', id: of });
    return it_.browser().signIn(email);
  };
  const addUnit = async (more: object = {}) => {
    const components = [partBody('pump'), partBody('motor'), partBody('pan')];
    const body = unitBody(fleet.storeId, { components, ...more });
    return (await administrator.post('/units', body).expect(200)).body;
  };
  const part = (unit: { components: { kind: string; id: string }[] }, kind: string) =>
    unit.components.find((it) => it.kind === kind) as { id: string; kind: string };
  const asInput = (unit: Record<string, unknown>, more: object = {}) => {
    const { id: _, components: __, ...fields } = unitBody('');
    const kept = Object.fromEntries(Object.keys(fields).map((key) => [key, unit[key]]));
    return { ...kept, version: unit['version'], ...more };
  };
  const errorFields = (body: { errors: { field: string; reason: string }[] }) =>
    body.errors.map(({ field, reason }) => `${field} ${reason}`);

  beforeAll(async () => {
    it_ = await testApp();
    it_.setNow('2026-06-10T12:00:00Z');
    fleet = await makeFleet(it_.db);
    other = await makeFleet(it_.db, { organisationId: fleet.organisationId });
    administrator = await as('administrator');
  });
  afterAll(() => it_.close());

  it('adds a unit with its parts', async () => {
    const unit = await addUnit();
    expect(unit).toMatchObject({
      pumpFace: 'drain-slot',
      oilPounds: 50,
      mayEdit: true,
      version: 0,
    });
    expect(unit.components.map(({ kind }: { kind: string }) => kind)).toEqual([
      'pump',
      'motor',
      'pan',
    ]);
    expect(part(unit, 'motor')).toMatchObject({ nameplate: { amps: 6.8, phase: 1 } });
  });

  it('refuses a unit with every field at fault', async () => {
    const { body: taken } = await administrator.get(`/units/${fleet.unitId}`).expect(200);
    const components = [
      partBody('motor', { pumpFace: 'gasket' }),
      partBody('motor', { installedOn: '2027-01-01' }),
    ];
    const { body } = await administrator
      .post(
        '/units',
        unitBody(fleet.storeId, { tag: taken.tag, installedOn: '2026-06-11', components }),
      )
      .expect(422);
    expect(errorFields(body)).toEqual([
      'components.0.pumpFace pump-only',
      'components.1.installedOn in-future',
      'components.1.kind part-fitted',
      'installedOn in-future',
      'tag unit-tag-taken',
    ]);
    const shape = unitBody(fleet.storeId, { vats: 0, oilPounds: 50.25 });
    const bad = await administrator.post('/units', shape).expect(422);
    expect(bad.body.errors.map(({ field }: { field: string }) => field)).toEqual([
      'vats',
      'oilPounds',
    ]);
  });

  it('changes, moves, retires and restores a unit', async () => {
    const unit = await addUnit();
    const url = `/units/${unit.id}`;
    const moved = await administrator
      .patch(url, asInput(unit, { storeId: other.storeId, vats: 4 }))
      .expect(200);
    expect(moved.body).toMatchObject({ storeId: other.storeId, vats: 4 });
    await administrator.patch(url, asInput(unit)).expect(409);
    const retired = await administrator.post(`${url}/retire`, { version: 1 }).expect(200);
    expect(retired.body.retiredAt).not.toBeNull();
    await administrator.post(`${url}/restore`, { version: 1 }).expect(409);
    await administrator.post(`${url}/restore`, { version: 2 }).expect(200);
    const [rows] = await it_.db.owner.query(
      'SELECT action FROM audit_events WHERE subject_id = $1 ORDER BY id',
      { bind: [unit.id] },
    );
    expect((rows as { action: string }[]).map(({ action }) => action)).toEqual([
      'unit-created',
      'unit-moved',
      'unit-retired',
      'unit-restored',
    ]);
  });

  it('puts no unit into a retired store', async () => {
    const { body: store } = await administrator.post('/stores', storeBody(fleet)).expect(200);
    await administrator.post(`/stores/${store.id}/retire`, { version: 0 }).expect(200);
    const { body } = await administrator.post('/units', unitBody(store.id)).expect(409);
    expect(body.code).toBe('store-retired');
  });

  it('replaces a part with a cause, on one day', async () => {
    const unit = await addUnit();
    const old = part(unit, 'pump');
    const { id, serialNumber, model, nameplate, pumpFace } = partBody('pump', {
      pumpFace: 'gasket',
    });
    const fitted = { id, serialNumber, model, nameplate, pumpFace };
    const replacement = { version: 0, removedOn: '2026-06-09', cause: 'worn-seal', fitted };
    const { body } = await administrator
      .post(`/components/${old.id}/replace`, replacement)
      .expect(200);
    expect(body).toMatchObject({ id, kind: 'pump', installedOn: '2026-06-09', removedOn: null });
    const after = (await administrator.get(`/units/${unit.id}`)).body;
    expect(after.pumpFace).toBe('gasket');
    expect(after.components.at(-1)).toMatchObject({ id: old.id, removalCause: 'worn-seal' });
    const again = { ...replacement, version: 1, fitted: { ...fitted, id: partBody('pump').id } };
    expect(
      (await administrator.post(`/components/${old.id}/replace`, again).expect(409)).body.code,
    ).toBe('came-off');
    const undo = await administrator
      .post(`/components/${old.id}/undo-removal`, { version: 1 })
      .expect(422);
    expect(errorFields(undo.body)).toEqual(['kind part-fitted']);
  });

  it('takes a part off, says it never came off, and fits one that was missing', async () => {
    const unit = await addUnit();
    const pan = part(unit, 'pan');
    const removal = { version: 0, removedOn: '2024-04-30', cause: 'pan-damage' };
    const early = await administrator.post(`/components/${pan.id}/remove`, removal).expect(422);
    expect(errorFields(early.body)).toEqual(['removedOn before-fitting']);
    const on = { ...removal, removedOn: '2026-06-01' };
    await administrator.post(`/components/${pan.id}/remove`, on).expect(200);
    await administrator.post(`/components/${pan.id}/undo-removal`, { version: 1 }).expect(200);
    const double = await administrator
      .post(`/units/${unit.id}/components`, partBody('pan'))
      .expect(422);
    expect(errorFields(double.body)).toEqual(['kind part-fitted']);
    for (let nth = 0; nth < 2; nth += 1) {
      await administrator.post(`/units/${unit.id}/components`, partBody('hose')).expect(200);
    }
    const corrected = { ...partBody('pan', { serialNumber: 'P-77' }), version: 2 };
    const { id: _, kind: __, ...fields } = corrected;
    const { body } = await administrator.patch(`/components/${pan.id}`, fields).expect(200);
    expect(body.serialNumber).toBe('P-77');
    await administrator.patch(`/components/${pan.id}`, fields).expect(409);
  });

  it('tells the life of a unit', async () => {
    const unit = await addUnit();
    const pump = part(unit, 'pump');
    const { id, kind: _, installedOn: __, ...fields } = partBody('pump');
    const replacement = {
      version: 0,
      removedOn: '2026-06-09',
      cause: 'worn-seal',
      fitted: { id, ...fields },
    };
    await administrator.post(`/components/${pump.id}/replace`, replacement).expect(200);
    const { id: personId } = await makePerson(it_.db, fleet.organisationId, 'technician');
    const work = await makeWork(it_.db, fleet);
    const own = {
      organisation_id: fleet.organisationId,
      store_id: fleet.storeId,
      unit_id: unit.id,
    };
    const inspectionId = await insert(it_.db, 'inspections', {
      ...own,
      task_id: await work.makeTask(),
      procedure_version_id: work.procedureVersionId,
      person_id: personId,
      finished_at: '2026-06-08T15:00:00Z',
    });
    await insert(it_.db, 'findings', {
      ...own,
      inspection_id: inspectionId,
      component_kind: 'pump',
      cause: 'worn-seal',
      severity: 'stop',
      found_at: '2026-06-08T15:00:00Z',
      found_by: personId,
    });
    const { body } = await administrator.get(`/units/${unit.id}/life`).expect(200);
    expect(
      body.events.map((it: { kind: string; at: string; componentKind: string }) => [
        it.kind,
        it.at,
        it.componentKind,
      ]),
    ).toEqual(
      [
        ['replaced', '2026-06-09T17:00:00.000Z', 'pump'],
        ['found', '2026-06-08T15:00:00.000Z', 'pump'],
        ['inspected', '2026-06-08T15:00:00.000Z', null],
        ...['motor', 'pan', 'pump', null].map((kind) => [
          'installed',
          '2024-05-01T17:00:00.000Z',
          kind,
        ]),
      ]
        .sort(([, a], [, b]) => String(b).localeCompare(String(a)))
        .map((it) => expect.arrayContaining(it)),
    );
    const row = (await administrator.get(`/units?q=${unit.tag}`)).body.rows[0];
    expect(row).toMatchObject({ openFindings: 1, lastInspectedAt: '2026-06-08T15:00:00.000Z' });
  });

  it('lists units and parts with filters, sorts and pages', async () => {
    const { body: store } = await administrator.post('/stores', storeBody(fleet)).expect(200);
    for (const [tag, kind, face] of [
      ['F-10', 'built-in', 'gasket'],
      ['F-2', 'built-in', 'drain-slot'],
      ['P-1', 'portable', 'drain-slot'],
    ]) {
      const components = [partBody('pump', { pumpFace: face }), partBody('motor')];
      await administrator.post('/units', unitBody(store.id, { tag, kind, components })).expect(200);
    }
    const tags = async (query: string) =>
      (await administrator.get(`/units?store=${store.id}&${query}`).expect(200)).body.rows.map(
        (row: { tag: string }) => row.tag,
      );
    expect(await tags('')).toEqual(['F-2', 'F-10', 'P-1']);
    expect(await tags('sort=-tag')).toEqual(['P-1', 'F-10', 'F-2']);
    expect(await tags('face=drain-slot&kind=built-in')).toEqual(['F-2']);
    expect(await tags('sort=-inspected&pageSize=1')).toHaveLength(1);
    const parts = await administrator
      .get(`/components?store=${store.id}&kind=pump&sort=-installed`)
      .expect(200);
    expect(parts.body.total).toBe(3);
    const serial = parts.body.rows[0].serialNumber;
    const found = await administrator.get(`/components?q=${serial}&state=all`).expect(200);
    expect(found.body.rows.map((row: { serialNumber: string }) => row.serialNumber)).toContain(
      serial,
    );
  });

  it.each([
    ['technician', 403],
    ['store-manager', 403],
    ['account-owner', 403],
    ['regional-facility-manager', 200],
  ] as const)('lets nobody change what is not theirs to change: %s, %d', async (role, status) => {
    const unit = await addUnit();
    const browser = await as(role, { kind: 'region', id: fleet.regionId });
    await browser.get(`/units/${unit.id}`).expect(200);
    await browser.patch(`/units/${unit.id}`, asInput(unit)).expect(status);
    await browser.post(`/units/${unit.id}/components`, partBody('hose')).expect(status);
    await browser.post('/units', unitBody(other.storeId)).expect(status === 200 ? 404 : 403);
    const away = await as(role, { kind: 'region', id: other.regionId });
    await away.get(`/units/${unit.id}`).expect(404);
    await away.get(`/units/${unit.id}/life`).expect(404);
  });

  it('shows nothing to another organisation', async () => {
    const unit = await addUnit();
    const elsewhere = await makeFleet(it_.db);
    const stranger = await as('administrator', undefined, elsewhere.organisationId);
    await stranger.get(`/units/${unit.id}`).expect(404);
    await stranger.post(`/units/${unit.id}/retire`, { version: 0 }).expect(404);
    await stranger
      .post(`/components/${part(unit, 'pump').id}/undo-removal`, { version: 0 })
      .expect(404);
    await stranger.post('/units', unitBody(fleet.storeId)).expect(404);
    expect((await stranger.get('/units')).body.total).toBe(1);
    expect((await stranger.get('/components')).body.total).toBe(0);
  });
});
