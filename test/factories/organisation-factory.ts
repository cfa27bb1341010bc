import { randomUUID } from 'node:crypto';
import type { Role, ScopeKind } from '@shared/access/role';
import { hashPassword } from '@server/sign-in/password';
import { demoPassword } from '@test/support/test-app';
import type { TestDatabase } from '@test/support/test-database';

/** Inserts one row with the owner's rights and gives back its id. */
export async function insert(db: TestDatabase, table: string, row: object): Promise<string> {
  const filled: Record<string, unknown> = { id: randomUUID(), ...row };
  const columns = Object.keys(filled);
  const values = Object.values(filled).map((value) =>
    value !== null && typeof value === 'object' && !Array.isArray(value) && !(value instanceof Date)
      ? JSON.stringify(value)
      : value,
  );
  await db.owner.query(
    `INSERT INTO ${table} (${columns.join(', ')})
     VALUES (${columns.map((_, index) => `$${index + 1}`).join(', ')})`,
    { bind: values },
  );
  return filled['id'] as string;
}

export const makeOrganisation = (db: TestDatabase, row: object = {}) =>
  insert(db, 'organisations', { name: 'Kettle & Flue', time_zone: 'America/Chicago', ...row });

let hash: Promise<string> | undefined;
let people = 0;

/** A person who can sign in with {@link demoPassword}, holding one role over one scope. */
export async function makePerson(
  db: TestDatabase,
  organisationId: string,
  role: Role,
  scope: { kind: ScopeKind; id: string } = { kind: 'organisation', id: organisationId },
  row: object = {},
): Promise<{ id: string; email: string }> {
  hash ??= hashPassword(demoPassword);
  people += 1;
  const email = `${role}.${people}@kettle.example`;
  const id = await insert(db, 'people', {
    organisation_id: organisationId,
    name: `Person ${people}`,
    email,
    time_zone: 'America/Chicago',
    password_hash: await hash,
    ...row,
  });
  await insert(db, 'role_grants', {
    organisation_id: organisationId,
    person_id: id,
    role,
    scope_kind: scope.kind,
    scope_id: scope.id,
  });
  return { id, email };
}

export interface Fleet {
  readonly organisationId: string;
  readonly chainId: string;
  readonly regionId: string;
  readonly storeId: string;
  readonly unitId: string;
}

let stores = 0;

/** One chain, region, store and unit of an organisation; what is given is used instead. */
export async function makeFleet(db: TestDatabase, given: Partial<Fleet> = {}): Promise<Fleet> {
  const organisationId = given.organisationId ?? (await makeOrganisation(db));
  stores += 1;
  const own = { organisation_id: organisationId };
  const chainId =
    given.chainId ?? (await insert(db, 'chains', { ...own, name: `Chain ${stores}` }));
  const regionId =
    given.regionId ?? (await insert(db, 'regions', { ...own, name: `Region ${stores}` }));
  const storeId =
    given.storeId ??
    (await insert(db, 'stores', {
      ...own,
      chain_id: chainId,
      region_id: regionId,
      number: String(1000 + stores),
      name: `Store ${stores}`,
      latitude: 41.88,
      longitude: -87.63,
      position_from: 'coordinates',
      time_zone: 'America/Chicago',
    }));
  const unitId =
    given.unitId ??
    (await insert(db, 'units', {
      ...own,
      store_id: storeId,
      tag: 'F-1',
      kind: 'built-in',
      vats: 2,
    }));
  return { organisationId, chainId, regionId, storeId, unitId };
}
