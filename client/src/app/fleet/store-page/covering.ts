import type { Role } from '@shared/access/role';
import type { PeopleQuery, PersonRow, Store } from '../fleet-api';

/** Somebody who covers a store, by one of their roles. */
export interface Covering {
  readonly id: string;
  readonly name: string;
  readonly role: Role;
  /** Of what they hold the role: the store, its region or its chain. */
  readonly scope: string;
}

type Place = Pick<Store, 'id' | 'chainId' | 'regionId'>;

/** Whom to call first stands first. */
const order: readonly Role[] = [
  'store-manager',
  'technician',
  'regional-facility-manager',
  'account-owner',
];

/** The questions that find everybody who covers a store, without reading a whole organisation. */
export function coveringQueries({ chainId, regionId }: Place): readonly PeopleQuery[] {
  return [
    { role: 'store-manager', region: regionId, chain: chainId, pageSize: 200 },
    { role: 'technician', region: regionId, pageSize: 200 },
    { role: 'regional-facility-manager', region: regionId, pageSize: 200 },
    { role: 'account-owner', chain: chainId, pageSize: 200 },
  ];
}

/** Who of these covers the store, each role once, in the order in which one would call them. */
export function coveringOf(people: readonly PersonRow[], store: Place): readonly Covering[] {
  const scopes = [store.id, store.regionId, store.chainId];
  const found = people.flatMap(({ id, name, roles }) =>
    roles
      .filter(({ role, scopeId }) => order.includes(role) && scopes.includes(scopeId))
      .map(({ role, scopeName }) => ({ id, name, role, scope: scopeName })),
  );
  const once = new Map(found.map((entry) => [`${entry.id} ${entry.role}`, entry]));
  return [...once.values()].sort(
    (a, b) => order.indexOf(a.role) - order.indexOf(b.role) || a.name.localeCompare(b.name),
  );
}
