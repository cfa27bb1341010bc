import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';

/**
 * Gives a long job up. Its worker notices at its next write, which is refused; one that has ended
 * stays as it is.
 */
export async function cancelLongJob(tenant: Tenant, actor: Actor, id: string): Promise<void> {
  const cancelled = await tenant.row<{ kind: string }>(
    `UPDATE long_jobs SET state = 'cancelled', leased_until = NULL, finished_at = now()
     WHERE id = $1 AND state IN ('waiting', 'running') RETURNING kind`,
    [id],
  );
  if (!cancelled) return;
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'long-job',
    subjectId: id,
    action: 'long-job-cancelled',
    detail: { kind: cancelled.kind },
  });
}
