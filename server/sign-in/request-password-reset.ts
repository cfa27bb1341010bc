import type { Sequelize } from 'sequelize';
import { inTenant } from '@db/tenant-transaction';
import { recordEvent } from '../audit/record-event';
import { passwordResetMessage } from '../mail/messages/password-reset-message';
import { queueLetter } from '../mail/queue-letter';
import { findSignIn } from './find-sign-in';
import { makeOneTimeLink } from './one-time-link';
import { untilInWords } from './until-in-words';

/**
 * Queues a letter with a link to a new password, if the address belongs to somebody who has one.
 * Whoever was invited and has none yet takes the invitation instead.
 *
 * @param baseUrl where people reach the product
 */
export async function requestPasswordReset(
  sequelize: Sequelize,
  email: string,
  baseUrl: string,
  now: Date,
): Promise<void> {
  const found = await findSignIn(sequelize, email);
  if (!found?.passwordHash) return;
  const { personId } = found;
  await inTenant(sequelize, found.organisationId, async (tenant) => {
    const person = await tenant.row<{ name: string; locale: 'en' | 'es'; timeZone: string }>(
      'SELECT name, locale, time_zone AS "timeZone" FROM people WHERE id = $1',
      [personId],
    );
    if (!person) return;
    const { name, locale, timeZone } = person;
    const { token, hash, expiresAt } = await makeOneTimeLink(tenant, {
      personId,
      purpose: 'password-reset',
      madeBy: null,
      now,
    });
    await queueLetter(tenant, {
      message: passwordResetMessage,
      content: {
        name,
        link: `${baseUrl}/reset-password/${token}`,
        until: untilInWords(expiresAt, locale, timeZone),
      },
      to: { personId, address: email, locale },
      dedupeKey: `password-reset ${hash}`,
      at: now,
    });
    await recordEvent(tenant, {
      actorId: null,
      subjectKind: 'person',
      subjectId: personId,
      action: 'password-reset-requested',
    });
  });
}
