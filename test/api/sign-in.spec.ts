import { makeFleet, makePerson } from '@test/factories/organisation-factory';
import { type TestApp, testApp } from '@test/support/test-app';

describe('sign-in', () => {
  let it_: TestApp;
  let email: string;

  beforeAll(async () => {
    it_ = await testApp();
    const { organisationId, regionId } = await makeFleet(it_.db);
    const scope = { kind: 'region', id: regionId } as const;
    ({ email } = await makePerson(it_.db, organisationId, 'technician', scope));
  });
  afterAll(() => it_.close());

  it('gives the person, roles and abilities', async () => {
    const browser = await it_.browser().signIn(email);
    const { body } = await browser.get('/session').expect(200);
    expect(body.person.email).toBe(email);
    expect(body.roles).toHaveLength(1);
    expect(body.abilities).toContain('tasks.do');
    expect(body.abilities).not.toContain('people.edit');
  });

  it('answers a wrong password and an unknown address alike', async () => {
    const wrong = await failSignIn(email, 'not the password');
    const unknown = await failSignIn('nobody@kettle.example', 'not the password');
    expect({ ...wrong, requestId: '' }).toEqual({ ...unknown, requestId: '' });
  });

  it('makes a signed-out cookie worthless', async () => {
    const browser = await it_.browser().signIn(email);
    await browser.delete('/session').expect(204);
    await browser.get('/session').expect(401);
  });

  it('refuses a write without the token, or from another site', async () => {
    const browser = await it_.browser().signIn(email);
    const stranger = it_.browser();
    await stranger.post('/session', { email, password: 'x' }).expect(403);
    await browser.delete('/session').set('Sec-Fetch-Site', 'cross-site').expect(403);
    await browser.delete('/session').set('Origin', 'https://elsewhere.example').expect(403);
    await browser.get('/session').expect(200);
  });

  async function failSignIn(address: string, password: string) {
    const browser = it_.browser();
    await browser.signIn(address, password).catch(() => undefined);
    const { body } = await browser.post('/session', { email: address, password }).expect(401);
    return body;
  }
});
