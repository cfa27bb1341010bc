import { grantsWith, mayAt, mayEverywhere } from '@shared/access/ability';
import type { Place } from '@shared/access/role';
import { forbidden, notFound } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';

export type ScopeKind = 'chain' | 'region' | 'store' | 'unit';

/** Where an enrolment's scope stands. A chain lies in no one region, a region in no one chain. */
export interface ScopePlace extends Place {
  readonly scopeKind: ScopeKind;
  readonly scopeId: string;
}

/** Whether this person may put this scope under a programme or take it out. */
export const mayEnrolAt = (actor: Actor, place: Place) =>
  mayAt('programmes.edit', actor.grants, place);

/** Whether this person may enrol anything at all. */
export const mayEnrolSomewhere = (actor: Actor) =>
  grantsWith('programmes.edit', actor.grants).length > 0;

/**
 * Whether this person may change a programme and its rules: only who may plan for every place that
 * it is enrolled at, since a change reaches them all.
 */
export function mayEditProgramme(actor: Actor, enrolledAt: readonly Place[]): boolean {
  return (
    mayEverywhere('programmes.edit', actor.grants) ||
    (mayEnrolSomewhere(actor) && enrolledAt.every((place) => mayEnrolAt(actor, place)))
  );
}

/** The scopes enrolled in a programme, exceptions left out. */
export function scopesOf(tenant: Tenant, programmeId: string): Promise<ScopePlace[]> {
  return tenant.rows<ScopePlace>(
    `SELECT e.scope_kind AS "scopeKind", e.scope_id AS "scopeId",
       ${placeColumns('e.scope_kind', 'e.scope_id')}
     FROM enrolments e ${placeJoins('e.scope_kind', 'e.scope_id')}
     WHERE e.programme_id = $1 AND NOT e.exception`,
    [programmeId],
  );
}

/** @throws Problem 403 unless the actor may change this programme and its rules. */
export async function authoriseProgramme(
  tenant: Tenant,
  actor: Actor,
  programmeId: string,
): Promise<void> {
  if (!mayEditProgramme(actor, await scopesOf(tenant, programmeId))) throw forbidden();
}

/**
 * Where a scope stands.
 * @throws Problem 404 when there is no such live chain, region, store or unit.
 */
export async function placeOf(
  tenant: Tenant,
  scopeKind: ScopeKind,
  scopeId: string,
): Promise<ScopePlace> {
  const table = { chain: 'chains', region: 'regions', store: 'stores', unit: 'units' }[scopeKind];
  const place = await tenant.row<ScopePlace>(
    `SELECT e.kind AS "scopeKind", e.id AS "scopeId", ${placeColumns('e.kind', 'e.id')}
     FROM (SELECT $1::text AS kind, id FROM ${table} WHERE id = $2 AND retired_at IS NULL) e
     ${placeJoins('e.kind', 'e.id')}`,
    [scopeKind, scopeId],
  );
  if (!place) throw notFound(scopeKind);
  return place;
}

/** Columns of a {@link Place} for a scope; to be used with {@link placeJoins}. */
export const placeColumns = (kind: string, id: string) => `
  CASE ${kind} WHEN 'chain' THEN ${id}::text ELSE coalesce(scope_store.chain_id::text, '') END
    AS "chainId",
  CASE ${kind} WHEN 'region' THEN ${id}::text ELSE coalesce(scope_store.region_id::text, '') END
    AS "regionId",
  coalesce(scope_store.id::text, '') AS "storeId"`;

export const placeJoins = (kind: string, id: string) => `
  LEFT JOIN units scope_unit ON ${kind} = 'unit' AND scope_unit.id = ${id}
  LEFT JOIN stores scope_store ON scope_store.id = CASE ${kind}
    WHEN 'store' THEN ${id} WHEN 'unit' THEN scope_unit.store_id END`;
