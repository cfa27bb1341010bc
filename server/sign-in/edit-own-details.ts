import type { BodyOf } from '@shared/contract/endpoint';
import type { editOwnDetails as contract } from '@shared/sign-in/account-contract';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';

/** Changes what a person may say about themselves; gives back the actor as they are now. */
export async function editOwnDetails(
  tenant: Tenant,
  actor: Actor,
  details: BodyOf<typeof contract>,
): Promise<Actor> {
  const changed = {
    name: details.name ?? actor.name,
    locale: details.locale ?? actor.locale,
    timeZone: details.timeZone ?? actor.timeZone,
  };
  await tenant.rows(
    'UPDATE people SET name = $2, locale = $3, time_zone = $4, version = version + 1 WHERE id = $1',
    [actor.personId, changed.name, changed.locale, changed.timeZone],
  );
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'person',
    subjectId: actor.personId,
    action: 'details-changed',
    detail: details,
  });
  return { ...actor, ...changed };
}
