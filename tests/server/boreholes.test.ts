import { describe, expect, test } from 'vitest';
import { boreholeSchema } from '../../server/contract/surveys';
import { tomorrow } from '../../server/boreholes/require-days-up-to';
import { createTestServer } from '../setup/server';

const server = await createTestServer();
const survey = await server.createSurvey();
const hydrogeologist = await server.signInAs('hydrogeologist', survey.id);
const path = `/surveys/${survey.id}/boreholes`;

const borehole = {
  name: 'B 1',
  xM: 500_120.5,
  yM: 5_400_310,
  elevationM: 182.4,
  depthM: 60,
  drilledOn: '2019-03-31',
  note: 'Cable tool',
  intervals: [
    { topM: 0, baseM: 4.5, description: 'Loam' },
    { topM: 4.5, baseM: 38, description: 'Gravel' },
    { topM: 40, baseM: 60, description: 'Marl' },
  ],
  waterLevels: [
    { measuredOn: '2020-01-01', depthM: 6.2 },
    { measuredOn: '2020-07-01', depthM: -0.3 },
  ],
};

test('a log is checked: order, overlap, end of the hole, one level a day', async () => {
  const answer = await hydrogeologist.post(path, {
    ...borehole,
    intervals: [
      { topM: 0, baseM: 5, description: 'Loam' },
      { topM: 4, baseM: 70, description: 'Gravel' },
      { topM: 80, baseM: 75, description: 'Marl' },
    ],
    waterLevels: [
      { measuredOn: '2020-01-01', depthM: 6.2 },
      { measuredOn: '2020-01-01', depthM: 6.3 },
    ],
  });
  expect(answer.status).toBe(422);
  const paths = (answer.body as { faults: { path: unknown[] }[] }).faults.map((fault) =>
    fault.path.join('.'),
  );
  expect(paths).toContain('body.intervals.2.baseM');
  const overlapping = await hydrogeologist.post(path, {
    ...borehole,
    intervals: [
      { topM: 0, baseM: 5, description: 'Loam' },
      { topM: 4, baseM: 70, description: 'Gravel' },
    ],
    waterLevels: [borehole.waterLevels[0], borehole.waterLevels[0]],
  });
  expect(
    (overlapping.body as { faults: { path: unknown[] }[] }).faults.map((fault) => fault.path.join('.')),
  ).toEqual(['body.waterLevels.1.measuredOn', 'body.intervals.1.topM', 'body.intervals.1.baseM']);
});

test('what was written comes back, dates to the day', async () => {
  const made = await hydrogeologist.post(path, borehole);
  expect(made.status).toBe(201);
  const found = boreholeSchema.parse((await hydrogeologist.get(`/boreholes/${made.body.id as string}`)).body);
  expect(found).toMatchObject(borehole);
  expect((await hydrogeologist.get(path)).body).toMatchObject({ items: [{ id: found.id }] });
});

test('a name is taken once in a survey', async () => {
  const answer = await hydrogeologist.post(path, borehole);
  expect(answer.body).toMatchObject({ status: 409, code: 'already-exists' });
  expect(await server.db('borehole_interval')).toHaveLength(3);
});

describe('writing anew', () => {
  test('replaces the log and the levels with the row', async () => {
    const { id } = await server.createBorehole(survey.id);
    const first = await hydrogeologist.put(`/boreholes/${id}`, { ...borehole, name: 'B 2' }, 1);
    expect(first.body).toMatchObject({ version: 2, intervals: borehole.intervals });
    const second = await hydrogeologist.put(
      `/boreholes/${id}`,
      { ...borehole, name: 'B 2', intervals: [], waterLevels: [] },
      2,
    );
    expect(second.body).toMatchObject({ version: 3, intervals: [], waterLevels: [] });
  });

  test('on top of someone else’s change is a conflict; the log stays as it was', async () => {
    const { id } = await server.createBorehole(survey.id);
    await hydrogeologist.put(`/boreholes/${id}`, { ...borehole, name: 'B 3' }, 1);
    const late = await hydrogeologist.put(`/boreholes/${id}`, { ...borehole, name: 'B 4', intervals: [] }, 1);
    expect(late.body).toMatchObject({ status: 409, code: 'conflict', current: { name: 'B 3', version: 2 } });
    expect((await hydrogeologist.get(`/boreholes/${id}`)).body).toMatchObject({
      intervals: borehole.intervals,
    });
  });
});

test('no water lies below the end of the hole', async () => {
  const level = (depthM: number) => ({ ...borehole, waterLevels: [{ measuredOn: '2020-01-01', depthM }] });
  const answer = await hydrogeologist.post(path, level(60.5));
  expect(answer.body).toMatchObject({
    status: 422,
    faults: [
      {
        path: ['body', 'waterLevels', 0, 'depthM'],
        message: 'must not lie below the end of the hole: 60.5 m, where the hole ends at 60 m',
      },
    ],
  });
  const { id } = await server.createBorehole(survey.id);
  expect((await hydrogeologist.put(`/boreholes/${id}`, { ...level(60), name: 'B dry' }, 1)).status).toBe(200);
});

describe('days', () => {
  const day = (ahead: number) => new Date(Date.now() + ahead * 86_400_000).toISOString().slice(0, 10);
  const on = (name: string, drilledOn: string, measuredOn: string) => ({
    ...borehole,
    name,
    drilledOn,
    waterLevels: [borehole.waterLevels[0], { measuredOn, depthM: 3 }],
  });

  test('that lie in the future are refused, with the last one that is not', async () => {
    const [tomorrow, late] = [day(1), day(2)];
    const expected = {
      status: 422,
      faults: [
        { path: ['body', 'drilledOn'], found: late, allowed: `up to ${tomorrow}` },
        { path: ['body', 'waterLevels', 1, 'measuredOn'], found: late, allowed: `up to ${tomorrow}` },
      ],
    };
    expect((await hydrogeologist.post(path, on('B late', late, late))).body).toMatchObject(expected);
    const { id } = await server.createBorehole(survey.id);
    expect((await hydrogeologist.put(`/boreholes/${id}`, on('B late', late, late), 1)).body).toMatchObject(
      expected,
    );
  });

  test('may be tomorrow, as they are already somewhere', async () => {
    expect((await hydrogeologist.post(path, on('B early', day(1), day(1)))).status).toBe(201);
    expect(tomorrow(new Date('2024-02-28T23:59:59Z'))).toBe('2024-02-29');
  });
});
