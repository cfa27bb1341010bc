import { mayAt } from '@shared/access/ability';
import { conflict, notFound } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvents } from '../audit/record-events';
import { type TaskChange, findChange, presentChange, resultOf, unseen } from './change-tasks';
import { type ChangeableFields, type ChangeableTask, lockTasks } from './select-tasks';
import { writeTasks } from './write-tasks';

/**
 * Takes a change back for every task to which nothing happened since; the others stay as they are.
 * @throws Problem 404 unless the actor made the change; 409 when it was taken back before
 */
export async function undoTaskChange(
  tenant: Tenant,
  actor: Actor,
  id: string,
  now: Date,
): Promise<TaskChange> {
  const change = await findChange(tenant, id, true);
  if (!change || change.personId !== actor.personId) throw notFound('change');
  if (change.undoneAt) throw conflict('This was taken back already.');
  const kept = new Map(change.before.map((it) => [it.taskId, it]));
  const tasks = await lockTasks(tenant, actor, { ids: [...kept.keys()] }, now);
  const restored: { task: ChangeableTask; after: ChangeableFields }[] = [];
  const results = tasks.map((task) => {
    const before = kept.get(task.id);
    if (!mayAt('tasks.plan', actor.grants, task)) return resultOf(task, 'not-allowed');
    if (before?.version !== task.version) return resultOf(task, 'changed-meanwhile');
    restored.push({ task, after: asFields(before.fields) });
    return resultOf(task, null);
  });
  const found = new Set(tasks.map((task) => task.id));
  results.push(...[...kept.keys()].filter((taskId) => !found.has(taskId)).map(unseen));
  await writeTasks(tenant, restored, now);
  await tenant.rows('UPDATE task_changes SET undone_at = $2 WHERE id = $1', [id, now]);
  await recordEvents(tenant, {
    actorId: actor.personId,
    subjectKind: 'task',
    action: 'change-taken-back',
    subjects: restored.map(({ task }) => ({
      id: task.id,
      detail: { changeId: id, kind: change.kind },
    })),
  });
  return presentChange({ ...change, undoneAt: now }, results);
}

/** Out of JSON, where instants are text. */
const asFields = (kept: ChangeableFields): ChangeableFields => ({
  ...kept,
  outcomeAt: kept.outcomeAt && new Date(kept.outcomeAt),
  dueSoonAt: new Date(kept.dueSoonAt),
  dueAt: new Date(kept.dueAt),
  closesAt: new Date(kept.closesAt),
  lapsesAt: new Date(kept.lapsesAt),
});
