import type { CalendarDate } from '@shared/calendar/calendar-date';
import type { ProcedureContent } from '@shared/procedures/procedure-content';
import type { Tenant } from '@db/tenant-transaction';
import type { Staff } from '../demo/seed-people';
import type { World } from '../world/fleet';
import { namedId } from '../world/random';
import type { HistoryTask, HistoryWorld } from './history-world';
import { makeLives } from './make-lives';
import { simulateHistory } from './simulate-history';

/** Lets the crews and technicians work through the tasks that the product wrote, up to `now`. */
export async function seedHistory(
  tenant: Tenant,
  world: World,
  staff: readonly Staff[],
  first: CalendarDate,
  random: () => number,
  now: Date,
): Promise<void> {
  const history: HistoryWorld = {
    stores: makeLives(world, staff, first, random, now),
    procedures: await publishedProcedures(tenant),
    newId: () => namedId(random),
  };
  const tasks = await tasksInOrder(tenant);
  await simulateHistory(history, tasks, random, now).write(tenant);
}

async function publishedProcedures(tenant: Tenant): Promise<HistoryWorld['procedures']> {
  const rows = await tenant.rows<{ code: string; versionId: string; content: ProcedureContent }>(
    `SELECT DISTINCT ON (p.id) p.code, v.id AS "versionId", v.content
     FROM procedures p JOIN procedure_versions v ON v.procedure_id = p.id
     WHERE v.published_at IS NOT NULL ORDER BY p.id, v.published_at DESC`,
  );
  return new Map(rows.map(({ code, ...version }) => [code, version]));
}

/** By due date; within a day in an order that does not hang on the tasks' own chance ids. */
function tasksInOrder(tenant: Tenant): Promise<HistoryTask[]> {
  return tenant.rows<HistoryTask>(
    `SELECT t.id, p.code, t.audience, t.store_id AS "storeId", t.unit_id AS "unitId",
       t.occurs_local AS "occursLocal", t.due_on AS "dueOn", t.opens_at AS "opensAt",
       t.due_at AS "dueAt", t.closes_at AS "closesAt", t.lapses_at AS "lapsesAt"
     FROM tasks t JOIN procedures p ON p.id = t.procedure_id
       JOIN stores s ON s.id = t.store_id LEFT JOIN units u ON u.id = t.unit_id
     ORDER BY t.due_on, t.due_at, s.number, u.tag, p.code`,
  );
}
