import type { AddressInfo } from 'node:net';
import { type ParsedMail, simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';

/** What the sink answers to each recipient: takes it, or refuses with a code of SMTP. */
export type Answer = 'take' | 450 | 550 | 'hang up after text';

export interface SmtpSink {
  readonly url: string;
  readonly mails: ParsedMail[];
  answer: Answer;
  /** Called when a letter was taken and before the sender is told so. */
  onTaken: () => void | Promise<void>;
  close(): Promise<void>;
}

/** A real SMTP listener on loopback that keeps what it takes. */
export async function smtpSink(port = 0): Promise<SmtpSink> {
  const refusal = (code: number) => Object.assign(new Error('No'), { responseCode: code });
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    logger: false,
    onRcptTo: (_address, _session, done) =>
      done(typeof sink.answer === 'number' ? refusal(sink.answer) : null),
    onData: (stream, _session, done) => {
      void (async () => {
        const mail = await simpleParser(stream);
        sink.mails.push(mail);
        await sink.onTaken();
        if (sink.answer === 'hang up after text') {
          // The server has the letter; the sender never hears of it.
          for (const connection of server.connections) {
            (connection as unknown as { _socket: { destroy(): void } })._socket.destroy();
          }
          return;
        }
        done();
      })();
    },
  });
  server.on('error', () => undefined);
  await new Promise<void>((done) => server.listen(port, '127.0.0.1', done));
  const sink: SmtpSink = {
    url: `smtp://127.0.0.1:${(server.server.address() as AddressInfo).port}`,
    mails: [],
    answer: 'take',
    onTaken: () => undefined,
    close: () => new Promise((done) => server.close(() => done())),
  };
  return sink;
}
