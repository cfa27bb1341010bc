import type { RoleGrant } from '@shared/access/role';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { editablePerson } from './editable-person';
import { keepAdministrator, lockAdministrators } from './keep-administrator';
import { checkGrants, sameGrant, scopesOf } from './people-policy';
import { replaceGrants } from './replace-grants';

/**
 * Says which roles a person holds; what changes counts from their next request on.
 * @throws Problem 403 for roles out of the actor's reach, 404, 409 also when the organisation would be
 *   left without an administrator, 422 for places that do not exist
 */
export async function editRoles(
  tenant: Tenant,
  actor: Actor,
  id: string,
  wanted: { readonly version: number; readonly roles: readonly RoleGrant[] },
): Promise<void> {
  await lockAdministrators(tenant);
  const person = await editablePerson(tenant, actor, id, wanted.version);
  const taken = person.grants.filter((held) => !wanted.roles.some((it) => sameGrant(it, held)));
  const given = wanted.roles.filter((it) => !person.grants.some((held) => sameGrant(it, held)));
  checkGrants(actor, wanted.roles, await scopesOf(tenant, wanted.roles));
  if (
    taken.some(({ role, scopeKind }) => role === 'administrator' && scopeKind === 'organisation')
  ) {
    await keepAdministrator(tenant, id);
  }
  if (taken.length === 0 && given.length === 0) return;
  await replaceGrants(tenant, id, taken, given);
  await tenant.rows('UPDATE people SET version = version + 1 WHERE id = $1', [id]);
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'person',
    subjectId: id,
    action: 'roles-changed',
    detail: { taken, given },
  });
}
