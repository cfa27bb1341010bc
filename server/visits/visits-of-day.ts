import type { Tenant } from '@db/tenant-transaction';
import { type Route, routesWhere } from './route-queries';

/**
 * The day of one technician as it was told to them: null when nothing has been published. A day that
 * was changed since says so by its state, and shows what it holds now.
 *
 * @param date `YYYY-MM-DD`, local to the stores of the day
 */
export async function visitsOfDay(
  tenant: Tenant,
  technicianId: string,
  date: string,
  now: Date,
): Promise<Route | null> {
  const [found] = await routesWhere(
    tenant,
    (binds) => `ro.technician_id = ${binds.add(technicianId)}::uuid
      AND ro.on_date = ${binds.add(date)}::date AND ro.published_version IS NOT NULL`,
    () => 'true',
    now,
  );
  return found ?? null;
}
