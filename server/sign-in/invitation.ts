import type { Sequelize } from 'sequelize';
import type { ReplyOf } from '@shared/contract/endpoint';
import type { readInvitation as contract } from '@shared/sign-in/account-contract';
import { inTenant } from '@db/tenant-transaction';
import { recordEvent } from '../audit/record-event';
import { findOneTimeLink, linkSpent, useOneTimeLink } from './one-time-link';
import { setPassword } from './set-password';

/** Who is invited, for the page behind the link. @throws Problem 410 when it cannot be used */
export async function readInvitation(
  sequelize: Sequelize,
  token: string,
  now: Date,
): Promise<ReplyOf<typeof contract>> {
  const { personId, organisationId } = await findOneTimeLink(sequelize, token, 'invitation', now);
  return inTenant(sequelize, organisationId, async (tenant) => {
    const invited = await tenant.row<ReplyOf<typeof contract>>(
      `SELECT p.email, p.name, o.name AS "organisationName", coalesce(
         (SELECT m.name FROM one_time_links l JOIN people m ON m.id = l.made_by
          WHERE l.person_id = p.id AND l.purpose = 'invitation' AND l.used_at IS NULL
          ORDER BY l.made_at DESC LIMIT 1), '') AS "invitedBy"
       FROM people p JOIN organisations o ON o.id = p.organisation_id
       WHERE p.id = $1 AND p.email IS NOT NULL AND p.disabled_at IS NULL`,
      [personId],
    );
    if (!invited) throw linkSpent();
    return invited;
  });
}

/**
 * Accepts an invitation: the person has a password from now on, and the name they gave.
 * @throws Problem 410 when the link cannot be used, 422 with what is wrong with the password
 */
export async function acceptInvitation(
  sequelize: Sequelize,
  token: string,
  { password, name }: { readonly password: string; readonly name?: string | undefined },
  now: Date,
): Promise<void> {
  const { personId, organisationId } = await findOneTimeLink(sequelize, token, 'invitation', now);
  await inTenant(sequelize, organisationId, async (tenant) => {
    await useOneTimeLink(tenant, token, 'invitation', now);
    const person = await tenant.row(
      `UPDATE people SET name = coalesce($2, name), version = version + 1
       WHERE id = $1 AND disabled_at IS NULL RETURNING id`,
      [personId, name ?? null],
    );
    if (!person) throw linkSpent();
    await setPassword(tenant, personId, password);
    await recordEvent(tenant, {
      actorId: personId,
      subjectKind: 'person',
      subjectId: personId,
      action: 'invitation-accepted',
    });
  });
}
