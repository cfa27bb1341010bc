import type * as z from 'zod';
import type { plannedTask } from '@shared/visits/route-parts';
import type { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';

export type PlannedTask = z.output<typeof plannedTask>;

/** A task with where it stands, before it is grouped. */
export interface PlannedTaskRow extends PlannedTask {
  readonly storeId: string;
  readonly visitId: string | null;
}

/** Minutes of each procedure's newest published version, to be joined by `procedure_id`. */
export const procedureMinutes = `
  (SELECT DISTINCT ON (procedure_id) procedure_id, (content ->> 'minutes')::int AS minutes
   FROM procedure_versions WHERE published_at IS NOT NULL
   ORDER BY procedure_id, number DESC)`;

/** SQL of a task's state at an instant; the same rule as `shared/tasks/task-state.ts`. */
export const stateAt = (now: string) =>
  `task_state(t.outcome, t.outcome_at, t.opens_at, t.due_soon_at, t.closes_at, t.lapses_at,
     ${now}::timestamptz)`;

/** Tasks that fit a condition on `tasks t` and `stores s`, by unit and what closes first. */
export function plannedTaskRows(
  tenant: Tenant,
  binds: Binds,
  where: string,
  now: Date,
): Promise<PlannedTaskRow[]> {
  return tenant.rows<PlannedTaskRow>(
    `SELECT t.id, t.version, r.name AS "ruleName", u.tag AS "unitTag", t.due_on AS "dueOn",
       (t.opens_at AT TIME ZONE t.time_zone)::date AS "opensOn", t.closes_on AS "closesOn",
       ${stateAt(binds.add(now))} AS state, m.minutes, t.store_id AS "storeId",
       t.visit_id AS "visitId"
     FROM tasks t
     JOIN stores s ON s.id = t.store_id
     JOIN rules r ON r.id = t.rule_id
     LEFT JOIN units u ON u.id = t.unit_id
     LEFT JOIN ${procedureMinutes} m ON m.procedure_id = t.procedure_id
     WHERE ${where}
     ORDER BY u.tag NULLS FIRST, t.closes_at, r.name, t.id`,
    binds.values,
  );
}

/** Without what it was grouped by. */
export function asPlannedTask({ storeId: _, visitId: __, ...task }: PlannedTaskRow): PlannedTask {
  return task;
}

export const sumMinutes = (tasks: readonly PlannedTask[]) =>
  tasks.reduce((sum, { minutes }) => sum + (minutes ?? 0), 0);
