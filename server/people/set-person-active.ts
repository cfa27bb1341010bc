import { Problem } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { endSessionsOf } from '../sign-in/end-sessions';
import { dropOneTimeLinks } from '../sign-in/one-time-link';
import { editablePerson } from './editable-person';
import { keepAdministrator, lockAdministrators } from './keep-administrator';

/**
 * Lets a person in no more: sessions and waiting links end in the same transaction. What they did
 * stays, under their name.
 * @throws Problem 403, 404, 409 also for oneself and for the last administrator
 */
export async function deactivatePerson(
  tenant: Tenant,
  actor: Actor,
  id: string,
  version: number,
  now: Date,
): Promise<void> {
  await lockAdministrators(tenant);
  const person = await editablePerson(tenant, actor, id, version);
  if (person.disabledAt) return;
  if (id === actor.personId) {
    throw new Problem(409, 'own-account', 'This is your own account.', {
      detail: 'Ask another administrator to deactivate it.',
    });
  }
  await keepAdministrator(tenant, id);
  await tenant.rows('UPDATE people SET disabled_at = $2, version = version + 1 WHERE id = $1', [
    id,
    now,
  ]);
  await endSessionsOf(tenant, id);
  await dropOneTimeLinks(tenant, id, 'invitation');
  await dropOneTimeLinks(tenant, id, 'password-reset');
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'person',
    subjectId: id,
    action: 'deactivated',
  });
}

/**
 * Lets a person in again, with the password and the roles they had. Whoever had chosen no password
 * yet needs a new invitation.
 * @throws Problem 403, 404, 409
 */
export async function activatePerson(
  tenant: Tenant,
  actor: Actor,
  id: string,
  version: number,
): Promise<void> {
  const person = await editablePerson(tenant, actor, id, version);
  if (!person.disabledAt) return;
  await tenant.rows('UPDATE people SET disabled_at = NULL, version = version + 1 WHERE id = $1', [
    id,
  ]);
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'person',
    subjectId: id,
    action: 'activated',
  });
}
