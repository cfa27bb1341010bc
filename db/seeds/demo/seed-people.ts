import { lookup } from 'zipcodes';
import type { RoleGrant } from '@shared/access/role';
import type { Tenant } from '@db/tenant-transaction';
import { hashPassword } from '@server/sign-in/password';
import type { Actor } from '@server/access/actor';
import { demoSignIns } from '../demo-sign-ins.mjs';
import { insertRows } from '../insert-rows';
import type { World } from '../world/fleet';
import { type DemoPerson, people, storeManager } from '../world/people';
import { chains, organisation, regions } from '../world/places';
import { namedId } from '../world/random';

export interface Staff {
  readonly id: string;
  readonly person: DemoPerson;
  readonly grant: RoleGrant;
  /** For store managers: which store. */
  readonly storeId?: string;
}

/** Writes everybody and their roles; all share the demo password, hashed once. */
export async function seedPeople(
  tenant: Tenant,
  world: World,
  random: () => number,
): Promise<Staff[]> {
  const scopeOf = ({ over }: DemoPerson): Pick<RoleGrant, 'scopeKind' | 'scopeId'> => {
    const region = regions.findIndex((it) => it === over);
    if (region >= 0) return { scopeKind: 'region', scopeId: world.regionIds[region] as string };
    const chain = chains.findIndex((it) => it === over);
    if (chain >= 0) return { scopeKind: 'chain', scopeId: world.chainIds[chain] as string };
    return { scopeKind: 'organisation', scopeId: tenant.organisationId };
  };
  const zoneOf = ({ over }: DemoPerson) => {
    const region = regions.findIndex((it) => it === over);
    return world.stores.find((store) => store.region === region)?.timeZone ?? organisation.timeZone;
  };
  const staff: (Staff & { timeZone: string })[] = people.map((person) => ({
    id: namedId(random),
    person,
    grant: { role: person.role, ...scopeOf(person) },
    timeZone: zoneOf(person),
  }));
  world.stores.forEach((store, index) => {
    const person = storeManager(index, store.number);
    staff.push({
      id: namedId(random),
      person,
      grant: { role: person.role, scopeKind: 'store', scopeId: store.id },
      storeId: store.id,
      timeZone: store.timeZone,
    });
  });

  const hash = await hashPassword(demoSignIns[0]?.password ?? '');
  await insertRows(
    tenant,
    'people',
    staff.map(({ id, person, timeZone }) => {
      const home = person.homePostalCode ? lookup(person.homePostalCode) : undefined;
      return {
        id,
        name: person.name,
        email: person.email,
        locale: person.locale ?? 'en',
        time_zone: timeZone,
        home_postal_code: person.homePostalCode ?? null,
        home_latitude: home?.latitude ?? null,
        home_longitude: home?.longitude ?? null,
        password_hash: hash,
      };
    }),
  );
  await insertRows(
    tenant,
    'role_grants',
    staff.map(({ id, grant }) => ({
      id: namedId(random),
      person_id: id,
      role: grant.role,
      scope_kind: grant.scopeKind,
      scope_id: grant.scopeId,
    })),
  );
  return staff;
}

/** Somebody of the staff as the one who acts, for the product's own commands. */
export function actorOf(tenant: Tenant, staff: Staff, grants = [staff.grant]): Actor {
  return {
    personId: staff.id,
    organisationId: tenant.organisationId,
    name: staff.person.name,
    email: staff.person.email,
    locale: staff.person.locale ?? 'en',
    timeZone: organisation.timeZone,
    grants,
  };
}
