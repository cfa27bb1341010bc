import { connect } from '@db/connect';
import { sendLetters } from '@jobs/mail/send-letters';

/** A worker process of its own that empties the outbox once, for specs that kill it. */
async function main(): Promise<void> {
  const sequelize = connect(process.env['DATABASE_URL'] as string, { poolSize: 2 });
  await sendLetters({
    sequelize,
    config: {
      SMTP_URL: process.env['SMTP_URL'] as string,
      MAIL_FROM: 'Vatwright <no-reply@vatwright.example>',
      BASE_URL: 'https://vatwright.example',
    },
    log: { info: () => undefined, warn: () => undefined },
  });
  await sequelize.close();
}

void main();
