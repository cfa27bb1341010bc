import type { BodyOf } from '@shared/contract/endpoint';
import type { editPerson as contract } from '@shared/people/people-contract';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { changesOf } from '../audit/changes-of';
import { recordEvent } from '../audit/record-event';
import { editablePerson } from './editable-person';
import { homeOfZip } from './home-of-zip';

/**
 * Changes what a person is called, their language, time zone and home place.
 * @throws Problem 403, 404, 409, 422 for an unknown ZIP code
 */
export async function editPerson(
  tenant: Tenant,
  actor: Actor,
  id: string,
  { version, ...wanted }: BodyOf<typeof contract>,
): Promise<void> {
  const before = await editablePerson(tenant, actor, id, version);
  const home = homeOfZip(wanted.homePostalCode);
  await tenant.rows(
    `UPDATE people SET name = $2, locale = $3, time_zone = $4, home_postal_code = $5,
       home_latitude = $6, home_longitude = $7, version = version + 1 WHERE id = $1`,
    [
      id,
      wanted.name,
      wanted.locale,
      wanted.timeZone,
      wanted.homePostalCode,
      home?.latitude ?? null,
      home?.longitude ?? null,
    ],
  );
  const { name, locale, timeZone, homePostalCode } = before;
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'person',
    subjectId: id,
    action: 'details-changed',
    detail: changesOf({ name, locale, timeZone, homePostalCode }, wanted),
  });
}
