import type * as z from 'zod';
import type { technician } from '@shared/visits/route-parts';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';

export type Technician = z.output<typeof technician>;

/** Active technicians who have a store in common with what the actor plans, by name. */
export function techniciansFor(
  tenant: Tenant,
  actor: Actor,
  only: { readonly technician?: string | undefined; readonly region?: string | undefined },
): Promise<Technician[]> {
  const binds = new Binds();
  const stores = [visibleStores(actor, 'visits.plan', binds), 's.retired_at IS NULL'];
  if (only.region) stores.push(`s.region_id = ${binds.add(only.region)}`);
  const one = only.technician ? `AND p.id = ${binds.add(only.technician)}` : '';
  return tenant.rows<Technician>(
    `SELECT p.id, p.name, p.home_latitude IS NOT NULL AS "homeKnown" FROM people p
     WHERE p.disabled_at IS NULL ${one} AND EXISTS (
       SELECT 1 FROM role_grants g, stores s
       WHERE g.person_id = p.id AND g.role = 'technician' AND ${stores.join(' AND ')}
         AND (g.scope_kind = 'organisation' OR g.scope_id IN (s.chain_id, s.region_id, s.id)))
     ORDER BY lower(p.name), p.id`,
    binds.values,
  );
}
