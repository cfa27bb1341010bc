import { readTable } from '@server/imports/read-table';
import { partBody, unitBody } from '@test/factories/fleet-bodies';
import { type Fleet, insert, makeFleet, makePerson } from '@test/factories/organisation-factory';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';

describe('exports of the fleet', () => {
  let it_: TestApp;
  let fleet: Fleet;
  let administrator: Browser;

  const binary = (browser: Browser, path: string) =>
    browser
      .get(path)
      .buffer(true)
      .parse((res, done) => {
        const chunks: Buffer[] = [];
        res.on('data', (chunk: Buffer) => chunks.push(chunk));
        res.on('end', () => done(null, Buffer.concat(chunks)));
      })
      .expect(200);
  const rowsOf = async (browser: Browser, path: string) => {
    const { body } = await binary(browser, path);
    const rows: (readonly string[])[] = [];
    const format = path.includes('format=xlsx') ? 'xlsx' : 'csv';
    for await (const { cells } of readTable(body as Buffer, format)) rows.push(cells);
    return rows;
  };

  beforeAll(async () => {
    it_ = await testApp();
    it_.setNow('2026-06-10T03:00:00Z');
    fleet = await makeFleet(it_.db);
    const { email } = await makePerson(it_.db, fleet.organisationId, 'administrator');
    administrator = await it_.browser().signIn(email);
    const body = unitBody(fleet.storeId, {
      tag: '=cmd',
      components: [partBody('pump', { serialNumber: 'P-9' }), partBody('motor')],
    });
    await administrator.post('/units', body).expect(200);
  });
  afterAll(() => it_.close());

  it.each(['csv', 'xlsx'])('give the units of a list with store and parts: %s', async (format) => {
    const rows = await rowsOf(administrator, `/units/export?format=${format}&q=cmd`);
    expect(rows).toHaveLength(2);
    const [headings = [], unit = []] = rows;
    const of = (heading: string) => unit[headings.indexOf(heading)];
    expect(of('Unit')).toBe('=cmd');
    expect(of('Kind of unit')).toBe('Built-in filter');
    expect(of('Pump serial number')).toBe('P-9');
    expect(of('Pump face')).toBe('Drain slot');
    expect(of('Installed on')).toBe('2024-05-01');
    expect(of('Amps')).toBe('6.8');
    expect(of('Longitude')).toBe('-87.63');
  });

  it('name the file by the day in the reader’s zone, in their language', async () => {
    const { email } = await makePerson(it_.db, fleet.organisationId, 'administrator', undefined, {
      locale: 'es',
    });
    const spanish = await it_.browser().signIn(email);
    const reply = await spanish.get('/stores/export?format=csv').expect(200);
    expect(reply.headers['content-disposition']).toBe(
      'attachment; filename="locales-2026-06-09.csv"',
    );
    expect(reply.headers['content-type']).toBe('text/csv; charset=utf-8');
    expect(reply.text).toContain('Cadena,Región,"Número de local"');
  });

  it('give chains, regions, stores and parts', async () => {
    for (const path of ['chains', 'regions', 'stores']) {
      expect(await rowsOf(administrator, `/${path}/export?format=csv`)).toHaveLength(2);
    }
    const parts = await rowsOf(administrator, '/components/export?format=csv&kind=motor');
    expect(parts.map((row) => row[4])).toEqual(['Part', 'Motor']);
  });

  it('hold what the reader may see, all of it, and not what others have', async () => {
    const { organisationId, chainId, regionId } = fleet;
    const other = await makeFleet(it_.db, { organisationId, chainId, regionId });
    await makeFleet(it_.db);
    const scope = { kind: 'store', id: other.storeId } as const;
    const { email } = await makePerson(it_.db, organisationId, 'store-manager', scope);
    const manager = await it_.browser().signIn(email);
    expect(await rowsOf(manager, '/stores/export?format=csv')).toHaveLength(2);
    for (let count = 0; count < 3; count += 1) {
      await it_.db.owner.query(
        `INSERT INTO units (id, organisation_id, store_id, tag, kind, vats)
         SELECT gen_random_uuid(), $1, $2, 'X' || $3 || '-' || n, 'portable', 1
         FROM generate_series(1, 1000) n`,
        { bind: [organisationId, other.storeId, count] },
      );
    }
    expect(await rowsOf(manager, '/units/export?format=csv')).toHaveLength(3002);
    await insert(it_.db, 'units', {
      organisation_id: organisationId,
      store_id: other.storeId,
      tag: 'Last',
      kind: 'portable',
      vats: 1,
      retired_at: '2026-01-01T12:00:00Z',
    });
    const all = await rowsOf(manager, '/units/export?format=xlsx&state=all&sort=-tag');
    expect(all).toHaveLength(3003);
    expect(all.flat()).toContain('2026-01-01 06:00');
  });

  it('refuse what no list allows', async () => {
    await administrator.get('/units/export?format=pdf').expect(422);
    await it_.browser().get('/units/export?format=csv').expect(401);
  });
});
