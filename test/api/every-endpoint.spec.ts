import { createHash } from 'node:crypto';
import express from 'express';
import supertest from 'supertest';
import type { Endpoint } from '@shared/contract/endpoint';
import { abilities } from '@shared/access/ability';
import { registerFeatures } from '@server/features';
import { Routes } from '@server/http/routes';
import { makeOrganisation, makePerson } from '@test/factories/organisation-factory';
import { type TestApp, testApp } from '@test/support/test-app';

describe('every endpoint', () => {
  let app: TestApp;
  let endpoints: readonly Endpoint[];

  beforeAll(async () => {
    app = await testApp();
    const routes = new Routes(express.Router(), app.services);
    registerFeatures(routes);
    ({ endpoints } = routes);
  });
  afterAll(() => app.close());

  const anonymous = ({ method, path }: Endpoint) => {
    const url = `/api/v1${path.replaceAll(/:\w+/g, '7c3ad7a4-52b5-4f0e-9b0a-3d0b4f6f2f11')}`;
    const call = method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete';
    return supertest(app.app)[call](url);
  };
  const isRead = ({ method }: Endpoint) => method === 'GET';

  it('is there once', () => {
    const names = endpoints.map(({ method, path }) => `${method} ${path}`);
    expect(names.length).toBeGreaterThan(100);
    expect(new Set(names).size).toBe(names.length);
  });

  it('names an ability that exists', () => {
    const known = new Set<string>([...abilities, 'public', 'signed-in']);
    expect(endpoints.filter(({ access }) => !known.has(access))).toEqual([]);
  });

  it('reads nothing for who is not signed in, unless it is public', async () => {
    for (const endpoint of endpoints.filter((it) => isRead(it) && it.access !== 'public')) {
      const reply = await anonymous(endpoint);
      expect([endpoint.path, reply.status]).toEqual([endpoint.path, 401]);
    }
  });

  it('writes nothing without the cross-site token, public or not', async () => {
    for (const endpoint of endpoints.filter((it) => !isRead(it))) {
      const reply = await anonymous(endpoint).set('Origin', 'https://elsewhere.example');
      expect([endpoint.path, reply.status]).toEqual([endpoint.path, 403]);
    }
  });

  it('answers a made-up id with a problem, never with a failure of its own', async () => {
    const organisationId = await makeOrganisation(app.db);
    const { email } = await makePerson(app.db, organisationId, 'administrator');
    const browser = await app.browser().signIn(email);
    const withId = endpoints.filter((it) => isRead(it) && /:id\b/.test(it.path));
    expect(withId.length).toBeGreaterThan(8);
    for (const { path } of withId) {
      const reply = await browser.get(path.replaceAll(/:\w+/g, unknownId(path)));
      expect([path, [403, 404, 422].includes(reply.status)]).toEqual([path, true]);
    }
  });

  it('stands in the OpenAPI description with its ability and its answers', async () => {
    const { body, status } = await supertest(app.app).get('/api/v1/openapi.json');
    expect(status).toBe(200);
    expect(body.openapi).toBe('3.1.1');
    for (const { method, path, access } of endpoints) {
      const described = body.paths[path.replaceAll(/:(\w+)/g, '{$1}')]?.[method.toLowerCase()];
      expect(described).toMatchObject({ 'x-ability': access, responses: expect.any(Object) });
    }
  });
});

/** The same for every run, another for every path. */
function unknownId(path: string): string {
  const hex = createHash('sha256').update(path).digest('hex');
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-4${hex.slice(13, 16)}-8${hex.slice(17, 20)}-${hex.slice(20, 32)}`;
}
