import type { Place, Role, RoleGrant } from './role';

/** Everything a person may be allowed to do. A read ability also decides what navigation shows. */
export const abilities = [
  'board.read',
  'today.read',
  'shift.read',
  'fleet.read',
  'fleet.edit',
  'fleet.import',
  'people.read',
  'people.edit',
  'procedures.read',
  'procedures.edit',
  'programmes.read',
  'programmes.edit',
  'tasks.read',
  'tasks.do',
  'tasks.acknowledge',
  'tasks.plan',
  'visits.read',
  'visits.plan',
  'findings.read',
  'findings.report',
  'findings.settle',
  'compliance.read',
  'digests.read',
  'mail.read',
  'mail.retry',
  'audit.read',
] as const;

export type Ability = (typeof abilities)[number];

const everywhereReadable: readonly Ability[] = ['fleet.read', 'tasks.read', 'findings.read'];

const abilitiesOf: Readonly<Record<Role, readonly Ability[]>> = {
  'regional-facility-manager': [
    ...everywhereReadable,
    'board.read',
    'fleet.edit',
    'people.read',
    'procedures.read',
    'programmes.read',
    'programmes.edit',
    'tasks.plan',
    'visits.read',
    'visits.plan',
    'findings.report',
    'findings.settle',
    'compliance.read',
    'digests.read',
  ],
  technician: [
    ...everywhereReadable,
    'today.read',
    'tasks.do',
    'visits.read',
    'findings.report',
    'findings.settle',
    'procedures.read',
  ],
  'store-manager': [
    ...everywhereReadable,
    'shift.read',
    'tasks.acknowledge',
    'visits.read',
    'findings.report',
    'compliance.read',
    'procedures.read',
  ],
  'shift-lead': ['shift.read', 'tasks.read', 'tasks.acknowledge', 'findings.report'],
  'account-owner': [...everywhereReadable, 'board.read', 'compliance.read', 'digests.read'],
  trainer: [
    ...everywhereReadable,
    'procedures.read',
    'procedures.edit',
    'programmes.read',
    'people.read',
    'compliance.read',
  ],
  administrator: [
    ...everywhereReadable,
    'board.read',
    'fleet.edit',
    'fleet.import',
    'people.read',
    'people.edit',
    'procedures.read',
    'programmes.read',
    'programmes.edit',
    'compliance.read',
    'digests.read',
    'mail.read',
    'mail.retry',
    'audit.read',
  ],
};

/** The grants of a person that carry an ability, wherever they reach. */
export function grantsWith(ability: Ability, grants: readonly RoleGrant[]): RoleGrant[] {
  return grants.filter(({ role }) => abilitiesOf[role].includes(ability));
}

/** All abilities of a person in any scope: what the client shows is decided by these. */
export function abilitiesFrom(grants: readonly RoleGrant[]): Ability[] {
  return abilities.filter((ability) => grantsWith(ability, grants).length > 0);
}

/** Whether a person may do this at that place. Denies by default. */
export function mayAt(ability: Ability, grants: readonly RoleGrant[], place: Place): boolean {
  return grantsWith(ability, grants).some(
    ({ scopeKind, scopeId }) =>
      scopeKind === 'organisation' ||
      (scopeKind === 'chain' && scopeId === place.chainId) ||
      (scopeKind === 'region' && scopeId === place.regionId) ||
      (scopeKind === 'store' && scopeId === place.storeId),
  );
}

/** Whether a person may do this for the organisation as a whole (procedures, people, mail). */
export function mayEverywhere(ability: Ability, grants: readonly RoleGrant[]): boolean {
  return grantsWith(ability, grants).some(({ scopeKind }) => scopeKind === 'organisation');
}
