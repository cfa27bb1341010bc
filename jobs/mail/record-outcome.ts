import type { Sequelize } from 'sequelize';
import { carriesSecret } from '@shared/mail/letter-kind';
import { withoutSecrets } from '@shared/mail/without-secrets';
import { inTenant } from '@db/tenant-transaction';
import { backOffSeconds, type DeliveryOutcome } from './delivery-outcome';
import type { OutboxLetter } from './letter-transport';

/**
 * Writes down what came of an attempt. The number of the attempt guards the row: a worker whose
 * lease ran out cannot overwrite what its successor wrote.
 */
export async function recordOutcome(
  sequelize: Sequelize,
  letter: OutboxLetter,
  outcome: DeliveryOutcome,
): Promise<void> {
  await inTenant(sequelize, letter.organisation_id, async ({ rows }) => {
    const { id, attempts } = letter;
    switch (outcome.kind) {
      case 'sent':
        // What has arrived need not keep its sign-in links lying here.
        await rows(
          `UPDATE letters SET state = 'sent', sent_at = now(), leased_until = NULL,
             last_error = NULL, html = $3, plain = $4
           WHERE id = $1 AND attempts = $2 AND state = 'queued'`,
          [id, attempts, kept(letter, letter.html), kept(letter, letter.plain)],
        );
        return;
      case 'refused':
        await rows(
          `UPDATE letters SET state = 'dead', leased_until = NULL, last_error = $3
           WHERE id = $1 AND attempts = $2 AND state = 'queued'`,
          [id, attempts, outcome.error],
        );
        return;
      case 'later':
        await rows(
          `UPDATE letters SET leased_until = NULL, last_error = $3,
             next_attempt_at = now() + make_interval(secs => $4)
           WHERE id = $1 AND attempts = $2 AND state = 'queued'`,
          [id, attempts, outcome.error, backOffSeconds(attempts)],
        );
    }
  });
}

const kept = ({ kind }: OutboxLetter, part: string) =>
  carriesSecret(kind) ? withoutSecrets(part) : part;

/** Returns letters that were claimed and not tried, as if they had not been touched. */
export async function giveBack(
  sequelize: Sequelize,
  letters: readonly OutboxLetter[],
): Promise<void> {
  for (const { id, organisation_id, attempts } of letters) {
    await inTenant(sequelize, organisation_id, ({ rows }) =>
      rows(
        `UPDATE letters SET attempts = attempts - 1, leased_until = NULL
         WHERE id = $1 AND attempts = $2 AND state = 'queued'`,
        [id, attempts],
      ),
    );
  }
}
