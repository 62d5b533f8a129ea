import { expect, test } from 'vitest';
import { TEST_PASSWORD } from '../setup/factories';
import { createTestServer } from '../setup/server';

const server = await createTestServer();
const { nobody } = server;
const newPassword = 'another good password';

async function mailsTo(email: string): Promise<{ text: string; subject: string }[]> {
  await server.services.background.idle();
  return server.db('received_mail').whereRaw('? = ANY(recipients)', [email]).orderBy('id');
}

async function linkFor(email: string): Promise<string> {
  await nobody.post('/password-resets', { email });
  const mail = (await mailsTo(email)).at(-1);
  return /\/reset-password\/([\w-]{43})\b/.exec(mail?.text ?? '')?.[1] ?? '';
}

test('the answer is the same whether or not the account exists; only an account gets mail', async () => {
  const user = await server.createUser();
  const answers = [
    await nobody.post('/password-resets', { email: user.email }),
    await nobody.post('/password-resets', { email: 'unknown@example.test' }),
  ];
  for (const answer of answers) {
    expect(answer.status).toBe(202);
    expect(answer.text).toBe('');
  }
  expect(await mailsTo('unknown@example.test')).toEqual([]);
  const [mail] = await mailsTo(user.email);
  expect(mail?.text).toContain(`${server.services.config.publicUrl}/reset-password/`);
});

test('the link sets a new password once and ends all sessions', async () => {
  const client = await server.signInOutsider();
  const email = client.user?.email ?? '';
  const token = await linkFor(email);
  expect((await nobody.put(`/password-resets/${token}`, { newPassword: 'short' })).status).toBe(422);
  expect((await nobody.put(`/password-resets/${token}`, { newPassword })).status).toBe(204);
  expect((await client.get('/me')).status).toBe(401);
  expect((await nobody.post('/session', { email, password: TEST_PASSWORD })).status).toBe(401);
  expect((await nobody.post('/session', { email, password: newPassword })).status).toBe(200);
  const again = await nobody.put(`/password-resets/${token}`, { newPassword });
  expect(again.status).toBe(404);
  expect(again.body).toMatchObject({ detail: expect.stringContaining('used already') as string });
});

test('the link is stored as a hash only', async () => {
  const user = await server.createUser();
  const token = await linkFor(user.email);
  const stored = await server.db('password_reset').where({ user_id: user.id });
  expect(JSON.stringify(stored)).not.toContain(token);
});

test('using one link spends the older ones', async () => {
  const user = await server.createUser();
  const [older, newer] = [await linkFor(user.email), await linkFor(user.email)];
  expect((await nobody.put(`/password-resets/${newer}`, { newPassword })).status).toBe(204);
  expect((await nobody.put(`/password-resets/${older}`, { newPassword })).status).toBe(404);
});

test('two at once with one link: one wins', async () => {
  const user = await server.createUser();
  const token = await linkFor(user.email);
  const answers = await Promise.all(
    [1, 2].map((i) => nobody.put(`/password-resets/${token}`, { newPassword: `${newPassword} ${i}` })),
  );
  expect(answers.map((answer) => answer.status).toSorted((a, b) => a - b)).toEqual([204, 404]);
});

test('a link expires', async () => {
  const user = await server.createUser();
  const token = await linkFor(user.email);
  await server
    .db('password_reset')
    .where({ user_id: user.id })
    .update({ expires_at: server.db.raw("now() - interval '1 second'") });
  expect((await nobody.put(`/password-resets/${token}`, { newPassword })).status).toBe(404);
});

test('a switched-off account gets no mail and its link does nothing', async () => {
  const user = await server.createUser();
  const token = await linkFor(user.email);
  await server.db('app_user').where({ id: user.id }).update({ disabled_at: new Date() });
  expect((await nobody.put(`/password-resets/${token}`, { newPassword })).status).toBe(404);
  await nobody.post('/password-resets', { email: user.email });
  expect(await mailsTo(user.email)).toHaveLength(1);
});

test('an account gets no more than five mails an hour, and the answer does not tell', async () => {
  const user = await server.createUser();
  for (let i = 0; i < 7; i += 1)
    expect((await nobody.post('/password-resets', { email: user.email })).status).toBe(202);
  expect(await mailsTo(user.email)).toHaveLength(5);
});

test('one address asks twenty times an hour', async () => {
  await server.db('sign_in_attempt').delete();
  for (let i = 0; i < 20; i += 1)
    expect((await nobody.post('/password-resets', { email: `p${i}@example.test` })).status).toBe(202);
  expect((await nobody.post('/password-resets', { email: 'p20@example.test' })).status).toBe(429);
});
