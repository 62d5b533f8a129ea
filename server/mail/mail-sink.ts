import type { AddressInfo } from 'node:net';
import type { Knex } from 'knex';
import { simpleParser } from 'mailparser';
import type { Logger } from 'pino';
import { SMTPServer } from 'smtp-server';

export interface MailSink {
  readonly url: string;
  close(): Promise<void>;
}

/** A real SMTP server on loopback that keeps what it takes in the database, for installations without a mail server. */
export async function startMailSink(db: Knex, log: Logger): Promise<MailSink> {
  const server = new SMTPServer({
    disabledCommands: ['AUTH', 'STARTTLS'],
    size: 1_048_576,
    onData(stream, session, done) {
      const recipients = session.envelope.rcptTo.map((address) => address.address);
      simpleParser(stream)
        .then((mail) =>
          db('received_mail').insert({
            sender: mail.from?.text ?? '',
            recipients,
            subject: mail.subject ?? '',
            text: mail.text ?? '',
          }),
        )
        .then(
          () => done(),
          (error: unknown) => done(error instanceof Error ? error : new Error(String(error))),
        );
    },
  });
  server.on('error', (error) => log.warn({ err: error }, 'mail sink'));
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const { port } = server.server.address() as AddressInfo;
  return {
    url: `smtp://127.0.0.1:${port}`,
    close: () => new Promise((resolve) => server.close(() => resolve())),
  };
}
