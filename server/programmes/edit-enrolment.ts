import { conflict, forbidden } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { checkDates } from './enrol';
import { lockEnrolment } from './enrolment-queries';
import { mayEnrolAt } from './programme-policy';
import { syncSchedules } from './sync-schedules';

/**
 * Changes from when until when an enrolment or exception stands; gives back its programme's id.
 * @throws Problem 404; 403; 409 when somebody changed it meanwhile; 422 when it ends too early.
 */
export async function editEnrolment(
  tenant: Tenant,
  actor: Actor,
  given: { id: string; version: number; fromOn: string; untilOn: string | null; now: Date },
): Promise<string> {
  const before = await lockEnrolment(tenant, given.id);
  if (!mayEnrolAt(actor, before)) throw forbidden();
  if (before.version !== given.version) throw conflict();
  checkDates(given);
  await tenant.rows(
    'UPDATE enrolments SET from_on = $2, until_on = $3, version = version + 1 WHERE id = $1',
    [given.id, given.fromOn, given.untilOn],
  );
  const { programmeId } = before;
  const schedules = await syncSchedules(tenant, given.now, { programmeId });
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'programme',
    subjectId: programmeId,
    action: 'enrolment-edited',
    detail: { scopeKind: before.scopeKind, scopeId: before.scopeId, schedules },
  });
  return programmeId;
}
