import type { Place } from '@shared/access/role';
import { notFound } from '@shared/problem';
import type { Ability } from '@shared/access/ability';
import { type TaskOutcome, type TaskState, taskState } from '@shared/tasks/task-state';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';

/** A task as doing it needs it. */
export interface TaskRow extends Place {
  id: string;
  occursLocal: string;
  version: number;
  audience: 'technician' | 'store';
  outcome: TaskOutcome;
  outcomeAt: Date | null;
  outcomeReason: string | null;
  opensAt: Date;
  dueSoonAt: Date;
  closesAt: Date;
  lapsesAt: Date;
  closesOn: string;
  dueOn: string;
  timeZone: string;
  assignedTo: string | null;
  ruleName: string;
  procedureId: string;
  unitId: string | null;
  unitTag: string | null;
  unitKind: 'built-in' | 'portable' | null;
  storeNumber: string;
  storeName: string;
  accessNote: string;
}

const columns = `
  t.id, t.occurs_local AS "occursLocal", t.version, t.audience, t.outcome,
  t.outcome_at AS "outcomeAt", t.outcome_reason AS "outcomeReason", t.opens_at AS "opensAt",
  t.due_soon_at AS "dueSoonAt", t.closes_at AS "closesAt", t.lapses_at AS "lapsesAt",
  t.closes_on AS "closesOn", t.due_on AS "dueOn", t.time_zone AS "timeZone",
  t.assigned_to AS "assignedTo", r.name AS "ruleName", t.procedure_id AS "procedureId",
  t.unit_id AS "unitId", u.tag AS "unitTag", u.kind AS "unitKind", s.id AS "storeId",
  s.chain_id AS "chainId", s.region_id AS "regionId", s.number AS "storeNumber",
  s.name AS "storeName", s.access_note AS "accessNote"`;

/** Tasks that the actor may see under an ability and that fit a condition, in order of closing. */
export function taskRows(
  tenant: Tenant,
  actor: Actor,
  ability: Ability,
  where: (binds: Binds) => string,
  locked = false,
): Promise<TaskRow[]> {
  const binds = new Binds();
  return tenant.rows<TaskRow>(
    `SELECT ${columns}
     FROM tasks t
     JOIN stores s ON s.id = t.store_id
     JOIN rules r ON r.id = t.rule_id
     LEFT JOIN units u ON u.id = t.unit_id
     WHERE ${visibleStores(actor, ability, binds)} AND ${where(binds)}
     ORDER BY t.closes_at, t.id ${locked ? 'FOR UPDATE OF t' : ''}`,
    binds.values,
  );
}

/** One task. @throws Problem 404 when it does not exist or lies out of the actor's sight */
export async function taskRow(
  tenant: Tenant,
  actor: Actor,
  ability: Ability,
  id: string,
  locked = false,
): Promise<TaskRow> {
  const [row] = await taskRows(
    tenant,
    actor,
    ability,
    (binds) => `t.id = ${binds.add(id)}::uuid`,
    locked,
  );
  if (!row) throw notFound('task');
  return row;
}

/** The state of a task row at an instant. */
export function stateOf(row: TaskRow, now: Date): TaskState {
  return taskState(
    row.outcome,
    row.outcomeAt?.getTime() ?? null,
    {
      opensAt: row.opensAt.getTime(),
      dueSoonAt: row.dueSoonAt.getTime(),
      closesAt: row.closesAt.getTime(),
      lapsesAt: row.lapsesAt.getTime(),
    },
    now.getTime(),
  );
}
