import { createTransport } from 'nodemailer';

export interface MailMessage {
  readonly to: string;
  readonly subject: string;
  readonly text: string;
}

export interface Mailer {
  send(message: MailMessage): Promise<void>;
  close(): void;
}

/** Sends by SMTP; without MAIL_URL the address is the local sink's. */
export function createMailer(url: string, from: string): Mailer {
  const transport = createTransport({ url, connectionTimeout: 10_000, greetingTimeout: 10_000 }, { from });
  return {
    async send({ to, subject, text }) {
      await transport.sendMail({ to, subject, text });
    },
    close: () => transport.close(),
  };
}
