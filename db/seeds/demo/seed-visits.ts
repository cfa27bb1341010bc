import { addDays, type CalendarDate } from '@shared/calendar/calendar-date';
import type { Tenant } from '@db/tenant-transaction';
import { addVisit } from '@server/visits/add-visit';
import { orderNearestNext } from '@server/visits/order-route';
import { publishRoute } from '@server/visits/publish-route';
import { namedId } from '../world/random';
import { actorOf, type Staff } from './seed-people';

const DAYS = 5;
const STORES_A_DAY = 4;
const PUBLISHED_DAYS = 3;

/**
 * Plans the technicians' coming days as a planner would: what is open in their stores, a few stores a
 * day, the nearest next; the first days are published, the later ones still drafts.
 */
export async function seedVisits(
  tenant: Tenant,
  staff: readonly Staff[],
  random: () => number,
  now: Date,
): Promise<void> {
  const today = now.toISOString().slice(0, 10) as CalendarDate;
  const technicians = staff.filter(({ person }) => person.role === 'technician');
  for (const technician of technicians) {
    const planner = staff.find(
      ({ person }) =>
        person.role === 'regional-facility-manager' && person.over === technician.person.over,
    );
    if (!planner) continue;
    const stores = await openWork(tenant, technician.id, now);
    for (let day = 0; day < DAYS; day += 1) {
      const stops = stores.slice(day * STORES_A_DAY, (day + 1) * STORES_A_DAY);
      const onDate = addDays(today, day);
      await planDay(tenant, { planner, technician, stops, onDate, random, now }, day);
    }
  }
}

interface Stop {
  readonly storeId: string;
  readonly taskIds: string[];
}

interface Day {
  readonly planner: Staff;
  readonly technician: Staff;
  readonly stops: readonly Stop[];
  readonly onDate: CalendarDate;
  readonly random: () => number;
  readonly now: Date;
}

async function planDay(tenant: Tenant, day: Day, index: number): Promise<void> {
  const { planner, technician, stops, onDate, random, now } = day;
  const actor = actorOf(tenant, planner);
  let routeId: string | undefined;
  for (const stop of stops) {
    const visit = { id: namedId(random), technicianId: technician.id, onDate, note: '', ...stop };
    routeId = await addVisit(tenant, actor, visit, now);
  }
  if (!routeId) return;
  await orderNearestNext(tenant, actor, routeId, await versionOf(tenant, routeId));
  if (index >= PUBLISHED_DAYS) return;
  await publishRoute(tenant, actor, routeId, await versionOf(tenant, routeId), now);
}

async function versionOf(tenant: Tenant, routeId: string): Promise<number> {
  const route = await tenant.row<{ version: number }>('SELECT version FROM routes WHERE id = $1', [
    routeId,
  ]);
  return route?.version ?? 0;
}

/** What can be done now or waits to be caught up, the most pressing stores first. */
function openWork(tenant: Tenant, technicianId: string, now: Date): Promise<Stop[]> {
  return tenant.rows<Stop>(
    `SELECT s.id AS "storeId", array_agg(t.id ORDER BY t.due_at, t.id) AS "taskIds"
     FROM tasks t JOIN stores s ON s.id = t.store_id
     WHERE t.assigned_to = $1 AND t.outcome = 'none' AND t.opens_at <= $2 AND t.lapses_at > $2
     GROUP BY s.id ORDER BY min(t.closes_at), s.number`,
    [technicianId, now],
  );
}
