import type { PersonRow } from '../fleet-api';
import { coveringOf } from './covering';

const store = { id: 's', chainId: 'c', regionId: 'r' };

function person(name: string, ...roles: [PersonRow['roles'][number]['role'], string][]): PersonRow {
  return {
    id: name,
    name,
    email: null,
    locale: 'en',
    timeZone: 'America/Chicago',
    standing: 'active',
    roles: roles.map(([role, scopeId]) => ({
      role,
      scopeId,
      scopeKind: 'region',
      scopeName: scopeId.toUpperCase(),
    })),
    homePostalCode: null,
    homeKnown: false,
    lastSeenAt: null,
  };
}

describe('coveringOf', () => {
  it('puts first whom one would call first', () => {
    const people = [
      person('Owen', ['account-owner', 'c']),
      person('Tess', ['technician', 'r']),
      person('Maya', ['store-manager', 's']),
      person('Ana', ['technician', 'r']),
    ];
    expect(coveringOf(people, store).map(({ name }) => name)).toEqual([
      'Maya',
      'Ana',
      'Tess',
      'Owen',
    ]);
  });

  it('leaves out roles over other places and says a role once', () => {
    const twice = person('Rita', ['technician', 'r'], ['technician', 's'], ['trainer', 'r']);
    expect(coveringOf([twice, person('Far', ['technician', 'x'])], store)).toEqual([
      { id: 'Rita', name: 'Rita', role: 'technician', scope: 'S' },
    ]);
  });
});
