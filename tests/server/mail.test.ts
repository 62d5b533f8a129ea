import { createTransport } from 'nodemailer';
import { expect, test } from 'vitest';
import { createMailer } from '../../server/mail/mailer';
import { startMailSink } from '../../server/mail/mail-sink';
import { createTestServer } from '../setup/server';
import { pino } from 'pino';

const server = await createTestServer();
const unreachable = await createTestServer({ MAIL_URL: 'smtp://127.0.0.1:1' });

test('the sink keeps what it is sent: sender, recipients, subject and text in any script', async () => {
  const sink = await startMailSink(server.db, pino({ level: 'silent' }));
  const mailer = createMailer(sink.url, 'Sender <sender@example.test>');
  await mailer.send({ to: 'one@example.test', subject: 'Zählung Ω', text: 'Tiefe 3 m ≈ 10 ft' });
  mailer.close();
  await sink.close();
  expect(await server.db('received_mail').first('sender', 'recipients', 'subject', 'text')).toEqual({
    sender: '"Sender" <sender@example.test>',
    recipients: ['one@example.test'],
    subject: 'Zählung Ω',
    text: 'Tiefe 3 m ≈ 10 ft\n',
  });
});

test('the sink listens on loopback and takes no mail past its size', async () => {
  const sink = await startMailSink(server.db, pino({ level: 'silent' }));
  expect(sink.url).toMatch(/^smtp:\/\/127\.0\.0\.1:\d+$/);
  const transport = createTransport(sink.url);
  const text = 'x'.repeat(2_000_000);
  await expect(transport.sendMail({ from: 'a@example.test', to: 'b@example.test', text })).rejects.toThrow(
    /size/i,
  );
  transport.close();
  await sink.close();
});

test('a mail server that cannot be reached changes no answer', async () => {
  const survey = await unreachable.createSurvey();
  const lead = await unreachable.signInAs('lead', survey.id);
  const invited = await lead.post(`/surveys/${survey.id}/invitations`, {
    email: 'someone@example.test',
    role: 'guest',
  });
  expect(invited.status).toBe(201);
  const asked = await lead.post('/password-resets', { email: lead.user?.email });
  expect(asked.status).toBe(202);
  await unreachable.services.background.idle();
});
