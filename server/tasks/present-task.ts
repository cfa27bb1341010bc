import { mayAt } from '@shared/access/ability';
import type { Place } from '@shared/access/role';
import { windowEnd } from '@shared/compliance/window-end';
import type { ReplyOf } from '@shared/contract/endpoint';
import { NEVER_LAPSES } from '@shared/recurrence/window';
import { type TaskOutcome, taskState } from '@shared/tasks/task-state';
import type { readTask } from '@shared/tasks/tasks-contract';
import type { Actor } from '../access/actor';

export type Task = ReplyOf<typeof readTask>;

type Moment = 'opensAt' | 'dueSoonAt' | 'dueAt' | 'closesAt' | 'lapsesAt' | 'outcomeAt';
type Derived = Moment | 'state' | 'end' | 'assignee' | 'mayPlan' | 'procedureTitle';

/** A task as {@link taskColumns} select it. */
export interface TaskRecord
  extends Omit<Task, Derived>, Record<Exclude<Moment, 'outcomeAt'>, Date>, Omit<Place, 'storeId'> {
  outcome: TaskOutcome;
  outcomeAt: Date | null;
  assigneeId: string | null;
  assigneeName: string | null;
}

/** What is known of a task from its own row, its place, its rule and who has to do with it. */
export const taskColumns = `
  t.id, t.version, t.outcome, t.audience, t.rule_id AS "ruleId", r.name AS "ruleName",
  t.procedure_id AS "procedureId", t.store_id AS "storeId", s.number AS "storeNumber",
  s.name AS "storeName", s.chain_id AS "chainId", s.region_id AS "regionId", t.unit_id AS "unitId",
  u.tag AS "unitTag", u.kind AS "unitKind", t.time_zone AS "timeZone",
  t.due_at AT TIME ZONE t.time_zone AS "dueLocal", t.due_on AS "dueOn", t.opens_at AS "opensAt",
  t.due_soon_at AS "dueSoonAt", t.due_at AS "dueAt", t.closes_at AS "closesAt",
  t.closes_on AS "closesOn", t.lapses_at AS "lapsesAt", t.assigned_to AS "assigneeId",
  a.name AS "assigneeName", ro.on_date AS "visitOn", t.outcome_at AS "outcomeAt",
  b.name AS "outcomeBy", t.outcome_reason AS "outcomeReason", t.deferred_from AS "deferredFrom"`;

/** What {@link taskColumns} need beside `t`. */
export const taskJoins = `
  JOIN stores s ON s.id = t.store_id
  JOIN rules r ON r.id = t.rule_id
  LEFT JOIN units u ON u.id = t.unit_id
  LEFT JOIN people a ON a.id = t.assigned_to
  LEFT JOIN people b ON b.id = t.outcome_by
  LEFT JOIN visits v ON v.id = t.visit_id
  LEFT JOIN routes ro ON ro.id = v.route_id`;

/** A task as the contract tells it, at the instant `now`. */
export function presentTask(
  { outcome, assigneeId, assigneeName, chainId, regionId, ...row }: TaskRecord,
  procedureTitle: Task['procedureTitle'],
  actor: Actor,
  now: Date,
): Task {
  const outcomeAt = row.outcomeAt?.getTime() ?? null;
  const times = {
    opensAt: row.opensAt.getTime(),
    dueSoonAt: row.dueSoonAt.getTime(),
    closesAt: row.closesAt.getTime(),
    lapsesAt: row.lapsesAt.getTime(),
  };
  const place = { storeId: row.storeId, chainId, regionId };
  return {
    ...row,
    procedureTitle,
    state: taskState(outcome, outcomeAt, times, now.getTime()),
    end: windowEnd({ outcome, outcomeAt, closesAt: times.closesAt }, now.getTime()),
    opensAt: row.opensAt.toISOString(),
    dueSoonAt: row.dueSoonAt.toISOString(),
    dueAt: row.dueAt.toISOString(),
    closesAt: row.closesAt.toISOString(),
    lapsesAt: times.lapsesAt >= NEVER_LAPSES ? null : row.lapsesAt.toISOString(),
    outcomeAt: row.outcomeAt?.toISOString() ?? null,
    assignee: assigneeId && assigneeName ? { id: assigneeId, name: assigneeName } : null,
    mayPlan: outcome === 'none' && mayAt('tasks.plan', actor.grants, place),
  };
}
