import { type Fleet, makeFleet, makePerson } from '@test/factories/organisation-factory';
import { check, csv, takeIn, upload, uploadAndCheck, work } from '@test/factories/import-files';
import { type TestObjectStore, testObjectStore } from '@test/support/object-store';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';

describe('imports of the fleet', () => {
  let objects: TestObjectStore;
  let it_: TestApp;
  let fleet: Fleet;
  let administrator: Browser;

  const headings = ['Chain', 'Region', 'Store #', 'Store name', 'ZIP', 'Tag', 'Vats', 'Installed'];
  const problemsOf = async (id: string) =>
    (await administrator.get(`/imports/${id}/problems?pageSize=200`).expect(200)).body.rows as {
      row: number;
      field: string;
      column: string;
      reason: string;
      message: string;
    }[];
  const count = async (table: string) => {
    const [[row]] = (await it_.db.owner.query(`SELECT count(*)::int AS n FROM ${table}`)) as [
      [{ n: number }],
      unknown,
    ];
    return row.n;
  };

  beforeAll(async () => {
    objects = await testObjectStore();
    it_ = await testApp();
    it_.setNow('2026-06-10T12:00:00Z');
    fleet = await makeFleet(it_.db);
    const { email } = await makePerson(it_.db, fleet.organisationId, 'administrator');
    administrator = await it_.browser().signIn(email);
  });
  afterAll(async () => {
    await it_.close();
    await objects.close();
  });

  it('make chains, regions, stores, units and parts of one file, and no doubles when repeated', async () => {
    const file = csv(
      [...headings, 'Pump serial', 'Pump face', 'Amps', 'Motor installed on'],
      [
        'Gull & Oar',
        'North',
        '0101',
        'Pier',
        '60601',
        'F-1',
        3,
        '5/31/2024',
        'P-1',
        'drain slot',
        6.8,
        '2024-06-01',
      ],
      ['Gull & Oar', 'North', '0101', '', '', 'F-2', 2, '5/31/2024', 'P-2', 'gasket', '', ''],
      ['gull & oar', 'South', '102', 'Mill', '85004', 'F-1', 1, '', '', '', '', ''],
    );
    const imported = await takeIn(it_, administrator, 'units', file);
    expect(imported).toMatchObject({
      state: 'imported',
      imported: {
        rows: 3,
        badRows: 0,
        chains: { made: 1 },
        regions: { made: 2 },
        stores: { made: 2 },
        units: { made: 3 },
        components: { made: 3 },
        newChains: ['Gull & Oar'],
      },
    });
    const { body: stores } = await administrator.get('/stores?q=Gull').expect(200);
    expect(stores.rows.map((row: { timeZone: string }) => row.timeZone)).toEqual([
      'America/Phoenix',
      'America/Chicago',
    ]);
    // A spreadsheet took the leading zero off: it is still the same store.
    const again = Buffer.from(file.toString().replaceAll('0101', '101'));
    const repeated = await takeIn(it_, administrator, 'units', again);
    expect(repeated.imported).toMatchObject({
      chains: { made: 0, changed: 0, same: 1 },
      stores: { made: 0, changed: 0, same: 2 },
      units: { made: 0, changed: 0, same: 3 },
      components: { made: 0, changed: 0, same: 3 },
    });
    const changed = Buffer.from(file.toString().replace('F-1,3', 'F-1,4'));
    const { imported: third } = await takeIn(it_, administrator, 'units', changed);
    expect(third).toMatchObject({ units: { made: 0, changed: 1, same: 2 } });
  });

  it('say what is wrong by row, column and in words, and take in nothing or the good rows', async () => {
    const file = csv(
      headings,
      ['Tern', 'North', '1', 'One', '60601', 'F-1', 'two', '5/31/2024'],
      ['Tern', 'North', '1', 'One', '60601', 'F-2', 13, '2/30/2024'],
      ['Tern', 'North', '2', 'Two', '99999', 'F-1', 2, '6/30/2026'],
      ['Tern', 'North', '3', '', '', 'F-1', 2, ''],
      ['Tern', 'North', '4', 'Four', '60601', 'F-1', 2, ''],
      ['Tern', 'North', '4', 'Fuor', '60601', 'F-2', 2, ''],
      ['Tern', 'North', '4', 'Four', '60601', 'f-1', 2, ''],
      ['Tern', 'North', '', 'Five', '60601', 'F-1', 2, ''],
      ['Tern', '', '6', 'Six', '60601', 'F-1', '', ''],
    );
    const before = await count('units');
    const view = await uploadAndCheck(it_, administrator, 'units', file);
    expect(view.checked).toMatchObject({ rows: 9, goodRows: 1, badRows: 8 });
    const found = (await problemsOf(view.id)).map((it) => [it.row, it.column, it.reason]);
    expect(found).toEqual([
      [2, 'G', 'not-a-number'],
      [3, 'G', 'out-of-range'],
      [3, 'H', 'not-a-date'],
      [4, 'E', 'position-unknown'],
      [5, 'C', 'store-unknown'],
      [7, 'D', 'differs'],
      [8, 'F', 'doubled'],
      [9, 'C', 'needed'],
      [10, 'B', 'needed'],
    ]);
    expect((await problemsOf(view.id))[0]?.message).toBe('“two” is not a number.');
    const { id, version } = view;
    const refused = await administrator
      .post(`/imports/${id}/start`, { version, mode: 'all-or-nothing' })
      .expect(409);
    expect(refused.body.code).toBe('rows-at-fault');
    expect(await count('units')).toBe(before);
    await administrator.post(`/imports/${id}/start`, { version, mode: 'good-rows' }).expect(200);
    await work(it_);
    const { body: done } = await administrator.get(`/imports/${id}`).expect(200);
    expect(done).toMatchObject({ state: 'imported', imported: { units: { made: 1 }, badRows: 8 } });
    expect(await count('units')).toBe(before + 1);
    const file2 = await administrator.get(`/imports/${id}/problems/export?format=csv`).expect(200);
    expect(file2.text).toContain('2,G,Vats,two,"“two” is not a number."');
  });

  it('read what spreadsheets of the Spanish world write', async () => {
    const text =
      'Cadena;Región;Nº de local;Nombre;Código postal;Abre;Cierra\r\n' +
      'Peñón;Región Ñ;7;Señor Pez;33101;6:30;11:00 p.m.\r\n';
    const view = await uploadAndCheck(it_, administrator, 'stores', Buffer.from(text, 'latin1'));
    expect(view.checked).toMatchObject({
      goodRows: 1,
      newChains: ['Peñón'],
      newRegions: ['Región Ñ'],
    });
    expect(view.columns.map(({ field }: { field: string }) => field)).toEqual([
      'chain',
      'region',
      'storeNumber',
      'storeName',
      'postalCode',
      'opens',
      'closes',
    ]);
  });

  it('take parts in by store and unit, and refuse to hide a replacement', async () => {
    const chain = 'Skua';
    const rows = (serial: string) =>
      csv(
        ['Chain', 'Store number', 'Unit', 'Part', 'Serial number', 'Installed on', 'Volts'],
        [chain, 9, 'F-1', 'Bomba', serial, '2024-01-05', ''],
        [chain, 9, 'F-1', 'motor', 'M-1', '2024-01-05', 115],
      );
    const store = [chain, 'North', 9, 'Nine', '60601', 'F-1', 2, ''];
    await takeIn(it_, administrator, 'units', csv(headings, store));
    const { imported } = await takeIn(it_, administrator, 'components', rows('P-1'));
    expect(imported.components).toEqual({ made: 2, changed: 0, same: 0 });
    const view = await uploadAndCheck(it_, administrator, 'components', rows('P-2'));
    expect(await problemsOf(view.id)).toMatchObject([{ row: 2, reason: 'part-differs' }]);
  });

  it('take nothing in when the fleet changed since the check', async () => {
    const store = ['Fulmar', 'North', 1, 'Late', '60601', 'F-1', 2, ''];
    await takeIn(it_, administrator, 'units', csv(headings, store));
    const file = csv(headings, store, ['Fulmar', 'North', 2, 'New', '60601', 'F-9', 2, '']);
    const { id, version } = await uploadAndCheck(it_, administrator, 'units', file);
    await it_.db.owner.query(`UPDATE stores SET retired_at = now() WHERE name = 'Late'`);
    await administrator
      .post(`/imports/${id}/start`, { version, mode: 'all-or-nothing' })
      .expect(200);
    const before = await count('units');
    await work(it_);
    const { body } = await administrator.get(`/imports/${id}`).expect(200);
    expect(body.state).toBe('failed');
    expect(body.error).toContain('Nothing was taken in');
    expect(await problemsOf(id)).toMatchObject([{ row: 2, reason: 'retired' }]);
    expect(await count('units')).toBe(before);
  });

  it('let people correct the columns, once each, all that are needed', async () => {
    const { body } = await upload(administrator, 'chains', csv(['Whatever'], ['Puffin'])).expect(
      200,
    );
    expect(body).toMatchObject({ state: 'mapping', columns: [{ field: 'chain' }] });
    const wrong = await administrator
      .post(`/imports/${body.id}/check`, { version: 0, fields: ['vats'], dateOrder: 'mdy' })
      .expect(422);
    expect(wrong.body.errors.map((it: { reason: string }) => it.reason)).toEqual([
      'not-of-kind',
      'needed',
    ]);
    expect((await check(it_, administrator, body)).checked).toMatchObject({ chains: { made: 1 } });
  });

  it('refuse files that are no tables', async () => {
    const refuse = async (file: Buffer, status: number) =>
      expect((await upload(administrator, 'units', file)).status).toBe(status);
    await refuse(Buffer.from('PK\u0003\u0004 not really'), 422);
    await refuse(Buffer.from([0xd0, 0xcf, 0x11, 0xe0, 1, 2]), 422);
    await refuse(Buffer.from([0x89, 0x50, 0x4e, 0x47, 0, 0]), 422);
    await refuse(Buffer.from('a,b\n'), 422);
    await refuse(Buffer.from('a,b\n"never closed,1\n'), 422);
    await refuse(Buffer.alloc(25_000_001, 'a'), 413);
  });

  it('are for administrators, and nobody sees those of others', async () => {
    const manager = await makePerson(it_.db, fleet.organisationId, 'regional-facility-manager');
    const browser = await it_.browser().signIn(manager.email);
    await upload(browser, 'chains', csv(['Chain'], ['X'])).expect(403);
    const { body } = await upload(administrator, 'chains', csv(['Chain'], ['Private'])).expect(200);
    const elsewhere = await makeFleet(it_.db);
    const other = await makePerson(it_.db, elsewhere.organisationId, 'administrator');
    const stranger = await it_.browser().signIn(other.email);
    await stranger.get(`/imports/${body.id}`).expect(404);
    expect((await stranger.get('/imports').expect(200)).body.total).toBe(0);
    // The same chain and number in another organisation are another store.
    const store = csv(headings, ['Gull & Oar', 'North', '0101', 'Ours', '60601', 'F-1', 3, '']);
    const { imported } = await takeIn(it_, stranger, 'units', store);
    expect(imported).toMatchObject({
      chains: { made: 1 },
      stores: { made: 1 },
      units: { made: 1 },
    });
  });

  it('reach no further than the scope of who imports', async () => {
    const { organisationId, chainId } = fleet;
    const own = await makePerson(it_.db, organisationId, 'administrator', {
      kind: 'chain',
      id: chainId,
    });
    const narrow = await it_.browser().signIn(own.email);
    const file = csv(headings, ['Gull & Oar', 'North', '0101', 'Pier', '60601', 'F-1', 5, '']);
    const view = await uploadAndCheck(it_, narrow, 'units', file);
    expect(view.checked).toMatchObject({ goodRows: 0 });
    const { body } = await narrow.get(`/imports/${view.id}/problems`).expect(200);
    expect(body.rows[0].reason).toBe('not-yours');
  });
});
