import { mayAt } from '@shared/access/ability';
import type { BodyOf, ReplyOf } from '@shared/contract/endpoint';
import type { assignTasks, leftReasons } from '@shared/tasks/task-changes-contract';
import { conflict } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvents } from '../audit/record-events';
import { type ChangeableFields, type ChangeableTask, lockTasks } from './select-tasks';
import { fieldsOf, writeTasks } from './write-tasks';

export type LeftReason = (typeof leftReasons)[number];
export type TaskChange = ReplyOf<typeof assignTasks>;
type Selection = BodyOf<typeof assignTasks>['selection'];
export type Result = TaskChange['results'][number];

/** What one kind of change does to one task: what becomes of it, or why it is left alone. */
export type Decide = (task: ChangeableTask) => Partial<ChangeableFields> | LeftReason;

/** How a changed task stood, and at which version the change left it. */
export interface KeptTask {
  readonly taskId: string;
  readonly version: number;
  readonly fields: ChangeableFields;
}

interface StoredChange {
  id: string;
  kind: TaskChange['kind'];
  personId: string;
  madeAt: Date;
  undoneAt: Date | null;
  results: Result[];
  before: KeptTask[];
}

/**
 * Changes every selected task that may be changed and says of each other one why not. The same change
 * sent again answers as the first time and changes nothing.
 *
 * @throws Problem 409 when more tasks fit a filter than were seen, or the id names another change
 */
export async function changeTasks(
  tenant: Tenant,
  actor: Actor,
  act: {
    readonly id: string;
    readonly kind: TaskChange['kind'];
    readonly selection: Selection;
    /** Kept in the record of each task. */
    readonly detail: object;
  },
  decide: Decide,
  now: Date,
): Promise<TaskChange> {
  const before = await findChange(tenant, act.id);
  if (before) {
    if (before.personId !== actor.personId || before.kind !== act.kind) throw conflict();
    return presentChange(before);
  }
  const { selection } = act;
  const tasks = await lockTasks(
    tenant,
    actor,
    selection.kind === 'tasks' ? { ids: selection.tasks.map(({ id }) => id) } : selection,
    now,
  );
  const seen = new Map(
    selection.kind === 'tasks' ? selection.tasks.map(({ id, version }) => [id, version]) : [],
  );
  const changes: { task: ChangeableTask; after: ChangeableFields }[] = [];
  const results = tasks.map((task) => {
    const outcome = whyNot(actor, task, seen.get(task.id)) ?? decide(task);
    if (typeof outcome === 'string') return resultOf(task, outcome);
    changes.push({ task, after: { ...fieldsOf(task), ...outcome } });
    return resultOf(task, null);
  });
  const found = new Set(tasks.map(({ id }) => id));
  results.push(...[...seen.keys()].filter((id) => !found.has(id)).map(unseen));
  await writeTasks(tenant, changes, now);
  await recordEvents(tenant, {
    actorId: actor.personId,
    subjectKind: 'task',
    action: eventOf[act.kind],
    subjects: changes.map(({ task }) => ({
      id: task.id,
      detail: { ...act.detail, changeId: act.id },
    })),
  });
  const stored: StoredChange = {
    id: act.id,
    kind: act.kind,
    personId: actor.personId,
    madeAt: now,
    undoneAt: null,
    results,
    before: changes.map(({ task }) => ({
      taskId: task.id,
      version: task.version + 1,
      fields: fieldsOf(task),
    })),
  };
  await keepChange(tenant, stored);
  return presentChange(stored);
}

const eventOf = { assign: 'assigned', excuse: 'excused', defer: 'deferred' } as const;

function whyNot(actor: Actor, task: ChangeableTask, seen: number | undefined): LeftReason | null {
  if (!mayAt('tasks.plan', actor.grants, task)) return 'not-allowed';
  return seen !== undefined && seen !== task.version ? 'changed-meanwhile' : null;
}

export const resultOf = (task: ChangeableTask, left: LeftReason | null): Result => ({
  taskId: task.id,
  storeNumber: task.storeNumber,
  unitTag: task.unitTag,
  ruleName: task.ruleName,
  dueOn: task.dueOn,
  changed: left === null,
  left,
});

export const unseen = (taskId: string): Result => ({
  taskId,
  storeNumber: null,
  unitTag: null,
  ruleName: null,
  dueOn: null,
  changed: false,
  left: 'not-found',
});

/** A change that was made, as kept; locked on request. */
export function findChange(
  tenant: Tenant,
  id: string,
  locked = false,
): Promise<StoredChange | undefined> {
  return tenant.row<StoredChange>(
    `SELECT id, kind, person_id AS "personId", made_at AS "madeAt", undone_at AS "undoneAt", results,
       before FROM task_changes WHERE id = $1 ${locked ? 'FOR UPDATE' : ''}`,
    [id],
  );
}

async function keepChange(tenant: Tenant, change: StoredChange): Promise<void> {
  await tenant.rows(
    `INSERT INTO task_changes (id, organisation_id, person_id, kind, made_at, results, before)
     VALUES ($1, $2, $3, $4, $5, $6, $7)`,
    [
      change.id,
      tenant.organisationId,
      change.personId,
      change.kind,
      change.madeAt,
      JSON.stringify(change.results),
      JSON.stringify(change.before),
    ],
  );
}

/** A change as the contract tells it; of a change taken back, what became of each task then. */
export function presentChange(
  { id, kind, madeAt, undoneAt, results: made }: StoredChange,
  results: readonly Result[] = made,
): TaskChange {
  return {
    id,
    kind,
    madeAt: madeAt.toISOString(),
    undoneAt: undoneAt?.toISOString() ?? null,
    changed: results.filter(({ changed }) => changed).length,
    results: [...results],
  };
}
