import type { Place } from '@shared/access/role';
import { Problem } from '@shared/problem';
import type { TaskOutcome } from '@shared/tasks/task-state';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { type TaskFilters, taskConditions } from './task-conditions';

/** What a change of many tasks may set, and what taking it back restores. */
export interface ChangeableFields {
  outcome: TaskOutcome;
  outcomeAt: Date | null;
  outcomeBy: string | null;
  outcomeReason: string | null;
  assignedTo: string | null;
  visitId: string | null;
  dueOn: string;
  closesOn: string;
  dueSoonAt: Date;
  dueAt: Date;
  closesAt: Date;
  lapsesAt: Date;
  deferredFrom: string | null;
}

/** A locked task with what decides whether it may be changed. */
export interface ChangeableTask extends ChangeableFields, Place {
  id: string;
  occursLocal: string;
  version: number;
  audience: 'technician' | 'store';
  opensAt: Date;
  timeZone: string;
  windowKind: 'days' | 'hours';
  /** On a published route of today or later. */
  onPublishedRoute: boolean;
  storeNumber: string;
  unitTag: string | null;
  ruleName: string;
}

/**
 * Locks the given tasks as far as the actor sees them, the first to close first.
 * @throws Problem 409 when more fit the filters than the person saw
 */
export async function lockTasks(
  tenant: Tenant,
  actor: Actor,
  which:
    { readonly ids: readonly string[] } | { readonly filters: Partial<TaskFilters>; seen: number },
  now: Date,
): Promise<ChangeableTask[]> {
  const binds = new Binds();
  const at = `${binds.add(now)}::timestamptz`;
  const where =
    'ids' in which
      ? `t.id = ANY(${binds.add(which.ids)}::uuid[])
         AND ${taskConditions(actor, 'tasks.read', {}, now, binds)}`
      : taskConditions(actor, 'tasks.read', which.filters, now, binds);
  const limit = 'ids' in which ? '' : `LIMIT ${binds.add(which.seen + 1)}`;
  const rows = await tenant.rows<ChangeableTask>(
    // Everybody who locks tasks does so in the order of their ids, or two could wait for each other.
    `SELECT t.id, t.occurs_local AS "occursLocal", t.version, t.audience, t.outcome,
       t.outcome_at AS "outcomeAt", t.outcome_by AS "outcomeBy", t.outcome_reason AS "outcomeReason",
       t.assigned_to AS "assignedTo", t.visit_id AS "visitId", t.due_on AS "dueOn",
       t.closes_on AS "closesOn", t.opens_at AS "opensAt", t.due_soon_at AS "dueSoonAt",
       t.due_at AS "dueAt", t.closes_at AS "closesAt", t.lapses_at AS "lapsesAt",
       t.deferred_from AS "deferredFrom", t.time_zone AS "timeZone",
       r.time_window ->> 'kind' AS "windowKind",
       EXISTS (SELECT FROM visits v JOIN routes ro ON ro.id = v.route_id WHERE v.id = t.visit_id
         AND ro.published_at IS NOT NULL AND ro.on_date >= (${at} AT TIME ZONE t.time_zone)::date)
         AS "onPublishedRoute",
       s.id AS "storeId", s.chain_id AS "chainId", s.region_id AS "regionId",
       s.number AS "storeNumber", u.tag AS "unitTag", r.name AS "ruleName"
     FROM tasks t JOIN stores s ON s.id = t.store_id JOIN rules r ON r.id = t.rule_id
     LEFT JOIN units u ON u.id = t.unit_id
     WHERE ${where} ORDER BY t.id ${limit} FOR UPDATE OF t`,
    binds.values,
  );
  if (!('ids' in which) && rows.length > which.seen) throw moreThanSeen();
  return rows.sort((a, b) => a.closesAt.getTime() - b.closesAt.getTime());
}

const moreThanSeen = () =>
  new Problem(409, 'more-than-seen', 'More tasks fit by now than you saw.', {
    detail: 'Nothing was changed. Look at the list again.',
  });
