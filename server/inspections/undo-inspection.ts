import { conflict, forbidden } from '@shared/problem';
import type { TaskState } from '@shared/tasks/task-state';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { markStale } from './close-task';
import { mayUndo } from './inspection-policy';
import { type TaskRow, stateOf } from './task-rows';

/**
 * Takes back the closing of a task: the task is open again, findings of it that nobody settled are
 * taken back with it, and the inspection stays on record as undone.
 * @param row the task, locked
 */
export async function undoInspection(
  tenant: Tenant,
  actor: Actor,
  row: TaskRow,
  now: Date,
): Promise<TaskState> {
  const standing = await tenant.row<{ id: string; personId: string }>(
    `SELECT id, person_id AS "personId" FROM inspections WHERE task_id = $1 AND undone_at IS NULL`,
    [row.id],
  );
  if (row.outcome !== 'done' || !standing) throw conflict('The task is not closed.');
  if (!mayUndo(actor, row, standing.personId)) throw forbidden();
  await tenant.rows('UPDATE inspections SET undone_at = $2, undone_by = $3 WHERE id = $1', [
    standing.id,
    now,
    actor.personId,
  ]);
  await tenant.rows(
    `UPDATE findings SET settled_at = $2, settled_by = $3, settled_note = 'Inspection taken back',
       version = version + 1
     WHERE inspection_id = $1 AND settled_at IS NULL`,
    [standing.id, now, actor.personId],
  );
  await tenant.rows(
    `UPDATE tasks SET outcome = 'none', outcome_at = NULL, outcome_by = NULL, version = version + 1
     WHERE id = $1 AND occurs_local = $2`,
    [row.id, row.occursLocal],
  );
  await markStale(tenant, row, now);
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'task',
    subjectId: row.id,
    action: 'undone',
    detail: { inspectionId: standing.id },
  });
  return stateOf({ ...row, outcome: 'none', outcomeAt: null }, now);
}
