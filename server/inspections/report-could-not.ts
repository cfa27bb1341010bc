import { mayAt } from '@shared/access/ability';
import { conflict, forbidden } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import type { TaskRow } from './task-rows';

/** Writes down why a task could not be done. It stays open: who plans decides what follows. */
export async function reportCouldNot(
  tenant: Tenant,
  actor: Actor,
  row: TaskRow,
  report: { readonly reason: string; readonly note: string },
): Promise<void> {
  const ability = row.audience === 'store' ? 'tasks.acknowledge' : 'tasks.do';
  if (!mayAt(ability, actor.grants, row)) throw forbidden();
  if (row.outcome !== 'none') throw conflict('The task was closed meanwhile.');
  const text = report.note === '' ? report.reason : `${report.reason}: ${report.note}`;
  await tenant.rows(
    `UPDATE tasks SET outcome_reason = $3, version = version + 1
     WHERE id = $1 AND occurs_local = $2`,
    [row.id, row.occursLocal, text],
  );
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'task',
    subjectId: row.id,
    action: 'could-not',
    detail: report,
  });
}
