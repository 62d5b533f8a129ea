import { describe, expect, test } from 'vitest';
import { keepALead } from '../../server/access/keep-a-lead';
import { memberListSchema } from '../../server/contract/surveys';
import { createTestServer } from '../setup/server';

const server = await createTestServer();

async function surveyWithLead() {
  const survey = await server.createSurvey();
  const lead = await server.signInAs('lead', survey.id);
  return { surveyId: survey.id, lead, leadId: lead.user?.id ?? '' };
}

test('members are listed with their roles', async () => {
  const { surveyId, lead } = await surveyWithLead();
  const guest = await server.signInAs('guest', surveyId);
  const { items } = memberListSchema.parse((await guest.get(`/surveys/${surveyId}/members`)).body);
  expect(new Map(items.map((item) => [item.user.id, item.role]))).toEqual(
    new Map([
      [guest.user?.id, 'guest'],
      [lead.user?.id, 'lead'],
    ]),
  );
});

test('a role is set and takes effect at the next request', async () => {
  const { surveyId, lead } = await surveyWithLead();
  const member = await server.signInAs('guest', surveyId);
  const path = `/surveys/${surveyId}/members/${member.user?.id}`;
  expect((await lead.put(path, { role: 'owner' })).status).toBe(422);
  expect((await member.post(`/surveys/${surveyId}/lines`, { name: 'L 1' })).status).toBe(403);
  expect((await lead.put(path, { role: 'geophysicist' })).body).toMatchObject({ role: 'geophysicist' });
  expect((await member.post(`/surveys/${surveyId}/lines`, { name: 'L 1' })).status).toBe(201);
  expect(
    await server.db('audit_event').where({ survey_id: surveyId }).first('action', 'subject', 'details'),
  ).toEqual({
    action: 'member.role-set',
    subject: member.user?.email,
    details: { from: 'guest', to: 'geophysicist' },
  });
});

test('a removed member finds the survey no more', async () => {
  const { surveyId, lead } = await surveyWithLead();
  const member = await server.signInAs('geophysicist', surveyId);
  expect((await lead.delete(`/surveys/${surveyId}/members/${member.user?.id}`)).status).toBe(204);
  expect((await member.get(`/surveys/${surveyId}`)).status).toBe(404);
});

test('members of another survey are not found here', async () => {
  const { surveyId, lead } = await surveyWithLead();
  const other = await surveyWithLead();
  const path = `/surveys/${surveyId}/members/${other.leadId}`;
  expect((await lead.put(path, { role: 'guest' })).status).toBe(404);
  expect((await lead.delete(path)).status).toBe(404);
  expect((await other.lead.get(`/surveys/${other.surveyId}`)).body).toMatchObject({ role: 'lead' });
});

describe('the last lead', () => {
  test('can neither be removed nor made something else', async () => {
    const { surveyId, lead, leadId } = await surveyWithLead();
    const path = `/surveys/${surveyId}/members/${leadId}`;
    expect((await lead.put(path, { role: 'guest' })).body).toMatchObject({
      status: 409,
      code: 'wrong-state',
    });
    expect((await lead.delete(path)).body).toMatchObject({ status: 409, code: 'wrong-state' });
    expect((await lead.put(path, { role: 'lead' })).status).toBe(200);
  });

  test('may go once there is another', async () => {
    const { surveyId, lead, leadId } = await surveyWithLead();
    await server.signInAs('lead', surveyId);
    expect((await lead.delete(`/surveys/${surveyId}/members/${leadId}`)).status).toBe(204);
  });

  test('stays when two leads step down at the same moment', async () => {
    const { surveyId, lead, leadId } = await surveyWithLead();
    const second = await server.signInAs('lead', surveyId);
    const secondSteps = await server.db.transaction(async (trx) => {
      await keepALead(trx, surveyId, leadId);
      await trx('survey_member').where({ survey_id: surveyId, user_id: leadId }).update({ role: 'guest' });
      const answer = lead
        .put(`/surveys/${surveyId}/members/${second.user?.id}`, { role: 'guest' })
        .then(({ body }) => body as unknown);
      await Promise.race([answer, untilOneWaits()]);
      return { answer };
    });
    expect(await secondSteps.answer).toMatchObject({ code: 'wrong-state' });
    expect(await server.db('survey_member').where({ survey_id: surveyId, role: 'lead' })).toHaveLength(1);
  });
});

const untilOneWaits = () =>
  expect
    .poll(
      () =>
        server
          .db('pg_stat_activity')
          .where({ wait_event_type: 'Lock' })
          .whereRaw('datname = current_database()'),
      { timeout: 10_000 },
    )
    .toHaveLength(1);
