import { conflict, forbidden } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { lockEnrolment } from './enrolment-queries';
import { mayEnrolAt } from './programme-policy';
import { syncSchedules } from './sync-schedules';

/**
 * Removes an enrolment or exception; gives back its programme's id. What was done stays.
 * @throws Problem 404; 403; 409 when somebody changed it meanwhile.
 */
export async function unenrol(
  tenant: Tenant,
  actor: Actor,
  { id, version, now }: { id: string; version: number; now: Date },
): Promise<string> {
  const before = await lockEnrolment(tenant, id);
  if (!mayEnrolAt(actor, before)) throw forbidden();
  if (before.version !== version) throw conflict();
  await tenant.rows('DELETE FROM enrolments WHERE id = $1', [id]);
  const { programmeId, scopeKind, scopeId, exception, fromOn, untilOn } = before;
  const schedules = await syncSchedules(tenant, now, { programmeId });
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'programme',
    subjectId: programmeId,
    action: exception ? 'exception-removed' : 'unenrolled',
    detail: { scopeKind, scopeId, fromOn, untilOn, schedules },
  });
  return programmeId;
}
