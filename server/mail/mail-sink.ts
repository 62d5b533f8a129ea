import type { AddressInfo } from 'node:net';
import type { Knex } from 'knex';
import type { Logger } from 'pino';
import { SMTPServer, type SMTPServerDataStream } from 'smtp-server';

export interface MailSink {
  readonly url: string;
  close(): Promise<void>;
}

const SIZE_LIMIT = 1_048_576;

/** A real SMTP server on loopback that keeps what it takes in the database, for installations without a mail server. */
export async function startMailSink(db: Knex, log: Logger): Promise<MailSink> {
  const server = new SMTPServer({
    disabledCommands: ['AUTH', 'STARTTLS'],
    size: SIZE_LIMIT,
    onData(stream, session, done) {
      const recipients = session.envelope.rcptTo.map((address) => address.address);
      keep(db, stream, recipients).then(
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

async function keep(db: Knex, stream: SMTPServerDataStream, recipients: string[]): Promise<void> {
  // large, and needed by the first mail only
  const { simpleParser } = await import('mailparser');
  const mail = await simpleParser(stream);
  if (stream.sizeExceeded)
    throw Object.assign(new Error(`the message is larger than the size of ${SIZE_LIMIT} bytes`), {
      responseCode: 552,
    });
  await db('received_mail').insert({
    sender: mail.from?.text ?? '',
    recipients,
    subject: mail.subject ?? '',
    text: mail.text ?? '',
  });
}
