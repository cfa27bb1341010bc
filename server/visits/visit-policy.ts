import { mayAt } from '@shared/access/ability';
import type { Place, RoleGrant } from '@shared/access/role';
import { forbidden, invalid, notFound } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';

/** A store as planning needs it. */
export interface PlannedStore extends Place {
  readonly timeZone: string;
}

/**
 * The store of a visit to be made or changed.
 * @throws Problem 404 when there is none in use, 403 when the actor plans nothing there
 */
export async function plannableStore(
  tenant: Tenant,
  actor: Actor,
  storeId: string,
): Promise<PlannedStore> {
  const store = await tenant.row<PlannedStore>(
    `SELECT id AS "storeId", chain_id AS "chainId", region_id AS "regionId",
       time_zone AS "timeZone" FROM stores WHERE id = $1 AND retired_at IS NULL`,
    [storeId],
  );
  if (!store) throw notFound('store');
  if (!mayAt('visits.plan', actor.grants, store)) throw forbidden();
  return store;
}

/**
 * Holds that somebody can be sent to a store: active, and a technician there.
 * @throws Problem 422 under `technicianId`
 */
export async function checkTechnician(
  tenant: Tenant,
  technicianId: string,
  store: PlannedStore,
): Promise<void> {
  const technician = await tenant.row<{ grants: RoleGrant[] }>(
    `SELECT coalesce(jsonb_agg(jsonb_build_object('role', g.role, 'scopeKind', g.scope_kind,
       'scopeId', g.scope_id)) FILTER (WHERE g.id IS NOT NULL), '[]') AS grants
     FROM people p LEFT JOIN role_grants g ON g.person_id = p.id
     WHERE p.id = $1 AND p.disabled_at IS NULL GROUP BY p.id`,
    [technicianId],
  );
  if (technician && mayAt('tasks.do', technician.grants, store)) return;
  throw invalid([
    {
      field: 'technicianId',
      reason: 'not-here',
      message: 'This person is not a technician for that store.',
    },
  ]);
}

/** @throws Problem 422 under `onDate` when that day is over where the store is */
export function checkDay(onDate: string, store: PlannedStore, now: Date): void {
  const today = new Intl.DateTimeFormat('en-CA', {
    timeZone: store.timeZone,
    dateStyle: 'short',
  }).format(now);
  if (onDate >= today) return;
  throw invalid([{ field: 'onDate', reason: 'past', message: 'This day is over.' }]);
}
