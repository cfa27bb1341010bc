import type { BodyOf } from '@shared/contract/endpoint';
import type { enrol as contract } from '@shared/programmes/programmes-contract';
import { conflict, forbidden, invalid } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { mayEnrolAt, placeOf } from './programme-policy';
import { findProgramme } from './programme-queries';
import { syncSchedules } from './sync-schedules';

/**
 * Puts a chain, region, store or unit under a programme, or takes it out of a wider enrolment.
 * @throws Problem 404 for the programme or the place; 403; 422 when it is enrolled already, or ends
 *   before it begins; 409 when the id is taken.
 */
export async function enrol(
  tenant: Tenant,
  actor: Actor,
  given: BodyOf<typeof contract> & { programmeId: string; now: Date },
): Promise<void> {
  await findProgramme(tenant, given.programmeId);
  const place = await placeOf(tenant, given.scopeKind, given.scopeId);
  if (!mayEnrolAt(actor, place)) throw forbidden();
  checkDates(given);
  const made = await tenant.row(
    `INSERT INTO enrolments (id, organisation_id, programme_id, scope_kind, scope_id, exception,
       from_on, until_on)
     VALUES ($1, $2, $3, $4, $5, $6, $7, $8) ON CONFLICT DO NOTHING RETURNING id`,
    [
      given.id,
      tenant.organisationId,
      given.programmeId,
      given.scopeKind,
      given.scopeId,
      given.exception,
      given.fromOn,
      given.untilOn,
    ],
  );
  if (!made) {
    const there = await tenant.row(
      `SELECT id FROM enrolments WHERE programme_id = $1 AND scope_kind = $2 AND scope_id = $3
         AND exception = $4`,
      [given.programmeId, given.scopeKind, given.scopeId, given.exception],
    );
    if (!there) throw conflict();
    throw invalid([
      { field: 'scopeId', reason: 'enrolled-already', message: 'This is enrolled already.' },
    ]);
  }
  const schedules = await syncSchedules(tenant, given.now, { programmeId: given.programmeId });
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'programme',
    subjectId: given.programmeId,
    action: given.exception ? 'exception-made' : 'enrolled',
    detail: { scopeKind: given.scopeKind, scopeId: given.scopeId, schedules },
  });
}

/** @throws Problem 422 when the last day lies before the first. */
export function checkDates({ fromOn, untilOn }: { fromOn: string; untilOn: string | null }): void {
  if (untilOn !== null && untilOn < fromOn) {
    throw invalid([
      { field: 'untilOn', reason: 'before-start', message: 'The last day lies before the first.' },
    ]);
  }
}
