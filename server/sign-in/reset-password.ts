import type { Sequelize } from 'sequelize';
import { inTenant } from '@db/tenant-transaction';
import { recordEvent } from '../audit/record-event';
import { endSessionsOf } from './end-sessions';
import { findOneTimeLink, linkSpent, useOneTimeLink } from './one-time-link';
import { setPassword } from './set-password';

/**
 * Sets a new password by a letter's link; whoever was signed in with the old one is so no more.
 * @throws Problem 410 when the link cannot be used, 422 with what is wrong with the password: then
 *   the link still works
 */
export async function resetPassword(
  sequelize: Sequelize,
  token: string,
  password: string,
  now: Date,
): Promise<void> {
  const { personId, organisationId } = await findOneTimeLink(
    sequelize,
    token,
    'password-reset',
    now,
  );
  await inTenant(sequelize, organisationId, async (tenant) => {
    await useOneTimeLink(tenant, token, 'password-reset', now);
    const live = await tenant.row('SELECT id FROM people WHERE id = $1 AND disabled_at IS NULL', [
      personId,
    ]);
    if (!live) throw linkSpent();
    await setPassword(tenant, personId, password);
    await endSessionsOf(tenant, personId);
    await recordEvent(tenant, {
      actorId: personId,
      subjectKind: 'person',
      subjectId: personId,
      action: 'password-reset',
    });
  });
}
