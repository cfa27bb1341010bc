import { QueryTypes, type Sequelize } from 'sequelize';
import type { Logger } from 'pino';
import type { Config } from '@server/config';
import { type DeliveryOutcome, outcomeOf } from './delivery-outcome';
import {
  LETTER_TIMEOUT_MS,
  type LetterTransport,
  type OutboxLetter,
  smtpTransport,
} from './letter-transport';
import { giveBack, recordOutcome } from './record-outcome';

export interface SenderServices {
  readonly sequelize: Sequelize;
  readonly config: Pick<Config, 'SMTP_URL' | 'MAIL_FROM' | 'BASE_URL'>;
  readonly log: Pick<Logger, 'info' | 'warn'>;
}

export interface SenderOptions {
  /** Opens the way out; the SMTP server of the settings unless told otherwise. */
  readonly open?: () => LetterTransport;
  /** Stops between two letters; what is claimed and not tried goes back to the queue. */
  readonly signal?: AbortSignal;
  /** The longest that one letter may take, in milliseconds. */
  readonly timeoutMs?: number;
}

const BATCH = 10;

export interface SendCounts {
  sent: number;
  refused: number;
  later: number;
}

/**
 * Sends what waits in the outbox, until nothing does or the server is in trouble.
 *
 * Any number of workers may do so at once: a claimed letter is leased, for longer than a whole batch
 * can take, so that nobody else touches it while it may be on its way. A worker that dies after the
 * server took a letter and before that was recorded leaves a letter whose lease runs out, and it is
 * sent once more: at least once, never lost, at most one copy too many per death, and the copy bears
 * the same Message-ID. SMTP allows no better (there is no way to ask whether a letter arrived).
 */
export async function sendLetters(
  { sequelize, config, log }: SenderServices,
  { open = () => smtpTransport(config), signal, timeoutMs = LETTER_TIMEOUT_MS }: SenderOptions = {},
): Promise<SendCounts> {
  const counts: SendCounts = { sent: 0, refused: 0, later: 0 };
  const leaseMs = (BATCH + 2) * timeoutMs;
  const transport = open();
  try {
    while (!signal?.aborted) {
      const claimedAt = performance.now();
      const letters = await claim(sequelize, leaseMs);
      if (letters.length === 0) break;
      let untried = 0;
      for (const [index, letter] of letters.entries()) {
        // A worker that was frozen between two letters wakes up with its lease gone.
        const late = performance.now() - claimedAt > leaseMs - 2 * timeoutMs;
        if (late || signal?.aborted) {
          untried = letters.length - index;
          break;
        }
        const outcome = await attempt(transport, letter, timeoutMs);
        counts[outcome.kind] += 1;
        await recordOutcome(sequelize, letter, outcome);
        if (outcome.kind !== 'sent') {
          log.warn({ letter: letter.id, outcome: outcome.kind, error: outcome.error }, 'not sent');
        }
        if (outcome.kind === 'later' && outcome.fault === 'server') {
          untried = letters.length - index - 1;
          break;
        }
      }
      if (untried > 0) {
        await giveBack(sequelize, letters.slice(-untried));
        break;
      }
      if (counts.later > 0 && letters.length < BATCH) break;
    }
  } finally {
    transport.close();
  }
  if (counts.sent > 0) log.info({ ...counts }, 'letters sent');
  return counts;
}

function claim(sequelize: Sequelize, leaseMs: number): Promise<OutboxLetter[]> {
  return sequelize.query<OutboxLetter>(
    `SELECT id, organisation_id, kind, to_address, locale, subject, html, plain, attempts, created_at
     FROM claim_letters($1, make_interval(secs => $2))`,
    { bind: [BATCH, leaseMs / 1000], type: QueryTypes.SELECT },
  );
}

async function attempt(
  transport: LetterTransport,
  letter: OutboxLetter,
  timeoutMs: number,
): Promise<DeliveryOutcome> {
  let timer: NodeJS.Timeout | undefined;
  try {
    const tooLong = new Promise<never>((_, reject) => {
      timer = setTimeout(() => reject(new Error(`No answer in ${timeoutMs} ms`)), timeoutMs);
    });
    await Promise.race([transport.send(letter), tooLong]);
    return { kind: 'sent' };
  } catch (error) {
    return outcomeOf(error);
  } finally {
    clearTimeout(timer);
  }
}
