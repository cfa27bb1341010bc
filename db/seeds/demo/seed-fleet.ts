import type { Tenant } from '@db/tenant-transaction';
import { insertRows } from '../insert-rows';
import type { World } from '../world/fleet';

/** Writes the places, units and components of the world. */
export async function seedFleet(tenant: Tenant, { rows }: World): Promise<void> {
  await insertRows(tenant, 'chains', rows.chains);
  await insertRows(tenant, 'regions', rows.regions);
  await insertRows(tenant, 'stores', rows.stores);
  await insertRows(tenant, 'units', rows.units);
  await insertRows(tenant, 'components', rows.components);
}
