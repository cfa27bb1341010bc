import { addDays, parseCalendarDate } from '@shared/calendar/calendar-date';
import type { QueryOf, ReplyOf } from '@shared/contract/endpoint';
import type { readPlan } from '@shared/visits/visits-contract';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';
import { routesWhere } from './route-queries';
import { techniciansFor } from './technicians';

/**
 * Who can be sent, and their routes of some days. Days that hold nothing and were never told are left
 * out; somebody who is no technician any more is in as long as a day of theirs is.
 */
export async function readPlanOf(
  tenant: Tenant,
  actor: Actor,
  query: QueryOf<typeof readPlan>,
  now: Date,
): Promise<ReplyOf<typeof readPlan>> {
  const technicians = await techniciansFor(tenant, actor, query);
  const to = addDays(parseCalendarDate(query.from), query.days - 1);
  const found = await routesWhere(
    tenant,
    (binds) => {
      const all = [`ro.on_date BETWEEN ${binds.add(query.from)} AND ${binds.add(to)}`];
      if (query.technician) all.push(`ro.technician_id = ${binds.add(query.technician)}`);
      const region = query.region ? `AND s.region_id = ${binds.add(query.region)}` : '';
      const listed = binds.add(technicians.map(({ id }) => id));
      all.push(`(ro.technician_id = ANY(${listed}::uuid[]) OR EXISTS (
        SELECT 1 FROM visits v JOIN stores s ON s.id = v.store_id
        WHERE v.route_id = ro.id AND ${visibleStores(actor, 'visits.plan', binds)} ${region}))`);
      return all.join(' AND ');
    },
    (binds) => visibleStores(actor, 'visits.plan', binds),
    now,
  );
  const routes = found.filter(
    ({ visits, elsewhere, state }) => visits.length + elsewhere > 0 || state !== 'draft',
  );
  const known = new Map(technicians.map((it) => [it.id, it]));
  for (const { technician } of routes) known.set(technician.id, technician);
  const byName = new Intl.Collator('en');
  return {
    technicians: [...known.values()].sort((a, b) => byName.compare(a.name, b.name)),
    routes,
  };
}
