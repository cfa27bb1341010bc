import { mayAt } from '@shared/access/ability';
import type { RoleGrant } from '@shared/access/role';
import type { BodyOf } from '@shared/contract/endpoint';
import { invalid } from '@shared/problem';
import type { assignTasks as endpoint } from '@shared/tasks/task-changes-contract';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { type TaskChange, changeTasks } from './change-tasks';

/**
 * Gives tasks to a technician, or to nobody. A task on a route that is not published yet leaves it,
 * as the route is somebody's day.
 * @throws Problem 422 when the technician is unknown or no longer active
 */
export async function assignTasks(
  tenant: Tenant,
  actor: Actor,
  { technicianId, reason, ...act }: BodyOf<typeof endpoint>,
  now: Date,
): Promise<TaskChange> {
  const grants = technicianId ? await grantsOf(tenant, technicianId) : [];
  const detail = { technicianId, ...(reason ? { reason } : {}) };
  return changeTasks(
    tenant,
    actor,
    { ...act, kind: 'assign', detail },
    (task) => {
      if (task.audience !== 'technician') return 'for-the-store';
      if (task.outcome !== 'none') return 'decided';
      if (now >= task.lapsesAt) return 'lapsed';
      if (task.assignedTo === technicianId) return 'already-so';
      if (task.onPublishedRoute) return 'on-published-route';
      if (technicianId && !mayAt('tasks.do', grants, task)) return 'not-their-store';
      return { assignedTo: technicianId, visitId: null };
    },
    now,
  );
}

async function grantsOf(tenant: Tenant, technicianId: string): Promise<RoleGrant[]> {
  const person = await tenant.row<{ grants: RoleGrant[] }>(
    `SELECT coalesce((SELECT jsonb_agg(jsonb_build_object('role', g.role, 'scopeKind', g.scope_kind,
         'scopeId', g.scope_id)) FROM role_grants g WHERE g.person_id = p.id), '[]') AS grants
     FROM people p WHERE p.id = $1 AND p.disabled_at IS NULL`,
    [technicianId],
  );
  if (person) return person.grants;
  throw invalid([
    { field: 'technicianId', reason: 'unknown', message: 'Nobody active has this id.' },
  ]);
}
