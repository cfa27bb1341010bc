import type { BodyOf } from '@shared/contract/endpoint';
import type { createProgramme as contract } from '@shared/programmes/programmes-contract';
import { conflict, forbidden } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { mayEnrolSomewhere } from './programme-policy';
import { nameTaken } from './name-taken';

/**
 * Begins a programme, without rules and enrolments yet.
 * @throws Problem 422 when its name is taken, 409 when its id is.
 */
export async function createProgramme(
  tenant: Tenant,
  actor: Actor,
  { id, name, description }: BodyOf<typeof contract>,
): Promise<void> {
  if (!mayEnrolSomewhere(actor)) throw forbidden();
  const made = await tenant.row(
    `INSERT INTO programmes (id, organisation_id, name, description) VALUES ($1, $2, $3, $4)
     ON CONFLICT DO NOTHING RETURNING id`,
    [id, tenant.organisationId, name, description],
  );
  if (!made) {
    const taken = await tenant.row('SELECT id FROM programmes WHERE name = $1', [name]);
    throw taken ? nameTaken() : conflict();
  }
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'programme',
    subjectId: id,
    action: 'programme-created',
    detail: { name },
  });
}
