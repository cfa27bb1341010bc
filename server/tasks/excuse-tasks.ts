import type { BodyOf } from '@shared/contract/endpoint';
import type { excuseTasks as endpoint } from '@shared/tasks/task-changes-contract';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { type TaskChange, changeTasks } from './change-tasks';

/**
 * Says that tasks need not be done, with a reason that stays on record. A window that has closed may
 * be excused as well: the days it counted on are counted again.
 */
export function excuseTasks(
  tenant: Tenant,
  actor: Actor,
  { reason, ...act }: BodyOf<typeof endpoint>,
  now: Date,
): Promise<TaskChange> {
  return changeTasks(
    tenant,
    actor,
    { ...act, kind: 'excuse', detail: { reason } },
    (task) =>
      task.outcome === 'none'
        ? {
            outcome: 'excused',
            outcomeAt: now,
            outcomeBy: actor.personId,
            outcomeReason: reason,
          }
        : 'decided',
    now,
  );
}
