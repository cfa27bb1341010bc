import { fork } from 'node:child_process';
import { once } from 'node:events';
import { setTimeout as wait } from 'node:timers/promises';
import { check, csv, upload, uploadAndCheck, work } from '@test/factories/import-files';
import { makeFleet, makePerson } from '@test/factories/organisation-factory';
import { type TestObjectStore, testObjectStore } from '@test/support/object-store';
import { type Browser, type TestApp, testApp } from '@test/support/test-app';

const ROWS = 3_000;

describe('imports whose worker is lost', () => {
  let objects: TestObjectStore;
  let it_: TestApp;
  let administrator: Browser;

  const row = async <T>(sql: string, bind: unknown[] = []) => {
    const [[found]] = (await it_.db.owner.query(sql, { bind })) as unknown as [[T]];
    return found;
  };
  const units = async (chain: string) =>
    (
      await row<{ n: number }>(
        `SELECT count(*)::int AS n FROM units u JOIN stores s ON s.id = u.store_id
         JOIN chains c ON c.id = s.chain_id WHERE c.name = $1`,
        [chain],
      )
    ).n;
  const fileOf = (chain: string) =>
    csv(
      [
        'Chain',
        'Region',
        'Store number',
        'Store name',
        'ZIP',
        'Unit',
        'Vats',
        'Pump serial',
        'Installed',
      ],
      ...Array.from({ length: ROWS }, (_, at) => {
        const store = Math.floor(at / 5);
        return [
          chain,
          'North',
          store,
          `S ${store}`,
          '60601',
          `F-${at % 5}`,
          2,
          `P-${at}`,
          '2024-01-01',
        ];
      }),
    );
  const jobOf = (id: string) =>
    row<{ id: string; done: number; state: string; attempts: number }>(
      'SELECT j.* FROM imports i JOIN long_jobs j ON j.id = i.job_id WHERE i.id = $1',
      [id],
    );
  /** Lets a worker process begin, and kills it once it has come as far as is asked. */
  const killedAt = async (id: string, reached: (done: number) => boolean) => {
    const worker = fork(`${__dirname}/../support/importing-worker.ts`, [], {
      execArgv: ['--import', 'tsx'],
      env: { ...process.env, DATABASE_URL: it_.db.appUrl },
    });
    const gone = once(worker, 'exit');
    while (!reached((await jobOf(id)).done)) await wait(5);
    worker.kill('SIGKILL');
    await gone;
    const { state, done } = await jobOf(id);
    expect(state).toBe('running');
    expect(done).toBeLessThan(ROWS);
    await it_.db.owner.query('UPDATE long_jobs SET leased_until = now() WHERE id = $1', {
      bind: [(await jobOf(id)).id],
    });
    return done;
  };

  beforeAll(async () => {
    objects = await testObjectStore();
    it_ = await testApp();
    const { organisationId } = await makeFleet(it_.db);
    const { email } = await makePerson(it_.db, organisationId, 'administrator');
    administrator = await it_.browser().signIn(email);
  });
  afterAll(async () => {
    await it_.close();
    await objects.close();
  });

  it.each(['all-or-nothing', 'good-rows'])(
    'are brought to their end by the next: %s',
    async (mode) => {
      const view = await uploadAndCheck(it_, administrator, 'units', fileOf(mode));
      const { id, version } = view;
      await administrator.post(`/imports/${id}/start`, { version, mode }).expect(200);
      const done = await killedAt(id, (it) => it >= 1_000);
      expect(await units(mode)).toBe(mode === 'good-rows' ? done : 0);
      await work(it_);
      const { body } = await administrator.get(`/imports/${id}`).expect(200);
      expect(body).toMatchObject({
        state: 'imported',
        imported: {
          rows: ROWS,
          units: { made: ROWS, changed: 0, same: 0 },
          stores: { made: ROWS / 5, changed: 0, same: 0 },
          components: { made: ROWS },
        },
      });
      expect(await units(mode)).toBe(ROWS);
      expect((await jobOf(id)).attempts).toBe(2);
    },
  );

  it('stop where they are told to, and can be looked at again', async () => {
    const { body: sent } = await upload(administrator, 'units', fileOf('Stopped')).expect(200);
    const view = await check(it_, administrator, sent);
    const { id, version } = view;
    await administrator.post(`/imports/${id}/start`, { version, mode: 'good-rows' }).expect(200);
    const { body } = await administrator.post(`/imports/${id}/cancel`).expect(200);
    expect(body.state).toBe('cancelled');
    expect(await work(it_)).toBe(0);
    expect(await units('Stopped')).toBe(0);
    expect((await check(it_, administrator, body)).state).toBe('checked');
  });
});
