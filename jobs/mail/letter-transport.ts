import { createTransport } from 'nodemailer';
import type { Config } from '@server/config';
import type { Locale } from '@shared/mail/locale';

/** A letter as it lies in the outbox. */
export interface OutboxLetter {
  readonly id: string;
  readonly organisation_id: string;
  readonly kind: string;
  readonly to_address: string;
  readonly locale: Locale;
  readonly subject: string;
  readonly html: string;
  readonly plain: string;
  readonly attempts: number;
  readonly created_at: Date;
}

export interface LetterTransport {
  /** @throws the SMTP failure as nodemailer tells it */
  send(letter: OutboxLetter): Promise<void>;
  close(): void;
}

/** No step of the SMTP conversation may keep a letter longer than this, nor all of them together. */
export const LETTER_TIMEOUT_MS = 30_000;

/**
 * Hands letters to the SMTP server of the settings over one connection. A letter that is sent twice
 * after a crash is the same to the byte that matters: its Message-ID and Date come from its row, so
 * that servers and readers can tell the second copy.
 */
export function smtpTransport(config: Pick<Config, 'SMTP_URL' | 'MAIL_FROM' | 'BASE_URL'>) {
  const url = new URL(config.SMTP_URL);
  const transport = createTransport({
    host: url.hostname,
    port: url.port === '' ? undefined : Number(url.port),
    secure: url.protocol === 'smtps:',
    // STARTTLS is used where it is offered; `?requireTLS=true` refuses to go on without it.
    requireTLS: url.searchParams.get('requireTLS') === 'true',
    auth: url.username
      ? { user: decodeURIComponent(url.username), pass: decodeURIComponent(url.password) }
      : undefined,
    pool: true,
    maxConnections: 1,
    connectionTimeout: 10_000,
    greetingTimeout: 10_000,
    socketTimeout: 20_000,
    disableFileAccess: true,
    disableUrlAccess: true,
  });
  const domain = new URL(config.BASE_URL).hostname;
  return {
    async send(letter: OutboxLetter): Promise<void> {
      await transport.sendMail({
        from: config.MAIL_FROM,
        // As an object, so that no character in it can add a second recipient.
        to: { name: '', address: letter.to_address },
        subject: letter.subject,
        html: letter.html,
        text: letter.plain,
        messageId: `<${letter.id}@${domain}>`,
        date: letter.created_at,
        headers: { 'Auto-Submitted': 'auto-generated', 'Content-Language': letter.locale },
      });
    },
    close: () => transport.close(),
  } satisfies LetterTransport;
}
