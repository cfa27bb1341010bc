import type { Tenant } from '@db/tenant-transaction';
import { hashPassword } from '@server/sign-in/password';
import type { Role, ScopeKind } from '@shared/access/role';
import { demoSignIns } from '../demo-sign-ins.mjs';
import { insertRows } from '../insert-rows';
import { namedId } from '../world/random';
import type { FleetPlaces } from './fleet-places';

const STORES_OF_A_TECHNICIAN = 25;

export interface FleetPerson {
  readonly id: string;
  readonly email: string;
  readonly role: Role;
  readonly scopeKind: ScopeKind;
  readonly scopeId: string;
}

/** What everybody of a fleet signs in with: the demo world's password. */
export const fleetPassword = demoSignIns[0]?.password ?? '';

/**
 * An administrator, a trainer, an owner per chain; per region a manager and one technician to 25
 * stores; a manager per store. The first of each role is `ROLE.1@DOMAIN`.
 */
export async function seedFleetPeople(
  tenant: Tenant,
  { chainIds, regionIds, stores }: FleetPlaces,
  domain: string,
  random: () => number,
): Promise<FleetPerson[]> {
  const people: (FleetPerson & { timeZone: string })[] = [];
  const numbers = new Map<Role, number>();
  const add = (
    role: Role,
    scopeKind: ScopeKind,
    scopeId: string,
    timeZone = 'America/Chicago',
  ): void => {
    const number = (numbers.get(role) ?? 0) + 1;
    numbers.set(role, number);
    const email = `${role}.${number}@${domain}`;
    people.push({ id: namedId(random), email, role, scopeKind, scopeId, timeZone });
  };
  add('administrator', 'organisation', tenant.organisationId);
  add('trainer', 'organisation', tenant.organisationId);
  for (const id of chainIds) add('account-owner', 'chain', id);
  for (const id of regionIds) {
    const own = stores.filter(({ regionId }) => regionId === id);
    add('regional-facility-manager', 'region', id, own[0]?.timeZone);
    for (let nth = 0; nth < own.length; nth += STORES_OF_A_TECHNICIAN) {
      add('technician', 'region', id, own[nth]?.timeZone);
    }
  }
  for (const { id, timeZone } of stores) add('store-manager', 'store', id, timeZone);

  const hash = await hashPassword(fleetPassword);
  await insertRows(
    tenant,
    'people',
    people.map(({ id, email, timeZone }) => ({
      id,
      name: nameOf(email),
      email,
      locale: 'en',
      time_zone: timeZone,
      password_hash: hash,
    })),
  );
  await insertRows(
    tenant,
    'role_grants',
    people.map(({ id, role, scopeKind, scopeId }) => ({
      id: namedId(random),
      person_id: id,
      role,
      scope_kind: scopeKind,
      scope_id: scopeId,
    })),
  );
  return people;
}

/** `store-manager.12@…` is called "Store manager 12". */
function nameOf(email: string): string {
  const words = (email.split('@')[0] ?? '').replace(/[-.]/g, ' ');
  return words.charAt(0).toUpperCase() + words.slice(1);
}
