import { randomUUID } from 'node:crypto';
import { type Fleet, insert, makeFleet, makePerson } from '@test/factories/organisation-factory';
import { type Browser, type TestApp, demoPassword, testApp } from '@test/support/test-app';

const passphrase = 'harbour lantern sixteen';

describe('people', () => {
  let app: TestApp;
  let fleet: Fleet;
  let administrator: Browser;

  beforeAll(async () => {
    app = await testApp();
    app.setNow('2026-06-10T12:00:00Z');
    fleet = await makeFleet(app.db);
    const { email } = await makePerson(app.db, fleet.organisationId, 'administrator');
    administrator = await app.browser().signIn(email);
  });
  afterAll(() => app.close());

  const region = () => ({ kind: 'region', id: fleet.regionId }) as const;
  const technicianHere = () => ({
    role: 'technician',
    scopeKind: 'region',
    scopeId: fleet.regionId,
  });

  const invitation = (more: object = {}) => ({
    id: randomUUID(),
    name: 'Rosa Delgado',
    email: `${randomUUID()}@kettle.example`,
    locale: 'es',
    timeZone: 'America/Chicago',
    homePostalCode: '60601',
    roles: [technicianHere()],
    ...more,
  });

  async function letterTo(email: string): Promise<{ locale: string; token: string }[]> {
    const [rows] = await app.db.owner.query(
      'SELECT locale, plain FROM letters WHERE to_address = $1 ORDER BY created_at, id',
      { bind: [email] },
    );
    return (rows as { locale: string; plain: string }[]).map(({ locale, plain }) => ({
      locale,
      token: /invitation\/([\w-]{43})\s/.exec(plain)?.[1] ?? '',
    }));
  }

  /** A browser in which nobody is signed in, with the token that every page gets first. */
  async function stranger() {
    const browser = app.browser();
    await browser.signIn('nobody@kettle.example', 'x').catch(() => undefined);
    return browser;
  }

  describe('invitation', () => {
    it('leads by the letter’s link to a password and the roles that were given', async () => {
      const sent = invitation();
      const { body } = await administrator.post('/people', sent).expect(200);
      expect(body).toMatchObject({
        standing: 'invited',
        invitedUntil: '2026-06-17T12:00:00.000Z',
        home: { city: 'Chicago' },
        roles: [{ role: 'technician', scopeName: expect.stringContaining('Region') }],
      });
      const [letter] = await letterTo(sent.email);
      expect(letter?.locale).toBe('es');

      const browser = await stranger();
      const read = await browser.get(`/invitations/${letter?.token}`).expect(200);
      expect(read.body).toMatchObject({ email: sent.email, organisationName: 'Kettle & Flue' });
      expect(read.body.invitedBy).toMatch(/^Person /);
      const { body: refused } = await browser
        .put(`/invitations/${letter?.token}`, { password: 'rosa delgado', name: 'Rosa Delgado' })
        .expect(422);
      expect(refused.errors[0]).toMatchObject({ field: 'password', reason: 'password-common' });
      const accepted = { password: passphrase, name: 'Rosa M. Delgado' };
      await browser.put(`/invitations/${letter?.token}`, accepted).expect(204);
      await browser.put(`/invitations/${letter?.token}`, accepted).expect(410);
      await browser.get(`/invitations/${letter?.token}`).expect(410);

      const signedIn = await app.browser().signIn(sent.email, passphrase);
      const session = await signedIn.get('/session').expect(200);
      expect(session.body.person).toMatchObject({ name: 'Rosa M. Delgado', locale: 'es' });
      expect(session.body.abilities).toContain('today.read');
      const now = await administrator.get(`/people/${sent.id}`).expect(200);
      expect(now.body).toMatchObject({ standing: 'active', invitedUntil: null });
    });

    it('is written once when sent twice, and anew when asked for', async () => {
      const sent = invitation();
      await administrator.post('/people', sent).expect(200);
      await administrator.post('/people', sent).expect(200);
      expect(await letterTo(sent.email)).toHaveLength(1);
      app.setNow('2026-06-12T12:00:00Z');
      await administrator.post(`/people/${sent.id}/invitation`).expect(200);
      app.setNow('2026-06-10T12:00:00Z');
      const [first, second] = await letterTo(sent.email);
      const browser = await stranger();
      await browser.get(`/invitations/${first?.token}`).expect(410);
      await browser.get(`/invitations/${second?.token}`).expect(200);
    });

    it('names every field at fault at once, and the one that the server finds', async () => {
      const { body } = await administrator
        .post('/people', invitation({ email: 'rosa', name: ' ', homePostalCode: '606', roles: [] }))
        .expect(422);
      expect(body.errors.map(({ field }: { field: string }) => field).sort()).toEqual([
        'email',
        'homePostalCode',
        'name',
        'roles',
      ]);
      const fault = async (more: object) =>
        (await administrator.post('/people', invitation(more)).expect(422)).body.errors[0];
      const sent = invitation();
      await administrator.post('/people', sent).expect(200);
      expect(await fault({ email: sent.email.toUpperCase() })).toMatchObject({
        field: 'email',
        reason: 'taken',
      });
      expect(await fault({ homePostalCode: '00000' })).toMatchObject({ field: 'homePostalCode' });
      expect(
        await fault({ roles: [{ ...technicianHere(), scopeId: randomUUID() }] }),
      ).toMatchObject({ field: 'roles.0', reason: 'unknown' });
    });

    it('takes no place of another organisation', async () => {
      const other = await makeFleet(app.db);
      const { body } = await administrator
        .post('/people', invitation({ roles: [{ ...technicianHere(), scopeId: other.regionId }] }))
        .expect(422);
      expect(body.errors[0].field).toBe('roles.0');
    });
  });

  describe('roles', () => {
    it('change from the next request on', async () => {
      const { id, email } = await makePerson(app.db, fleet.organisationId, 'technician', region());
      const theirs = await app.browser().signIn(email);
      await theirs.get('/people').expect(403);
      const roles = [
        { role: 'regional-facility-manager', scopeKind: 'region', scopeId: fleet.regionId },
      ];
      const { body } = await administrator
        .put(`/people/${id}/roles`, { version: 0, roles })
        .expect(200);
      expect(body.roles).toMatchObject(roles);
      await theirs.get('/people').expect(200);
      await administrator.put(`/people/${id}/roles`, { version: 0, roles }).expect(409);
    });

    it('reach no further than whoever gives them', async () => {
      const chain = { kind: 'chain', id: fleet.chainId } as const;
      const own = await makePerson(app.db, fleet.organisationId, 'administrator', chain);
      const chainAdministrator = await app.browser().signIn(own.email);
      const over = (scopeKind: string, scopeId: string) =>
        invitation({ roles: [{ role: 'administrator', scopeKind, scopeId }] });
      await chainAdministrator.post('/people', over('chain', fleet.chainId)).expect(200);
      await chainAdministrator.post('/people', over('store', fleet.storeId)).expect(200);
      await chainAdministrator.post('/people', over('region', fleet.regionId)).expect(403);
      await chainAdministrator
        .post('/people', over('organisation', fleet.organisationId))
        .expect(403);
      const roles = [
        { role: 'administrator', scopeKind: 'organisation', scopeId: fleet.organisationId },
      ];
      await chainAdministrator.put(`/people/${own.id}/roles`, { version: 0, roles }).expect(403);
      // Whoever holds something outside is not theirs to change.
      const { id } = await makePerson(app.db, fleet.organisationId, 'technician', region());
      await chainAdministrator.post(`/people/${id}/deactivate`, { version: 0 }).expect(403);
    });

    it('leave one administrator, even when two take each other’s at once', async () => {
      const mine = await makeFleet(app.db);
      const [one, two] = [
        await makePerson(app.db, mine.organisationId, 'administrator'),
        await makePerson(app.db, mine.organisationId, 'administrator'),
      ];
      const [first, second] = [
        await app.browser().signIn(one.email),
        await app.browser().signIn(two.email),
      ];
      const roles = [{ role: 'trainer', scopeKind: 'organisation', scopeId: mine.organisationId }];
      const replies = await Promise.all([
        first.put(`/people/${two.id}/roles`, { version: 0, roles }),
        second.put(`/people/${one.id}/roles`, { version: 0, roles }),
      ]);
      const statuses = replies.map(({ status }) => status).sort();
      // The later one has lost the role by then (403) or finds itself the last (409).
      expect(statuses[0]).toBe(200);
      expect([403, 409]).toContain(statuses[1]);
      const [left] = await app.db.owner.query(
        `SELECT id FROM role_grants WHERE organisation_id = $1 AND role = 'administrator'`,
        { bind: [mine.organisationId] },
      );
      expect(left).toHaveLength(1);
    });
  });

  describe('deactivation', () => {
    it('ends sessions and links at once, and can be taken back', async () => {
      const { id, email } = await makePerson(app.db, fleet.organisationId, 'technician', region());
      const theirs = await app.browser().signIn(email);
      const { body } = await administrator
        .post(`/people/${id}/deactivate`, { version: 0 })
        .expect(200);
      expect(body.standing).toBe('deactivated');
      await theirs.get('/session').expect(401);
      await expect(app.browser().signIn(email, demoPassword)).rejects.toThrow('401');
      await administrator.post(`/people/${id}/activate`, { version: body.version }).expect(200);
      await app.browser().signIn(email, demoPassword);
    });

    it('makes a waiting invitation worthless', async () => {
      const sent = invitation();
      const { body } = await administrator.post('/people', sent).expect(200);
      const [letter] = await letterTo(sent.email);
      await administrator.post(`/people/${sent.id}/deactivate`, body).expect(422);
      await administrator
        .post(`/people/${sent.id}/deactivate`, { version: body.version })
        .expect(200);
      await (await stranger()).get(`/invitations/${letter?.token}`).expect(410);
      await administrator.post(`/people/${sent.id}/invitation`).expect(409);
    });

    it('is not for oneself', async () => {
      const mine = await makeFleet(app.db);
      const { id, email } = await makePerson(app.db, mine.organisationId, 'administrator');
      const browser = await app.browser().signIn(email);
      await browser.post(`/people/${id}/deactivate`, { version: 0 }).expect(409);
      expect((await browser.get(`/people/${id}`)).body.mayDeactivate).toBe(false);
    });
  });

  describe('details', () => {
    it('put a technician’s home where the ZIP code lies, and forget it', async () => {
      const { id } = await makePerson(app.db, fleet.organisationId, 'technician', region());
      const details = {
        name: 'Walt',
        locale: 'en',
        timeZone: 'America/Phoenix',
        homePostalCode: '85004',
      };
      const { body } = await administrator
        .patch(`/people/${id}`, { version: 0, ...details })
        .expect(200);
      // The Census Bureau's gazetteer puts this ZIP code area near 33.45° N, 112.07° W.
      expect(body.home).toMatchObject({ city: 'Phoenix' });
      expect(body.home.latitude).toBeCloseTo(33.45, 1);
      expect(body.home.longitude).toBeCloseTo(-112.07, 1);
      const gone = await administrator
        .patch(`/people/${id}`, { version: 1, ...details, homePostalCode: null })
        .expect(200);
      expect(gone.body).toMatchObject({ home: null, homeKnown: false, version: 2 });
    });
  });

  describe('list', () => {
    const names = (body: { rows: { name: string }[] }) => body.rows.map(({ name }) => name);

    it('filters, searches, sorts and pages', async () => {
      const mine = await makeFleet(app.db);
      const own = mine.organisationId;
      const store = { kind: 'store', id: mine.storeId } as const;
      const here = { kind: 'region', id: mine.regionId } as const;
      const { email } = await makePerson(app.db, own, 'administrator', undefined, { name: 'Ada' });
      await makePerson(app.db, own, 'technician', here, { name: 'Walt' });
      await makePerson(app.db, own, 'store-manager', store, { name: 'Rosa' });
      await makePerson(app.db, own, 'trainer', undefined, {
        name: 'Toby',
        disabled_at: new Date(),
      });
      const browser = await app.browser().signIn(email);
      const list = async (query: string) =>
        (await browser.get(`/people?${query}`).expect(200)).body;
      expect(names(await list(''))).toEqual(['Ada', 'Rosa', 'Walt']);
      expect(names(await list('standing=all&sort=-name'))).toEqual(['Walt', 'Toby', 'Rosa', 'Ada']);
      expect(names(await list('standing=deactivated'))).toEqual(['Toby']);
      expect(names(await list('role=technician'))).toEqual(['Walt']);
      expect(names(await list(`region=${mine.regionId}`))).toEqual(['Rosa', 'Walt']);
      expect(names(await list('q=STORE-MANAGER'))).toEqual(['Rosa']);
      const page = await list('page=2&pageSize=2');
      expect([page.total, names(page)]).toEqual([3, ['Walt']]);
    });

    it('is taken away as a file, a line for each role, safe against formulas', async () => {
      const mine = await makeFleet(app.db);
      const own = mine.organisationId;
      const { id, email } = await makePerson(app.db, own, 'administrator', undefined, {
        name: '=1+1',
      });
      await insert(app.db, 'role_grants', {
        organisation_id: own,
        person_id: id,
        role: 'technician',
        scope_kind: 'region',
        scope_id: mine.regionId,
      });
      const browser = await app.browser().signIn(email);
      const { text, headers } = await browser.get('/people/export?format=csv').expect(200);
      expect(headers['content-disposition']).toContain('people-2026-06-10.csv');
      const lines = text.trim().split(/\r?\n/);
      expect(lines).toHaveLength(3);
      expect(lines[0]).toContain('Name');
      expect(lines.slice(1).map((line) => line.split(',')[2])).toEqual([
        'administrator',
        'technician',
      ]);
      expect(text).not.toMatch(/(^|,)"?=1/m);
    });

    it('shows a regional facility manager those who serve the region', async () => {
      const own = await makePerson(
        app.db,
        fleet.organisationId,
        'regional-facility-manager',
        region(),
      );
      const browser = await app.browser().signIn(own.email);
      const elsewhere = await makeFleet(app.db, { organisationId: fleet.organisationId });
      const hidden = await makePerson(app.db, fleet.organisationId, 'technician', {
        kind: 'region',
        id: elsewhere.regionId,
      });
      const seen = await makePerson(app.db, fleet.organisationId, 'store-manager', {
        kind: 'store',
        id: fleet.storeId,
      });
      const { body } = await browser.get('/people?pageSize=200').expect(200);
      const ids = body.rows.map(({ id }: { id: string }) => id);
      expect(ids).toContain(seen.id);
      expect(ids).not.toContain(hidden.id);
      await browser.get(`/people/${hidden.id}`).expect(404);
      const person = await browser.get(`/people/${seen.id}`).expect(200);
      expect(person.body.mayEdit).toBe(false);
      await browser.post('/people', invitation()).expect(403);
      await insert(app.db, 'role_grants', {
        organisation_id: fleet.organisationId,
        person_id: hidden.id,
        role: 'technician',
        scope_kind: 'store',
        scope_id: fleet.storeId,
      });
      await browser.get(`/people/${hidden.id}`).expect(200);
    });
  });
});
