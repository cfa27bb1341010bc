import { once } from 'node:events';
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { inboxServer } from './inbox-server';
import { MailStore } from './mail-store';
import { s3Fake } from './s3-fake';
import { smtpInbox } from './smtp-inbox';

// What a development machine has instead of a mail server and an object store. Each is started
// only when its port is given.
const loopback = '127.0.0.1';
const port = (name: string) => Number(process.env[name] ?? 0);
const folder = process.env['LOCAL_DATA'] ?? join(process.cwd(), '.local');

type Stop = () => Promise<unknown>;

async function startMail(smtpPort: number, inboxPort: number): Promise<Stop> {
  const store = new MailStore(join(folder, 'mail'));
  const smtp = smtpInbox(store);
  const listening = once(smtp.server, 'listening');
  smtp.listen(smtpPort, loopback);
  const inbox = inboxServer(store).listen(inboxPort, loopback);
  await Promise.all([listening, once(inbox, 'listening')]);
  return async () => {
    inbox.close();
    inbox.closeAllConnections();
    await new Promise<void>((done) => smtp.close(done));
  };
}

async function startFiles(s3Port: number): Promise<Stop> {
  const directory = join(folder, 's3');
  mkdirSync(directory, { recursive: true });
  const files = s3Fake(s3Port, directory);
  await files.run();
  return () => files.close();
}

async function main(): Promise<void> {
  const stops: Stop[] = [];
  const stop = async () => {
    // Clients keep connections open; the process need not wait for them.
    setTimeout(() => process.exit(0), 1000).unref();
    await Promise.all(stops.splice(0).map((it) => it()));
    process.exit(0);
  };
  process.on('SIGTERM', () => void stop());
  process.on('SIGINT', () => void stop());
  if (port('LOCAL_SMTP_PORT')) {
    stops.push(await startMail(port('LOCAL_SMTP_PORT'), port('LOCAL_INBOX_PORT')));
  }
  if (port('LOCAL_S3_PORT')) stops.push(await startFiles(port('LOCAL_S3_PORT')));
  process.send?.('ready');
}

main().catch((error: unknown) => {
  process.stderr.write(
    `${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`,
  );
  process.exit(1);
});
