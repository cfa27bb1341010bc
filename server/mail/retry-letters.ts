import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { authoriseEverywhere } from '../access/authorise';
import { recordEvent } from '../audit/record-event';

/**
 * Puts dead letters back into the queue, their attempts counted from nothing again.
 * @returns how many were dead and now wait
 * @throws Problem 403
 */
export async function retryLetters(
  tenant: Tenant,
  actor: Actor,
  ids: readonly string[],
): Promise<number> {
  authoriseEverywhere(actor, 'mail.retry');
  const queued = await tenant.rows<{ id: string }>(
    `UPDATE letters SET state = 'queued', attempts = 0, next_attempt_at = now(), leased_until = NULL
     WHERE id = ANY($1::uuid[]) AND state = 'dead' RETURNING id`,
    [ids],
  );
  for (const { id } of queued) {
    await recordEvent(tenant, {
      actorId: actor.personId,
      subjectKind: 'letter',
      subjectId: id,
      action: 'retried',
    });
  }
  return queued.length;
}
