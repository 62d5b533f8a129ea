import { describe, expect, test } from 'vitest';
import { auditEventPageSchema, receivedMailPageSchema } from '../../server/contract/admin';
import { createTestServer } from '../setup/server';

const server = await createTestServer();
const admin = await server.signInAdmin();

describe('accounts', () => {
  test('are listed without anything secret', async () => {
    const answer = await admin.get('/admin/users');
    expect(answer.body).toMatchObject({ items: [{ email: admin.user?.email, isAdmin: true, surveys: 0 }] });
    expect(answer.text).not.toMatch(/argon2|password/);
  });

  test('are switched off, which ends their sessions, and on again', async () => {
    const client = await server.signInOutsider();
    const path = `/admin/users/${client.user?.id}/state`;
    expect((await admin.put(path, { disabled: 'yes' })).status).toBe(422);
    const off = await admin.put(path, { disabled: true });
    expect((off.body as { disabledAt: string }).disabledAt).toMatch(/Z$/);
    expect((await client.get('/me')).status).toBe(401);
    expect((await admin.put(path, { disabled: true })).body).toEqual(off.body);
    expect((await admin.put(path, { disabled: false })).body).toMatchObject({ disabledAt: null });
    expect((await client.get('/me')).status).toBe(401);
    const trail = await server
      .db('audit_event')
      .where({ subject: client.user?.email })
      .orderBy('id')
      .pluck('action');
    expect(trail).toEqual(['account.switched-off', 'account.switched-on']);
  });

  test('an administrator cannot lock themself out', async () => {
    const answer = await admin.put(`/admin/users/${admin.user?.id}/state`, { disabled: true });
    expect(answer.body).toMatchObject({ status: 409, code: 'wrong-state' });
  });

  test('an unknown account is not found', async () => {
    const path = '/admin/users/00000000-0000-4000-8000-000000000000/state';
    expect((await admin.put(path, { disabled: true })).status).toBe(404);
  });
});

describe('surveys', () => {
  test('are seen by name only, until joined on the record', async () => {
    const survey = await server.createSurvey('Far side');
    await server.signInAs('lead', survey.id);
    expect((await admin.get('/admin/surveys')).body).toMatchObject({
      items: [{ id: survey.id, name: 'Far side', members: 1, ownRole: null }],
    });
    expect((await admin.get(`/surveys/${survey.id}`)).status).toBe(404);
    const joined = await admin.put(`/admin/surveys/${survey.id}/membership`, { role: 'guest' });
    expect(joined.body).toEqual({ id: survey.id, name: 'Far side', members: 2, ownRole: 'guest' });
    expect((await admin.get(`/surveys/${survey.id}`)).body).toMatchObject({ role: 'guest' });
    const trail = await server.db('audit_event').where({ survey_id: survey.id }).first();
    expect(trail).toMatchObject({
      action: 'survey.joined-by-administrator',
      actor_id: admin.user?.id,
      details: { from: null, to: 'guest' },
    });
  });

  test('keep a lead when the administrator was the only one', async () => {
    const survey = await server.createSurvey();
    const path = `/admin/surveys/${survey.id}/membership`;
    expect((await admin.put(path, { role: 'lead' })).status).toBe(200);
    expect((await admin.put(path, { role: 'guest' })).body).toMatchObject({ code: 'wrong-state' });
  });
});

describe('mail and audit trail', () => {
  test('mail of the sink is shown, the newest first, page by page', async () => {
    for (const subject of ['one', 'two', 'three'])
      await server.services.mailer.send({ to: 'someone@example.test', subject, text: `Text ${subject} Ω·m` });
    const first = receivedMailPageSchema.parse((await admin.get('/admin/mail?pageSize=2')).body);
    expect(first).toMatchObject({ total: 3, page: 1, pageSize: 2, sink: true });
    expect(first.items.map((item) => item.subject)).toEqual(['three', 'two']);
    expect(first.items[0]).toMatchObject({
      recipients: ['someone@example.test'],
      sender: '"Layerwell" <layerwell@localhost>',
      text: 'Text three Ω·m\n',
    });
    const second = receivedMailPageSchema.parse((await admin.get('/admin/mail?pageSize=2&page=2')).body);
    expect(second.items.map((item) => item.subject)).toEqual(['one']);
  });

  test('the trail tells who did what, the newest first, and cannot be changed', async () => {
    const page = auditEventPageSchema.parse((await admin.get('/admin/audit-events?pageSize=500')).body);
    expect(page.items.length).toBe(page.total);
    const ids = page.items.map((item) => Number(item.id));
    expect(ids).toEqual(ids.toSorted((a, b) => b - a));
    expect(page.items[0]).toMatchObject({ actorName: admin.user?.name });
    await expect(server.db('audit_event').delete()).rejects.toThrow('never changed or deleted');
  });

  test('pages have limits', async () => {
    expect((await admin.get('/admin/mail?pageSize=501')).status).toBe(422);
    expect((await admin.get('/admin/audit-events?page=0')).status).toBe(422);
  });
});
