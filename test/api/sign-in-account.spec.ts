import { makeFleet, makePerson } from '@test/factories/organisation-factory';
import { demoPassword, type TestApp, testApp } from '@test/support/test-app';

const better = 'harbour lantern sixteen';

describe('own account', () => {
  let app: TestApp;
  let organisationId: string;

  beforeAll(async () => {
    app = await testApp();
    ({ organisationId } = await makeFleet(app.db));
  });
  afterAll(() => app.close());

  const person = (row: object = {}) =>
    makePerson(app.db, organisationId, 'administrator', undefined, row);

  /** The token in the latest letter to an address, as its reader would find it. */
  async function tokenTo(email: string, page: string): Promise<string | undefined> {
    const [letters] = await app.db.owner.query(
      'SELECT plain FROM letters WHERE to_address = $1 ORDER BY created_at DESC, id LIMIT 1',
      { bind: [email] },
    );
    const { plain = '' } = (letters as { plain?: string }[])[0] ?? {};
    return new RegExp(`${page}/([\\w-]{43})\\s`).exec(plain)?.[1];
  }

  async function resetTokenOf(email: string): Promise<string> {
    const browser = app.browser();
    await browser.get('/session');
    await askForReset(email);
    const token = await tokenTo(email, 'reset-password');
    if (!token) throw new Error('No letter with a link.');
    return token;
  }

  async function askForReset(email: string) {
    const browser = await stranger();
    return browser.post('/password-resets', { email }).expect(204);
  }

  /** A browser in which nobody is signed in, with the token that every page gets first. */
  async function stranger() {
    const browser = app.browser();
    await browser.signIn('nobody@kettle.example', 'x').catch(() => undefined);
    return browser;
  }

  describe('forgotten password', () => {
    it('answers an unknown address like a known one, and writes to the known one only', async () => {
      const { email } = await person();
      const known = await askForReset(email.toUpperCase());
      const unknown = await askForReset('nobody.at.all@kettle.example');
      expect(known.body).toEqual(unknown.body);
      expect(await tokenTo(email, 'reset-password')).toHaveLength(43);
      expect(await tokenTo('nobody.at.all@kettle.example', 'reset-password')).toBeUndefined();
    });

    it('sets the password once and ends every session', async () => {
      const { email } = await person();
      const signedIn = await app.browser().signIn(email);
      const token = await resetTokenOf(email);
      const browser = await stranger();
      await browser.put(`/password-resets/${token}`, { password: better }).expect(204);
      await signedIn.get('/session').expect(401);
      await browser.put(`/password-resets/${token}`, { password: demoPassword }).expect(410);
      await expect(app.browser().signIn(email, demoPassword)).rejects.toThrow('401');
      await app.browser().signIn(email, better);
    });

    it('lets one of two through who come at once', async () => {
      const { email } = await person();
      const token = await resetTokenOf(email);
      const [one, two] = [await stranger(), await stranger()];
      const replies = await Promise.all([
        one.put(`/password-resets/${token}`, { password: better }),
        two.put(`/password-resets/${token}`, { password: better }),
      ]);
      expect(replies.map(({ status }) => status).sort()).toEqual([204, 410]);
    });

    it('refuses a poor password by field and keeps the link', async () => {
      const { email } = await person({ name: 'Rosa Whitfield' });
      const token = await resetTokenOf(email);
      const browser = await stranger();
      const { body } = await browser
        .put(`/password-resets/${token}`, { password: 'Whitfield2026' })
        .expect(422);
      expect(body.errors).toMatchObject([{ field: 'password', reason: 'password-common' }]);
      await browser.put(`/password-resets/${token}`, { password: better }).expect(204);
    });

    it('works for an hour, and an older link not at all once there is a newer one', async () => {
      const { email } = await person();
      app.setNow('2026-06-10T12:00:00Z');
      const older = await resetTokenOf(email);
      app.setNow('2026-06-10T12:10:00Z');
      const newer = await resetTokenOf(email);
      const browser = await stranger();
      await browser.put(`/password-resets/${older}`, { password: better }).expect(410);
      app.setNow('2026-06-10T13:10:00Z');
      await browser.put(`/password-resets/${newer}`, { password: better }).expect(410);
    });

    it('keeps nothing that opens the account', async () => {
      const { email } = await person();
      const token = await resetTokenOf(email);
      const [rows] = await app.db.owner.query('SELECT * FROM one_time_links');
      expect(JSON.stringify(rows)).not.toContain(token);
    });

    it('writes to a mailbox five times an hour at most, and says nothing of it', async () => {
      const { email } = await person();
      for (let time = 0; time < 6; time += 1) await askForReset(email);
      const [letters] = await app.db.owner.query('SELECT id FROM letters WHERE to_address = $1', {
        bind: [email],
      });
      expect(letters).toHaveLength(5);
    });
  });

  describe('sessions', () => {
    it('lists where the person is signed in and ends one, the others or all', async () => {
      const { email } = await person();
      const [phone, desk, tablet] = await Promise.all([
        app.browser().signIn(email),
        app.browser().signIn(email),
        app.browser().signIn(email),
      ]);
      const { body } = await phone.get('/sessions').expect(200);
      expect(body.sessions).toHaveLength(3);
      expect(body.sessions.filter(({ current }: { current: boolean }) => current)).toHaveLength(1);

      const others = (await desk.get('/sessions')).body.sessions as {
        id: string;
        current: boolean;
      }[];
      const desks = others.find(({ current }) => current)?.id;
      await phone.delete(`/sessions/${desks}`).expect(204);
      await desk.get('/session').expect(401);
      await phone.delete('/sessions?keep=this').expect(204);
      await tablet.get('/session').expect(401);
      await phone.delete('/sessions').expect(204);
      await phone.get('/session').expect(401);
    });

    it('does not end somebody else’s', async () => {
      const [one, two] = [await person(), await person()];
      const [first, second] = [
        await app.browser().signIn(one.email),
        await app.browser().signIn(two.email),
      ];
      const { id } = (await second.get('/sessions')).body.sessions[0];
      await first.delete(`/sessions/${id}`).expect(404);
      await second.get('/session').expect(200);
    });
  });

  describe('password', () => {
    it('changes on the present one, under a new session, and ends the others', async () => {
      const { email } = await person();
      const [here, there] = [await app.browser().signIn(email), await app.browser().signIn(email)];
      const reply = await here
        .put('/session/password', { currentPassword: demoPassword, newPassword: better })
        .expect(204);
      const cookies = String(reply.headers['set-cookie']);
      expect(cookies).toContain('vatwright=');
      expect(cookies).toContain('XSRF-TOKEN=');
      await here.get('/session').expect(200);
      await there.get('/session').expect(401);
      await app.browser().signIn(email, better);
    });

    it('names the field at fault', async () => {
      const { email } = await person();
      const browser = await app.browser().signIn(email);
      const change = async (currentPassword: string, newPassword: string) => {
        const { body } = await browser
          .put('/session/password', { currentPassword, newPassword })
          .expect(422);
        return body.errors.map(({ field, reason }: { field: string; reason: string }) => [
          field,
          reason,
        ]);
      };
      expect(await change('wrong', better)).toEqual([['currentPassword', 'password-wrong']]);
      expect(await change(demoPassword, 'too short')).toEqual([['newPassword', 'password-short']]);
    });
  });

  describe('details', () => {
    it('changes name, language and time zone', async () => {
      const { email } = await person();
      const browser = await app.browser().signIn(email);
      const details = { name: 'Ana Ruiz', locale: 'es', timeZone: 'America/Phoenix' };
      const { body } = await browser.patch('/session/person', details).expect(200);
      expect(body.person).toMatchObject(details);
      expect((await browser.get('/session')).body.person).toMatchObject(details);
    });

    it('refuses a zone that is none and a name of nothing', async () => {
      const { email } = await person();
      const browser = await app.browser().signIn(email);
      const { body } = await browser
        .patch('/session/person', { name: ' ', timeZone: 'Chicago' })
        .expect(422);
      expect(body.errors.map(({ field }: { field: string }) => field)).toEqual([
        'name',
        'timeZone',
      ]);
    });
  });
});
