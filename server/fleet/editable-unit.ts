import { forbidden, notFound } from '@shared/problem';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';
import { type StorePlace, mayEditAt } from './fleet-policy';

/** The columns of a unit that people change. */
export interface UnitColumns {
  readonly store_id: string;
  readonly tag: string;
  readonly kind: string;
  readonly vats: number;
  readonly oil_pounds: number | null;
  readonly model: string;
  readonly installed_on: string | null;
  readonly out_of_service_since: string | null;
}

export interface EditableUnit extends UnitColumns {
  readonly id: string;
  readonly version: number;
  readonly retired: boolean;
  readonly place: StorePlace;
}

/**
 * A unit that is to be changed, locked.
 * @throws Problem 404 where the actor may not see it, 403 where they may see and not change it.
 */
export async function editableUnit(
  tenant: Tenant,
  actor: Actor,
  id: string,
): Promise<EditableUnit> {
  const binds = new Binds();
  const row = await tenant.row<Omit<EditableUnit, 'place'> & { place: StorePlace }>(
    `SELECT u.id, u.version, u.retired_at IS NOT NULL AS retired, u.store_id, u.tag, u.kind, u.vats,
       u.oil_pounds::float8 AS oil_pounds, u.model, u.installed_on, u.out_of_service_since,
       jsonb_build_object('storeId', s.id, 'chainId', s.chain_id, 'regionId', s.region_id,
         'timeZone', s.time_zone, 'retiredAt', s.retired_at) AS place
     FROM units u JOIN stores s ON s.id = u.store_id
     WHERE u.id = ${binds.add(id)} AND ${visibleStores(actor, 'fleet.read', binds)}
     FOR UPDATE OF u`,
    binds.values,
  );
  if (!row) throw notFound('unit');
  if (!mayEditAt(actor, row.place)) throw forbidden();
  return row;
}
