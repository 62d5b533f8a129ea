import { expect, test } from 'vitest';
import { lineListSchema } from '../../server/contract/surveys';
import { createTestServer } from '../setup/server';

const server = await createTestServer();
const survey = await server.createSurvey();
const geophysicist = await server.signInAs('geophysicist', survey.id);
const path = `/surveys/${survey.id}/lines`;

test('a line needs a name', async () => {
  expect((await geophysicist.post(path, { name: ' ' })).status).toBe(422);
});

test('lines are listed by name with their soundings counted', async () => {
  for (const name of ['North', 'East']) expect((await geophysicist.post(path, { name })).status).toBe(201);
  const lineId = (await server.db('line').where({ name: 'North' }).first<{ id: string }>('id')).id;
  await server.createSounding(survey.id, { lineId });
  await server.createSounding(survey.id);
  const { items } = lineListSchema.parse((await geophysicist.get(path)).body);
  expect(items.map((item) => [item.name, item.soundings])).toEqual([
    ['East', 0],
    ['North', 1],
  ]);
});

test('a name is taken once in a survey', async () => {
  const answer = await geophysicist.post(path, { name: 'North' });
  expect(answer.body).toMatchObject({
    status: 409,
    code: 'already-exists',
    detail: 'A line of this name is in the survey already.',
  });
  const other = await server.createSurvey();
  const lead = await server.signInAs('lead', other.id);
  expect((await lead.post(`/surveys/${other.id}/lines`, { name: 'North' })).status).toBe(201);
});
