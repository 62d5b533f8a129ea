import { describe, expect, test } from 'vitest';
import { surveyListSchema, surveySchema } from '../../server/contract/surveys';
import { createTestServer } from '../setup/server';

const server = await createTestServer();

describe('starting a survey', () => {
  test('needs a name and an error floor within limits', async () => {
    const client = await server.signInOutsider();
    const answer = await client.post('/surveys', { name: ' ', errorFloor: 0.9 });
    expect(answer.body).toMatchObject({
      status: 422,
      faults: [{ path: ['body', 'name'] }, { path: ['body', 'errorFloor'] }],
    });
  });

  test('makes one its lead', async () => {
    const client = await server.signInOutsider();
    const answer = await client.post('/surveys', { name: 'Lower valley', grid: 'own grid', epsgCode: 25832 });
    expect(answer.status).toBe(201);
    expect(answer.headers.etag).toBe('"1"');
    expect(surveySchema.parse(answer.body)).toMatchObject({
      name: 'Lower valley',
      grid: 'own grid',
      epsgCode: 25832,
      errorFloor: 0.03,
      role: 'lead',
      can: { editSurvey: true, manageMembers: true, decide: false },
      progress: { soundings: 0, measured: 0, fitted: 0, interpreted: 0, inReview: 0, accepted: 0 },
    });
  });
});

test('one sees one’s own surveys only, in one query however many there are', async () => {
  const client = await server.signInOutsider();
  const hidden = await server.createSurvey('A hidden one');
  for (let i = 0; i < 5; i += 1) await client.post('/surveys', { name: `Survey ${i}` });
  let queries = 0;
  const count = (query: { sql: string }) => (queries += /from "survey"/.test(query.sql) ? 1 : 0);
  server.db.on('query', count);
  const { items } = surveyListSchema.parse((await client.get('/surveys')).body);
  server.db.off('query', count);
  expect(items.map((item) => item.name)).toEqual([0, 1, 2, 3, 4].map((i) => `Survey ${i}`));
  expect(items.map((item) => item.id)).not.toContain(hidden.id);
  expect(queries).toBe(1);
});

test('progress counts soundings at each stage', async () => {
  const survey = await server.createSurvey();
  const client = await server.signInAs('geophysicist', survey.id);
  const author = client.user?.id ?? '';
  const [, measured, fitted, stated] = await Promise.all(
    [0, 1, 2, 3].map(() => server.createSounding(survey.id)),
  );
  const interpret = async (soundingId: string, states: string[]) => {
    const run = await finishedRun(soundingId, author);
    for (const state of states)
      await server
        .db('interpretation')
        .insert({ sounding_id: soundingId, run_id: run, author_id: author, title: 'A reading of it', state });
  };
  await requestedRun(measured?.id ?? '', author);
  await finishedRun(fitted?.id ?? '', author);
  await interpret(stated?.id ?? '', ['in-review', 'in-review', 'accepted', 'superseded']);
  const other = await server.createSurvey();
  await interpret((await server.createSounding(other.id)).id, ['in-review']);
  expect((await client.get(`/surveys/${survey.id}`)).body).toMatchObject({
    progress: { soundings: 4, measured: 3, fitted: 2, interpreted: 1, inReview: 2, accepted: 1 },
  });
});

async function finishedRun(soundingId: string, author: string): Promise<string> {
  const runId = await requestedRun(soundingId, author);
  const [computation] = await server
    .db('computation')
    .insert({
      key: 'key',
      engine_version: '1.0.0',
      input: '{}',
      result: '{}',
      result_hash: '',
      duration_ms: 1,
    })
    .returning<{ id: string }[]>('id');
  await server
    .db('run_state')
    .where({ run_id: runId })
    .update({ state: 'finished', computation_id: computation?.id, ended_at: new Date() });
  return runId;
}

async function requestedRun(soundingId: string, author: string): Promise<string> {
  const revision = await server.createRevision(soundingId, author);
  const [run] = await server
    .db('run')
    .insert({
      sounding_id: soundingId,
      number: 1,
      revision_id: revision.id,
      input: '{}',
      computation_key: 'key',
      engine_version: '1.0.0',
      requested_by: author,
    })
    .returning<{ id: string }[]>('id');
  await server.db('run_state').insert({ run_id: run?.id, state: 'queued' });
  return run?.id ?? '';
}

describe('changing a survey', () => {
  test('needs the version that was edited', async () => {
    const survey = await server.createSurvey();
    const lead = await server.signInAs('lead', survey.id);
    const missing = await lead.patch(`/surveys/${survey.id}`, { name: 'New' });
    expect(missing.status).toBe(428);
    const malformed = await lead.patch(`/surveys/${survey.id}`, { name: 'New' }).set('If-Match', '1');
    expect(malformed.status).toBe(400);
  });

  test('changes what is sent and nothing else', async () => {
    const survey = await server.createSurvey('Old name');
    const lead = await server.signInAs('lead', survey.id);
    const answer = await lead.patch(`/surveys/${survey.id}`, { errorFloor: 0.05 }, 1);
    expect(answer.headers.etag).toBe('"2"');
    expect(answer.body).toMatchObject({ name: 'Old name', errorFloor: 0.05, version: 2 });
  });

  test('on top of someone else’s change is a conflict that shows it and loses nothing', async () => {
    const survey = await server.createSurvey();
    const lead = await server.signInAs('lead', survey.id);
    await lead.patch(`/surveys/${survey.id}`, { name: 'First' }, 1);
    const answer = await lead.patch(`/surveys/${survey.id}`, { name: 'Second' }, 1);
    expect(answer.body).toMatchObject({
      status: 409,
      code: 'conflict',
      current: { name: 'First', version: 2 },
    });
    expect((await lead.get(`/surveys/${survey.id}`)).body).toMatchObject({ name: 'First', version: 2 });
  });
});

test('an id that cannot be one is not found', async () => {
  const client = await server.signInOutsider();
  expect((await client.get('/surveys/1')).status).toBe(404);
  expect((await client.get(`/surveys/${encodeURIComponent("' OR 1=1 --")}`)).status).toBe(404);
});
