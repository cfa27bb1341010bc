import { mayAt, mayEverywhere } from '@shared/access/ability';
import type { Place } from '@shared/access/role';
import { forbidden, notFound } from '@shared/problem';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';

/** Chains and regions concern the whole organisation. */
export const mayEditGroups = (actor: Actor) => mayEverywhere('fleet.edit', actor.grants);

/** Whether this person may change what stands at a place: its store, units and parts. */
export const mayEditAt = (actor: Actor, place: Place) => mayAt('fleet.edit', actor.grants, place);

/** A store's place in the scopes, with what commands on the fleet need besides. */
export interface StorePlace extends Place {
  readonly timeZone: string;
  readonly retiredAt: Date | null;
}

/**
 * A store to be changed, or in which something is to be changed.
 * @throws Problem 404 where the actor may not see it, 403 where they may see and not change it.
 */
export async function editableStore(
  tenant: Tenant,
  actor: Actor,
  storeId: string,
): Promise<StorePlace> {
  const binds = new Binds();
  const place = await tenant.row<StorePlace>(
    `SELECT s.id AS "storeId", s.chain_id AS "chainId", s.region_id AS "regionId",
       s.time_zone AS "timeZone", s.retired_at AS "retiredAt"
     FROM stores s WHERE s.id = ${binds.add(storeId)} AND ${visibleStores(actor, 'fleet.read', binds)}`,
    binds.values,
  );
  if (!place) throw notFound('store');
  if (!mayEditAt(actor, place)) throw forbidden();
  return place;
}

/** The local day of a zone at an instant, `YYYY-MM-DD`. */
export const localDay = (now: Date, timeZone: string) =>
  new Intl.DateTimeFormat('en-CA', { timeZone, dateStyle: 'short' }).format(now);
