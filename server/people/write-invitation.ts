import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { invitationMessage } from '../mail/messages/invitation-message';
import { queueLetter } from '../mail/queue-letter';
import { makeOneTimeLink } from '../sign-in/one-time-link';
import { untilInWords } from '../sign-in/until-in-words';

/**
 * Queues a letter with a link by which the person chooses a password; an earlier link works no more.
 * @param baseUrl where people reach the product
 */
export async function writeInvitation(
  tenant: Tenant,
  actor: Actor,
  person: {
    readonly id: string;
    readonly name: string;
    readonly email: string;
    readonly locale: 'en' | 'es';
    readonly timeZone: string;
  },
  baseUrl: string,
  now: Date,
): Promise<void> {
  const organisation = await tenant.row<{ name: string }>(
    'SELECT name FROM organisations WHERE id = $1',
    [tenant.organisationId],
  );
  const { token, hash, expiresAt } = await makeOneTimeLink(tenant, {
    personId: person.id,
    purpose: 'invitation',
    madeBy: actor.personId,
    now,
  });
  await queueLetter(tenant, {
    message: invitationMessage,
    content: {
      name: person.name,
      invitedBy: actor.name,
      organisation: organisation?.name ?? '',
      link: `${baseUrl}/invitation/${token}`,
      until: untilInWords(expiresAt, person.locale, person.timeZone),
    },
    to: { personId: person.id, address: person.email, locale: person.locale },
    dedupeKey: `invitation ${hash}`,
    at: now,
  });
}
