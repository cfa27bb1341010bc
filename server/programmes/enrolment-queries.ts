import type { Place } from '@shared/access/role';
import type { QueryOf, ReplyOf } from '@shared/contract/endpoint';
import type { findPlaces } from '@shared/programmes/programmes-contract';
import { notFound } from '@shared/problem';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';
import { contains } from './programme-queries';
import {
  type ScopeKind,
  type ScopePlace,
  mayEnrolAt,
  placeColumns,
  placeJoins,
} from './programme-policy';

export interface EnrolmentRecord extends Place {
  readonly id: string;
  readonly programmeId: string;
  readonly scopeKind: ScopeKind;
  readonly scopeId: string;
  readonly label: string;
  readonly exception: boolean;
  readonly fromOn: string;
  readonly untilOn: string | null;
  readonly version: number;
  readonly stores: number;
  readonly units: number;
}

const labelOf = (kind: string, id: string) => `
  CASE ${kind}
    WHEN 'chain' THEN (SELECT name FROM chains WHERE id = ${id})
    WHEN 'region' THEN (SELECT name FROM regions WHERE id = ${id})
    WHEN 'store' THEN scope_store.number || ' ' || scope_store.name
    ELSE scope_store.number || ' ' || scope_store.name || ' · ' || scope_unit.tag
  END`;

/** Live stores and units in a scope. */
const reachOf = (kind: string, id: string, storeId: string) => `
  CROSS JOIN LATERAL (
    SELECT count(DISTINCT s.id)::int AS stores, count(u.id)::int AS units
    FROM stores s LEFT JOIN units u ON u.store_id = s.id AND u.retired_at IS NULL
      AND (${kind} <> 'unit' OR u.id = ${id})
    WHERE s.retired_at IS NULL AND CASE ${kind} WHEN 'chain' THEN s.chain_id = ${id}
      WHEN 'region' THEN s.region_id = ${id} ELSE s.id = ${storeId} END
  ) reach`;

const select = `
  SELECT e.id, e.programme_id AS "programmeId", e.scope_kind AS "scopeKind",
    e.scope_id AS "scopeId", ${labelOf('e.scope_kind', 'e.scope_id')} AS label, e.exception,
    e.from_on::text AS "fromOn", e.until_on::text AS "untilOn", e.version,
    ${placeColumns('e.scope_kind', 'e.scope_id')}, reach.stores, reach.units
  FROM enrolments e ${placeJoins('e.scope_kind', 'e.scope_id')}
  ${reachOf('e.scope_kind', 'e.scope_id', 'scope_store.id')}`;

/** Enrolments of a programme: the wider ones first, exceptions after what they are taken from. */
export function enrolmentsOf(tenant: Tenant, programmeId: string): Promise<EnrolmentRecord[]> {
  return tenant.rows<EnrolmentRecord>(
    `${select} WHERE e.programme_id = $1
     ORDER BY e.exception, array_position(ARRAY['chain', 'region', 'store', 'unit'], e.scope_kind),
       label`,
    [programmeId],
  );
}

/** Locks an enrolment. @throws Problem 404 */
export async function lockEnrolment(tenant: Tenant, id: string): Promise<EnrolmentRecord> {
  const found = await tenant.row<EnrolmentRecord>(`${select} WHERE e.id = $1 FOR UPDATE OF e`, [
    id,
  ]);
  if (!found) throw notFound('enrolment');
  return found;
}

/** Live scopes of one kind that the actor may enrol, by name; at most fifty. */
export async function placesToEnrol(
  tenant: Tenant,
  actor: Actor,
  programmeId: string,
  { kind, q }: QueryOf<typeof findPlaces>,
): Promise<ReplyOf<typeof findPlaces>> {
  const binds = new Binds();
  const like = binds.add(contains(q));
  const scopeKind = binds.add(kind);
  const of = binds.add(programmeId);
  // A value that is bound must be used, so the stores' filter is made only where it stands.
  const visible =
    kind === 'store' || kind === 'unit' ? visibleStores(actor, 'programmes.edit', binds) : 'true';
  const candidates = {
    chain: 'SELECT id FROM chains WHERE retired_at IS NULL',
    region: 'SELECT id FROM regions WHERE retired_at IS NULL',
    store: `SELECT s.id FROM stores s WHERE s.retired_at IS NULL AND ${visible}`,
    unit: `SELECT u.id FROM units u JOIN stores s ON s.id = u.store_id
      WHERE u.retired_at IS NULL AND s.retired_at IS NULL AND ${visible}`,
  }[kind];
  const rows = await tenant.rows<
    ScopePlace & { label: string; stores: number; units: number; enrolled: boolean }
  >(
    `SELECT found.*, reach.stores, reach.units,
       EXISTS (SELECT FROM enrolments n WHERE n.programme_id = ${of}
         AND n.scope_id = found."scopeId" AND n.scope_kind = found.kind AND NOT n.exception)
         AS enrolled
     FROM (
       SELECT * FROM (
         SELECT e.kind, e.id AS "scopeId", scope_store.id AS store_id,
           ${labelOf('e.kind', 'e.id')} AS label, ${placeColumns('e.kind', 'e.id')}
         FROM (SELECT ${scopeKind}::text AS kind, c.id FROM (${candidates}) c) e
         ${placeJoins('e.kind', 'e.id')}
       ) named WHERE label ILIKE ${like} ORDER BY label LIMIT 50
     ) found ${reachOf('found.kind', 'found."scopeId"', 'found.store_id')} ORDER BY label`,
    binds.values,
  );
  return {
    rows: rows
      .filter((row) => mayEnrolAt(actor, row))
      .map(({ scopeId, label, stores, units, enrolled }) => ({
        id: scopeId,
        label,
        reach: { stores, units },
        enrolled,
      })),
  };
}
