import type { Locale } from '@shared/mail/locale';
import type { Tenant } from '@db/tenant-transaction';
import { renderLetter } from './layout/render-letter';
import type { MailMessage } from './mail-message';

export interface Addressee {
  readonly personId: string;
  readonly address: string;
  readonly locale: Locale;
}

/**
 * Puts a letter into the outbox, in the transaction of the business that it tells about: both are
 * kept or neither is. A letter with the same dedupe key is queued once, however often and from
 * however many workers it is asked for; a second asker waits for the first one's transaction.
 *
 * @param letter.dedupeKey what the letter is about and to whom, with ids in it so that no other
 *   organisation can have the same
 * @param letter.at when it is written, for the record; the present where it does not matter
 * @returns the letter's id, or null when it had been queued before
 */
export async function queueLetter<Content>(
  tenant: Tenant,
  letter: {
    readonly message: MailMessage<Content>;
    readonly content: Content;
    readonly to: Addressee;
    readonly dedupeKey: string;
    readonly at?: Date;
  },
): Promise<string | null> {
  const { message, content, to, dedupeKey, at = new Date() } = letter;
  const { subject, html, plain } = await renderLetter(message.write(content, to.locale), to.locale);
  const queued = await tenant.row<{ id: string }>(
    `INSERT INTO letters (organisation_id, person_id, kind, dedupe_key, to_address, locale, subject,
       html, plain, created_at)
     VALUES ($1, $2, $3, $4, $5, $6, $7, $8, $9, $10)
     ON CONFLICT (dedupe_key) DO NOTHING RETURNING id`,
    [
      tenant.organisationId,
      to.personId,
      message.kind,
      dedupeKey,
      to.address,
      to.locale,
      subject,
      html,
      plain,
      at,
    ],
  );
  return queued?.id ?? null;
}
