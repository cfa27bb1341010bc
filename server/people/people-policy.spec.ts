import type { Role, RoleGrant, ScopeKind } from '@shared/access/role';
import type { Actor } from '../access/actor';
import { checkGrants, mayEditPerson, type Scopes } from './people-policy';

const at = (chainId: string, regionId: string, storeId: string) => ({ chainId, regionId, storeId });

/** Store 1 belongs to chain A and region N; store 2 to chain A and region S. */
const scopes: Scopes = new Map([
  ['org', { kind: 'organisation', place: at('', '', '') }],
  ['chain A', { kind: 'chain', place: at('chain A', '', '') }],
  ['chain B', { kind: 'chain', place: at('chain B', '', '') }],
  ['region N', { kind: 'region', place: at('', 'region N', '') }],
  ['store 1', { kind: 'store', place: at('chain A', 'region N', 'store 1') }],
  ['store 2', { kind: 'store', place: at('chain A', 'region S', 'store 2') }],
]);

const grant = (role: Role, scopeId: string): RoleGrant => ({
  role,
  scopeKind: scopes.get(scopeId)?.kind as ScopeKind,
  scopeId,
});

const actor = (...grants: RoleGrant[]) => ({ grants }) as unknown as Actor;

function allowed(by: RoleGrant, given: RoleGrant): boolean {
  try {
    checkGrants(actor(by), [given], scopes);
    return true;
  } catch {
    return false;
  }
}

describe('checkGrants', () => {
  it.each([
    ['org', ['org', 'chain A', 'chain B', 'region N', 'store 1', 'store 2']],
    ['chain A', ['chain A', 'store 1', 'store 2']],
    ['chain B', ['chain B']],
    ['region N', ['region N', 'store 1']],
    ['store 1', ['store 1']],
  ])('an administrator of %s hands on roles over %s alone', (own, within) => {
    const reached = [...scopes.keys()].filter((scopeId) =>
      allowed(grant('administrator', own), grant('technician', scopeId)),
    );
    expect(reached).toEqual(within);
  });

  it.each<Role>([
    'regional-facility-manager',
    'technician',
    'store-manager',
    'shift-lead',
    'account-owner',
    'trainer',
  ])('a %s hands on nothing', (role) => {
    for (const scopeId of scopes.keys()) {
      expect(allowed(grant(role, 'org'), grant('shift-lead', scopeId))).toBe(false);
    }
  });

  it('names the grant whose place does not exist, or is of another kind', () => {
    const by = actor(grant('administrator', 'org'));
    const wrong: RoleGrant[] = [
      grant('technician', 'store 1'),
      { role: 'technician', scopeKind: 'store', scopeId: 'store 9' },
      { role: 'technician', scopeKind: 'region', scopeId: 'store 1' },
    ];
    expect(() => checkGrants(by, wrong, scopes)).toThrow(
      expect.objectContaining({
        more: {
          errors: [
            expect.objectContaining({ field: 'roles.1' }),
            expect.objectContaining({ field: 'roles.2' }),
          ],
        },
      }),
    );
  });
});

describe('mayEditPerson', () => {
  const chainAdministrator = actor(grant('administrator', 'chain A'));

  it('asks that all that the person holds lies within', () => {
    const [inside, outside] = [grant('store-manager', 'store 2'), grant('technician', 'region N')];
    expect(mayEditPerson(chainAdministrator, [inside], scopes)).toBe(true);
    expect(mayEditPerson(chainAdministrator, [inside, outside], scopes)).toBe(false);
    expect(mayEditPerson(chainAdministrator, [grant('administrator', 'org')], scopes)).toBe(false);
  });

  it('leaves somebody without any role to the whole organisation’s administrators', () => {
    expect(mayEditPerson(chainAdministrator, [], scopes)).toBe(false);
    expect(mayEditPerson(actor(grant('administrator', 'org')), [], scopes)).toBe(true);
  });
});
