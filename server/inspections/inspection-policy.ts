import { mayAt } from '@shared/access/ability';
import type { TaskState } from '@shared/tasks/task-state';
import type { Actor } from '../access/actor';
import type { TaskRow } from './task-rows';

/** States in which a task can be closed with an inspection. */
const closable: readonly TaskState[] = ['open', 'due-soon', 'overdue'];

/**
 * Technicians close technicians' tasks that are theirs or nobody's; stores acknowledge their own.
 * Nobody closes what is not open yet, has lapsed or was decided already.
 */
export function mayCloseTask(actor: Actor, row: TaskRow, state: TaskState): boolean {
  if (!closable.includes(state)) return false;
  if (row.audience === 'store') return mayAt('tasks.acknowledge', actor.grants, row);
  const own = row.assignedTo === null || row.assignedTo === actor.personId;
  return own && mayAt('tasks.do', actor.grants, row);
}

/** Whoever closed a task may take that back, and so may whoever plans there. */
export function mayUndo(actor: Actor, row: TaskRow, closedBy: string): boolean {
  return closedBy === actor.personId || mayAt('tasks.plan', actor.grants, row);
}
