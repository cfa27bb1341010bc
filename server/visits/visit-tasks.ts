import { type FieldError, invalid } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import { stateAt } from './planned-tasks';

interface Candidate {
  id: string;
  occursLocal: string;
  visitId: string | null;
  audience: string;
  outcome: string;
  state: string;
  free: boolean;
}

/**
 * SQL true for `tasks t` in `stores s` that no visit waits for: they have none, or its day is over
 * and left them undone.
 */
export const freeToPlan = (now: string) => `(t.visit_id IS NULL OR NOT EXISTS (
  SELECT 1 FROM visits held JOIN routes day ON day.id = held.route_id
  WHERE held.id = t.visit_id AND day.on_date >= (${now}::timestamptz AT TIME ZONE s.time_zone)::date))`;

/**
 * Puts tasks on a visit and in its technician's hands.
 * @throws Problem 422 for each task that is not in that store, not a technician's, decided, missed or
 *   in another visit
 * @returns how many came that were not on it before
 */
export async function takeTasks(
  tenant: Tenant,
  visit: { readonly id: string; readonly storeId: string; readonly technicianId: string },
  taskIds: readonly string[],
  now: Date,
): Promise<number> {
  const rows = await tenant.rows<Candidate>(
    `SELECT t.id, t.occurs_local AS "occursLocal", t.visit_id AS "visitId", t.audience, t.outcome,
       ${stateAt('$3')} AS state, ${freeToPlan('$3')} AS free
     FROM tasks t JOIN stores s ON s.id = t.store_id
     WHERE t.id = ANY($1::uuid[]) AND t.store_id = $2 ORDER BY t.id FOR UPDATE OF t`,
    [taskIds, visit.storeId, now],
  );
  const byId = new Map(rows.map((row) => [row.id, row]));
  const errors = taskIds.flatMap((id, index) => faultOf(byId.get(id), visit.id, index));
  if (errors.length > 0) throw invalid(errors);
  const coming = rows.filter(({ visitId }) => visitId !== visit.id).map(({ id }) => id);
  await tenant.rows(
    `UPDATE tasks SET visit_id = $2, assigned_to = $3, version = version + 1
     WHERE id = ANY($1::uuid[])`,
    [coming, visit.id, visit.technicianId],
  );
  return coming.length;
}

function faultOf(task: Candidate | undefined, visitId: string, index: number): FieldError[] {
  const fault = (reason: string, message: string) => [
    { field: `taskIds.${index}`, reason, message },
  ];
  if (!task || task.audience !== 'technician') {
    return fault('unknown', 'This is not a technician’s task of that store.');
  }
  if (task.visitId === visitId) return [];
  if (task.outcome !== 'none' || task.state === 'missed') {
    return fault('not-open', 'This task can no longer be done.');
  }
  return task.free ? [] : fault('in-visit', 'This task is in another visit.');
}

/** Gives a visit's open tasks back to unplanned work, but for those named. */
export async function releaseTasks(
  tenant: Tenant,
  visitId: string,
  keep: readonly string[] = [],
): Promise<void> {
  await tenant.rows(
    `UPDATE tasks SET visit_id = NULL, assigned_to = NULL, version = version + 1
     WHERE visit_id = $1 AND outcome = 'none' AND id <> ALL($2::uuid[])`,
    [visitId, keep],
  );
}
