import { invalid } from '@shared/problem';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { recordEvent } from '../audit/record-event';
import { endSessionsOf } from './end-sessions';
import { dropOneTimeLinks } from './one-time-link';
import { passwordFits } from './password';
import { setPassword } from './set-password';

/**
 * Changes one's own password; sessions other than the one that asks end.
 * @throws Problem 422 when the present password is wrong or the new one cannot be used
 */
export async function changePassword(
  tenant: Tenant,
  actor: Actor,
  change: { readonly currentPassword: string; readonly newPassword: string },
  keptSession: string,
): Promise<void> {
  const own = await tenant.row<{ hash: string | null }>(
    'SELECT password_hash AS hash FROM people WHERE id = $1 FOR UPDATE',
    [actor.personId],
  );
  if (!(await passwordFits(own?.hash ?? null, change.currentPassword))) {
    throw invalid([
      {
        field: 'currentPassword',
        reason: 'password-wrong',
        message: 'This is not your current password.',
      },
    ]);
  }
  await setPassword(tenant, actor.personId, change.newPassword, 'newPassword');
  await dropOneTimeLinks(tenant, actor.personId, 'password-reset');
  await endSessionsOf(tenant, actor.personId, keptSession);
  await recordEvent(tenant, {
    actorId: actor.personId,
    subjectKind: 'person',
    subjectId: actor.personId,
    action: 'password-changed',
  });
}
