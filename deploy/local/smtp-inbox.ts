import { SMTPServer, type SMTPServerDataStream, type SMTPServerSession } from 'smtp-server';
import type { MailStore } from './mail-store';

const largestMessage = 25 * 1024 * 1024;

/** An SMTP server on loopback that delivers nothing: it keeps what it is given. */
export function smtpInbox(store: MailStore): SMTPServer {
  const server: SMTPServer = new SMTPServer({
    authOptional: true,
    // Its certificate would be self-signed, and clients that try STARTTLS would refuse it.
    disabledCommands: ['STARTTLS'],
    size: largestMessage,
    logger: false,
    onAuth: (_auth, _session, done) => done(null, { user: 'anyone' }),
    onData: (stream, session, done) => {
      takeIn(store, stream, session).then(
        () => done(),
        (error: unknown) => done(error instanceof Error ? error : new Error(String(error))),
      );
    },
  });
  // A client that hangs up in the middle is no reason to stop.
  server.on('error', () => undefined);
  return server;
}

async function takeIn(
  store: MailStore,
  stream: SMTPServerDataStream,
  { envelope }: SMTPServerSession,
): Promise<void> {
  const parts: Buffer[] = [];
  for await (const part of stream) parts.push(part as Buffer);
  if (stream.sizeExceeded) {
    throw Object.assign(new Error('The message is too large'), { responseCode: 552 });
  }
  await store.add(Buffer.concat(parts), {
    from: envelope.mailFrom ? envelope.mailFrom.address : '',
    to: envelope.rcptTo.map(({ address }) => address),
  });
}
