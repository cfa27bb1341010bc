import type { BodyOf } from '@shared/contract/endpoint';
import type { invitePerson as contract } from '@shared/people/people-contract';
import { Problem, invalid } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { editablePerson } from './editable-person';
import { homeOfZip } from './home-of-zip';
import { checkGrants, scopesOf } from './people-policy';
import { replaceGrants } from './replace-grants';
import { writeInvitation } from './write-invitation';

/**
 * Makes a person with roles and writes them a letter. Sent again it changes nothing.
 * @throws Problem 422 when the address is taken, the ZIP code or a place unknown; 403 for a role that
 *   reaches further than the actor
 */
export async function invitePerson(
  tenant: Tenant,
  actor: Actor,
  wanted: BodyOf<typeof contract>,
  baseUrl: string,
  now: Date,
): Promise<void> {
  checkGrants(actor, wanted.roles, await scopesOf(tenant, wanted.roles));
  const home = homeOfZip(wanted.homePostalCode);
  const made = await tenant.row(
    `INSERT INTO people (id, organisation_id, name, email, locale, time_zone, home_postal_code,
       home_latitude, home_longitude, created_at)
     VALUES ($1, $2, $3, $4, $5, $6, $7, $8, $9, $10) ON CONFLICT DO NOTHING RETURNING id`,
    [
      wanted.id,
      tenant.organisationId,
      wanted.name,
      wanted.email,
      wanted.locale,
      wanted.timeZone,
      wanted.homePostalCode,
      home?.latitude ?? null,
      home?.longitude ?? null,
      now,
    ],
  );
  if (!made) {
    const before = await tenant.row('SELECT id FROM people WHERE id = $1 AND email = $2', [
      wanted.id,
      wanted.email,
    ]);
    if (before) return;
    throw invalid([
      { field: 'email', reason: 'taken', message: 'Somebody has this address already.' },
    ]);
  }
  await replaceGrants(tenant, wanted.id, [], wanted.roles);
  await writeInvitation(tenant, actor, wanted, baseUrl, now);
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'person',
    subjectId: wanted.id,
    action: 'invited',
    detail: { email: wanted.email, roles: wanted.roles },
  });
}

/**
 * Writes another invitation to somebody who has chosen no password yet.
 * @throws Problem 403, 404, 409 when they have joined, are deactivated or have no address
 */
export async function inviteAgain(
  tenant: Tenant,
  actor: Actor,
  id: string,
  baseUrl: string,
  now: Date,
): Promise<void> {
  const person = await editablePerson(tenant, actor, id);
  const { email } = person;
  if (person.joined || person.disabledAt || email === null) {
    throw new Problem(409, 'not-waiting', 'No invitation is waiting for this person.');
  }
  await writeInvitation(tenant, actor, { ...person, email }, baseUrl, now);
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'person',
    subjectId: id,
    action: 'invited-again',
  });
}
