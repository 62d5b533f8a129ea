import { describe, expect, test } from 'vitest';
import { invitationOfferSchema, meSchema } from '../../server/contract/session';
import { TEST_PASSWORD } from '../setup/factories';
import { createTestServer } from '../setup/server';

const server = await createTestServer();
const { nobody } = server;

const survey = await server.createSurvey('Upper valley');
const lead = await server.signInAs('lead', survey.id);

async function invite(email: string, role = 'geophysicist'): Promise<string> {
  const answer = await lead.post(`/surveys/${survey.id}/invitations`, { email, role });
  expect(answer.status).toBe(201);
  await server.services.background.idle();
  const mail = await server
    .db('received_mail')
    .whereRaw('? = ANY(recipients)', [email.toLowerCase()])
    .orderBy('id', 'desc')
    .first<{ text: string }>('text');
  return /\/invitations\/([\w-]{43})\b/.exec(mail.text)?.[1] ?? '';
}

const accept = (token: string, body: object) => nobody.post(`/invitations/${token}/acceptance`, body);

describe('inviting', () => {
  test('checks the address and the role', async () => {
    const answer = await lead.post(`/surveys/${survey.id}/invitations`, { email: 'x', role: 'owner' });
    expect(answer.status).toBe(422);
    expect((answer.body as { faults: unknown[] }).faults).toHaveLength(2);
  });

  test('mails a link, and never answers with it', async () => {
    const token = await invite('Newcomer@Example.test');
    expect(token).toHaveLength(43);
    const list = await lead.get(`/surveys/${survey.id}/invitations`);
    expect(list.body).toMatchObject({
      items: [{ email: 'newcomer@example.test', role: 'geophysicist', state: 'open' }],
    });
    expect(list.text).not.toContain(token);
    expect(JSON.stringify(await server.db('invitation'))).not.toContain(token);
  });

  test('replaces an open invitation to the same address', async () => {
    const older = await invite('twice@example.test');
    const newer = await invite('twice@example.test', 'guest');
    expect((await nobody.get(`/invitations/${older}`)).status).toBe(404);
    expect((await nobody.get(`/invitations/${newer}`)).body).toMatchObject({ role: 'guest' });
  });

  test('refuses members', async () => {
    const member = await server.signInAs('guest', survey.id);
    const answer = await lead.post(`/surveys/${survey.id}/invitations`, {
      email: member.user?.email,
      role: 'guest',
    });
    expect(answer.status).toBe(409);
    expect(answer.body).toMatchObject({ code: 'already-exists' });
  });
});

describe('accepting', () => {
  test('the link shows what is offered', async () => {
    const token = await invite('curious@example.test');
    const offer = invitationOfferSchema.parse((await nobody.get(`/invitations/${token}`)).body);
    expect(offer).toMatchObject({
      email: 'curious@example.test',
      surveyName: 'Upper valley',
      role: 'geophysicist',
      hasAccount: false,
    });
  });

  test('a newcomer names the account and its password, all faults told at once', async () => {
    const token = await invite('first@example.test');
    const answer = await accept(token, { password: 'short' });
    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({
      faults: [{ path: ['body', 'name'] }, { path: ['body', 'password'] }],
    });
  });

  test('a newcomer gets the account, the role and a session; the link is spent', async () => {
    const email = 'second@example.test';
    const token = await invite(email);
    const answer = await accept(token, { name: 'Second Person', password: TEST_PASSWORD });
    expect(answer.status).toBe(200);
    const me = meSchema.parse(answer.body);
    expect(me).toMatchObject({ email, name: 'Second Person', isAdmin: false });
    expect(answer.headers['set-cookie']?.[0]).toMatch(/^layerwell_session=/);
    expect(await server.db('survey_member').where({ user_id: me.id }).first('role')).toEqual({
      role: 'geophysicist',
    });
    expect((await accept(token, { name: 'Again', password: TEST_PASSWORD })).status).toBe(404);
    expect((await nobody.post('/session', { email, password: TEST_PASSWORD })).status).toBe(200);
  });

  test('a person with an account joins by its own password only', async () => {
    const user = await server.createUser();
    const token = await invite(user.email);
    expect((await nobody.get(`/invitations/${token}`)).body).toMatchObject({ hasAccount: true });
    const wrong = await accept(token, { name: 'Thief', password: 'a new password of mine' });
    expect(wrong.status).toBe(401);
    const right = await accept(token, { password: TEST_PASSWORD });
    expect(right.body).toMatchObject({ id: user.id, name: user.name });
  });

  test('guessing that password here is limited like at the door', async () => {
    const user = await server.createUser();
    const token = await invite(user.email);
    for (let i = 0; i < 10; i += 1)
      expect((await accept(token, { password: `guess ${i}` })).status).toBe(401);
    expect((await accept(token, { password: TEST_PASSWORD })).status).toBe(429);
    await server.db('sign_in_attempt').delete();
  });

  test('two at once with one link make one account', async () => {
    const token = await invite('racer@example.test');
    const answers = await Promise.all(
      [1, 2].map(() => accept(token, { name: 'Racer', password: TEST_PASSWORD })),
    );
    const statuses = answers.map((answer) => answer.status).toSorted((a, b) => a - b);
    expect(statuses[0]).toBe(200);
    expect([401, 404, 409]).toContain(statuses[1]);
    expect(await server.db('app_user').where({ email: 'racer@example.test' })).toHaveLength(1);
  });

  test('an expired or revoked link is spent', async () => {
    const expired = await server.createInvitation(survey.id, lead.user?.id ?? '');
    await server
      .db('invitation')
      .where({ id: expired.id })
      .update({ expires_at: server.db.raw("now() - interval '1 second'") });
    const revoked = await server.createInvitation(survey.id, lead.user?.id ?? '');
    expect((await lead.delete(`/surveys/${survey.id}/invitations/${revoked.id}`)).status).toBe(204);
    for (const { token } of [expired, revoked]) {
      expect((await nobody.get(`/invitations/${token}`)).status).toBe(404);
      expect((await accept(token, { name: 'Late', password: TEST_PASSWORD })).status).toBe(404);
    }
  });
});

describe('revoking', () => {
  test('finds invitations in their own survey only', async () => {
    const other = await server.createSurvey();
    const { id } = await server.createInvitation(other.id, lead.user?.id ?? '');
    expect((await lead.delete(`/surveys/${survey.id}/invitations/${id}`)).status).toBe(404);
  });

  test('is not possible once accepted, and harmless when repeated', async () => {
    const { id, token } = await server.createInvitation(survey.id, lead.user?.id ?? '');
    await accept(token, { name: 'Quick', password: TEST_PASSWORD });
    const late = await lead.delete(`/surveys/${survey.id}/invitations/${id}`);
    expect(late.body).toMatchObject({ status: 409, code: 'wrong-state' });
    const twice = await server.createInvitation(survey.id, lead.user?.id ?? '');
    for (let i = 0; i < 2; i += 1)
      expect((await lead.delete(`/surveys/${survey.id}/invitations/${twice.id}`)).status).toBe(204);
  });
});

test('sending, accepting and revoking stand in the audit trail', async () => {
  const actions = await server
    .db('audit_event')
    .where({ survey_id: survey.id })
    .distinct('action')
    .pluck('action');
  expect(new Set(actions)).toEqual(new Set(['invitation.accepted', 'invitation.revoked', 'invitation.sent']));
});
