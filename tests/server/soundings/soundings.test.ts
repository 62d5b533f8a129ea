import { randomUUID } from 'node:crypto';
import { beforeAll, describe, expect, it } from 'vitest';
import { soundingPageSchema, soundingSchema } from '../../../server/contract/soundings';
import { createTestServer, type Client } from '../../setup/server';

const server = await createTestServer();
let surveyId = '';
let lead: Client;
let guest: Client;
let outsider: Client;

beforeAll(async () => {
  surveyId = (await server.createSurvey()).id;
  lead = await server.signInAs('lead', surveyId);
  guest = await server.signInAs('guest', surveyId);
  outsider = await server.signInOutsider();
});

const body = (name: string) => ({ name, spreadType: 'schlumberger' });

describe('POST /surveys/:surveyId/soundings', () => {
  const path = () => `/surveys/${surveyId}/soundings`;

  it('refuses strangers, faults and guests', async () => {
    expect((await server.nobody.post(path(), body('V1'))).status).toBe(401);
    const faulty = await lead.post(path(), { ...body(' '), azimuthDeg: 360, xM: 'east' });
    expect(faulty.status).toBe(422);
    const faultPaths = (faulty.body as { faults: { path: string[] }[] }).faults.map((fault) => fault.path);
    expect(faultPaths).toEqual([
      ['body', 'name'],
      ['body', 'xM'],
      ['body', 'azimuthDeg'],
    ]);
    expect((await outsider.post(path(), body('V1'))).status).toBe(404);
    expect((await guest.post(path(), body('V1'))).status).toBe(403);
  });

  it('adds a sounding with its date as written', async () => {
    const line = await server.createLine(surveyId, 'Line of dates');
    const answer = await lead.post(path(), { ...body('V dated'), measuredOn: '2026-03-29', lineId: line.id });
    expect(answer.status).toBe(201);
    const sounding = soundingSchema.parse(answer.body);
    expect(sounding).toMatchObject({
      measuredOn: '2026-03-29',
      lineName: 'Line of dates',
      state: 'no-readings',
      currentRevisionId: null,
      version: 1,
      can: { editReadings: true },
    });
  });

  it('tells a name that is taken and a line of another survey', async () => {
    await lead.post(path(), body('V taken'));
    const taken = await lead.post(path(), body('V taken'));
    expect(taken.status).toBe(409);
    expect(taken.body).toMatchObject({
      code: 'already-exists',
      detail: expect.stringMatching(/of this name/),
    });
    const elsewhere = await server.createLine((await server.createSurvey()).id);
    const foreign = await lead.post(path(), { ...body('V foreign'), lineId: elsewhere.id });
    expect(foreign.status).toBe(422);
    expect(foreign.body).toMatchObject({ detail: 'This line is not in the survey.' });
  });
});

describe('PATCH /soundings/:soundingId', () => {
  it('changes what is named, and answers a stale version with the row as it stands', async () => {
    const { id } = await server.createSounding(surveyId);
    const first = await lead.patch(`/soundings/${id}`, { crew: 'A and B' }, 1);
    expect(first.status).toBe(200);
    expect(first.headers.etag).toBe('"2"');
    const stale = await lead.patch(`/soundings/${id}`, { crew: 'C and D' }, 1);
    expect(stale.status).toBe(409);
    expect(stale.body).toMatchObject({ code: 'conflict', current: { crew: 'A and B', version: 2 } });
    expect((await lead.patch(`/soundings/${id}`, { crew: 'x' })).status).toBe(428);
  });

  it('keeps the spread of saved readings', async () => {
    const { id } = await server.createSounding(surveyId);
    expect((await lead.patch(`/soundings/${id}`, { spreadType: 'wenner' }, 1)).status).toBe(200);
    expect((await lead.patch(`/soundings/${id}`, { spreadType: 'schlumberger' }, 2)).status).toBe(200);
    await server.createRevision(id, lead.user?.id ?? '');
    const refused = await lead.patch(`/soundings/${id}`, { spreadType: 'wenner' }, 3);
    expect(refused.status).toBe(409);
    expect(refused.body).toMatchObject({ code: 'wrong-state' });
    expect((await lead.patch(`/soundings/${id}`, { spreadType: 'schlumberger' }, 3)).status).toBe(200);
  });
});

const finishRun = async (
  soundingId: string,
  revisionId: string,
  number: number,
  given: { layers: number; chi2: number; pinned?: boolean; state?: 'finished' | 'failed'; kind?: 'smooth' },
): Promise<string> => {
  const spread = { type: 'schlumberger', halfAB: 10, halfMN: 1 };
  const input = {
    readings: [{ spread, apparentResistivity: 50, relativeError: 0.03 }],
    settings: { kind: given.kind ?? 'layered' },
  };
  const result = {
    earth: { resistivity: Array.from({ length: given.layers }, () => 50), thickness: [] },
    chi2PerReading: given.chi2,
    rmsPercent: 2,
    predicted: [51],
    misfitProbability: 0.004,
  };
  const finished = given.state !== 'failed';
  const [computation] = await server
    .db('computation')
    .insert({
      key: randomUUID(),
      engine_version: '1.0.0',
      input: '{}',
      result: JSON.stringify(result),
      result_hash: '',
      duration_ms: 1,
    })
    .returning<{ id: string }[]>('id');
  const [run] = await server
    .db('run')
    .insert({
      sounding_id: soundingId,
      number,
      revision_id: revisionId,
      input: JSON.stringify(input),
      computation_key: '',
      engine_version: '1.0.0',
      requested_by: lead.user?.id,
    })
    .returning<{ id: string }[]>('id');
  await server.db('run_state').insert({
    run_id: run?.id,
    state: given.state ?? 'finished',
    ended_at: server.db.fn.now(),
    computation_id: finished ? computation?.id : null,
  });
  await server.db('run_note').insert({ run_id: run?.id, pinned: given.pinned ?? false });
  return run?.id ?? '';
};

describe('GET /surveys/:surveyId/soundings', () => {
  let listed = '';
  const list = async (query = '') => {
    const answer = await lead.get(`/surveys/${listed}/soundings${query}`);
    expect(answer.status).toBe(200);
    return soundingPageSchema.parse(answer.body);
  };
  const names = async (query: string) => (await list(query)).items.map(({ name }) => name);

  beforeAll(async () => {
    listed = (await server.createSurvey()).id;
    await server.addMember(listed, lead.user?.id ?? '', 'lead');
    const line = await server.createLine(listed, 'West line');
    const v10 = await server.createSounding(listed, { name: 'V 10', lineId: line.id });
    const v2 = await server.createSounding(listed, { name: 'V 2', spreadType: 'wenner' });
    const v1 = await server.createSounding(listed, { name: 'V 1' });
    await server
      .db('sounding')
      .where({ id: v2.id })
      .update({ measured_on: '2026-05-01', note: '100% wet_ground' });
    const old = await server.createRevision(v1.id, lead.user?.id ?? '');
    await finishRun(v1.id, old.id, 1, { layers: 3, chi2: 1.5, pinned: true });
    await finishRun(v1.id, old.id, 2, { layers: 5, chi2: 0.9 });
    await server.createRevision(v10.id, lead.user?.id ?? '');
    const current = await server
      .db('sounding')
      .where({ id: v10.id })
      .first<{ current_revision_id: string }>();
    await finishRun(v10.id, current.current_revision_id, 1, { layers: 4, chi2: 0.8 });
    await finishRun(v10.id, current.current_revision_id, 2, { layers: 2, chi2: 9, state: 'failed' });
  });

  it('sorts names by the value of their numbers, and pages', async () => {
    expect(await names('')).toEqual(['V 1', 'V 2', 'V 10']);
    expect(await names('?order=desc')).toEqual(['V 10', 'V 2', 'V 1']);
    const page = await list('?pageSize=2&page=2');
    expect(page).toMatchObject({ total: 3, page: 2, pageSize: 2, items: [{ name: 'V 10' }] });
    expect(await list('?page=9')).toMatchObject({ total: 3, items: [] });
  });

  it('sorts by what the runs say, with unfitted ones last', async () => {
    expect(await names('?sort=misfit')).toEqual(['V 10', 'V 1', 'V 2']);
    expect(await names('?sort=misfit&order=desc')).toEqual(['V 1', 'V 10', 'V 2']);
    expect(await names('?sort=layers')).toEqual(['V 1', 'V 10', 'V 2']);
    expect(await names('?sort=state')).toEqual(['V 2', 'V 1', 'V 10']);
    expect(await names('?sort=line')).toEqual(['V 10', 'V 1', 'V 2']);
    expect((await names('?sort=measuredOn'))[0]).toBe('V 2');
  });

  it('filters and searches, taking % and _ as they are', async () => {
    expect(await names('?spreadType=wenner')).toEqual(['V 2']);
    expect(await names('?state=fitted')).toEqual(['V 1', 'V 10']);
    expect(await names('?state=no-readings')).toEqual(['V 2']);
    expect(await names('?search=WEST')).toEqual(['V 10']);
    expect(await names('?search=100%25%20wet_')).toEqual(['V 2']);
    expect(await names('?search=1_')).toEqual([]);
    expect((await lead.get(`/surveys/${listed}/soundings?sort=depth`)).status).toBe(422);
  });

  it('shows the curve, and the pinned finished run before the newest', async () => {
    const [v1, v2, v10] = (await list('')).items;
    expect(v1?.curve[0]).toEqual({ spacingM: 1.5, apparentResistivityOhmM: 118, excluded: false });
    expect(v1?.latestRun).toMatchObject({
      number: 1,
      layers: 3,
      chi2PerReading: 1.5,
      misfitProbability: 0.004,
      ofOlderReadings: false,
    });
    expect(v1?.latestRun?.predicted).toEqual([{ spacingM: 10, apparentResistivityOhmM: 51 }]);
    expect(v2).toMatchObject({ curve: [], latestRun: null, revisionNumber: null });
    expect(v10?.latestRun).toMatchObject({ number: 1, layers: 4 });
  });

  it('says when the run is of older readings', async () => {
    const id = (await list('')).items[0]?.id ?? '';
    const readings = [{ ...reading, remark: 'again' }];
    await server.createRevision(id, lead.user?.id ?? '', readings);
    const [v1] = (await list('')).items;
    expect(v1).toMatchObject({ revisionNumber: 2, latestRun: { number: 1, ofOlderReadings: true } });
  });

  const interpret = (soundingId: string, runId: string, state: string) =>
    server.db('interpretation').insert({
      sounding_id: soundingId,
      run_id: runId,
      author_id: lead.user?.id,
      title: state,
      state,
    });

  it('tells the weightiest state of the interpretations, whichever was touched last', async () => {
    const { id = '', latestRun } = (await list('')).items[2] ?? {};
    const seen: string[] = [];
    for (const state of ['superseded', 'draft', 'accepted', 'draft', 'changes-asked', 'in-review', 'draft']) {
      await interpret(id, latestRun?.id ?? '', state);
      seen.push((await list('')).items[2]?.state ?? '');
    }
    expect(seen).toEqual([
      'fitted',
      'draft',
      'accepted',
      'accepted',
      'changes-asked',
      'in-review',
      'in-review',
    ]);
    expect((await lead.get(`/soundings/${id}`)).body).toMatchObject({ state: 'in-review' });
  });

  it('shows the run of the weightiest interpretation before the newest, and the pinned one before both', async () => {
    const { id } = await server.createSounding(listed, { name: 'V 20' });
    const revision = await server.createRevision(id, lead.user?.id ?? '');
    const runs: string[] = [];
    for (const number of [1, 2, 3, 4])
      runs.push(await finishRun(id, revision.id, number, { layers: number, chi2: 1 }));
    const shown = async () => (await list('?search=V%2020')).items[0]?.latestRun?.number;
    expect(await shown()).toBe(4);
    const seen: unknown[] = [];
    for (const [run, state] of [
      [0, 'superseded'],
      [0, 'draft'],
      [1, 'draft'],
      [0, 'accepted'],
      [2, 'in-review'],
      [1, 'changes-asked'],
    ] as const) {
      await interpret(id, runs[run] ?? '', state);
      seen.push(await shown());
    }
    expect(seen).toEqual([4, 1, 2, 1, 3, 3]);
    await server.db('run_note').where({ run_id: runs[3] }).update({ pinned: true });
    expect(await shown()).toBe(4);
  });

  it('shows beds before a newer ground of cells, which has no count of beds', async () => {
    const { id } = await server.createSounding(listed, { name: 'V 30' });
    const revision = await server.createRevision(id, lead.user?.id ?? '');
    await finishRun(id, revision.id, 1, { layers: 3, chi2: 1 });
    const smooth = await finishRun(id, revision.id, 2, { layers: 30, chi2: 1, kind: 'smooth' });
    const shown = async () => (await list('?search=V%2030')).items[0]?.latestRun;
    expect(await shown()).toMatchObject({ number: 1, layers: 3 });
    await server.db('run_note').where({ run_id: smooth }).update({ pinned: true });
    expect(await shown()).toMatchObject({ number: 2, layers: null });
  });
});

const reading = {
  spread: { type: 'schlumberger' as const, halfAB: 5, halfMN: 1 },
  voltageMv: null,
  currentMa: null,
  resistanceOhm: null,
  sheetApparentResistivityOhmM: 70,
  standardError: null,
  remark: '',
  excluded: null,
};

it('answers pages of two thousand soundings quickly, whatever the order', async () => {
  const many = (await server.createSurvey()).id;
  await server.addMember(many, lead.user?.id ?? '', 'lead');
  await server.db.raw(
    `INSERT INTO sounding (survey_id, name, spread_type)
      SELECT ?, 'V ' || i, 'schlumberger' FROM generate_series(1, 2000) AS i`,
    [many],
  );
  const readings = JSON.stringify(Array.from({ length: 20 }, () => reading));
  const author = lead.user?.id ?? '';
  await server.db.raw(
    `WITH revision AS (
      INSERT INTO data_revision (sounding_id, number, content_hash, readings, author_id)
        SELECT id, 1, 'h', ?::jsonb, ? FROM sounding WHERE survey_id = ? RETURNING id, sounding_id)
    UPDATE sounding SET current_revision_id = revision.id FROM revision WHERE sounding.id = revision.sounding_id`,
    [readings, author, many],
  );
  await server.db.raw(
    `WITH c AS (
      INSERT INTO computation (key, engine_version, input, result, result_hash, duration_ms)
        SELECT 'many', '1', '{}', jsonb_build_object('earth', jsonb_build_object('resistivity', jsonb_build_array(1, 2)),
          'chi2PerReading', random(), 'rmsPercent', 2, 'predicted', '[1]'::jsonb,
          'bulk', (SELECT jsonb_agg(random()) FROM generate_series(1, 800))), '', 1 RETURNING id),
    r AS (
      INSERT INTO run (sounding_id, number, revision_id, input, computation_key, engine_version, requested_by)
        SELECT id, 1, current_revision_id, '{"readings":[]}', 'many', '1', ? FROM sounding WHERE survey_id = ? RETURNING id),
    s AS (INSERT INTO run_state (run_id, state, ended_at, computation_id)
        SELECT r.id, 'finished', now(), c.id FROM r, c RETURNING run_id)
    INSERT INTO run_note (run_id) SELECT run_id FROM s`,
    [author, many],
  );
  await server.db.raw('ANALYZE');
  for (const sort of ['name', 'misfit', 'state']) {
    const times: number[] = [];
    for (let i = 0; i < 3; i++) {
      const start = performance.now();
      const answer = await lead.get(`/surveys/${many}/soundings?sort=${sort}&page=5`);
      times.push(performance.now() - start);
      expect(answer.body).toMatchObject({ total: 2000 });
      expect((answer.body as { items: unknown[] }).items).toHaveLength(100);
    }
    // measured 40–90 ms on two cores; the bound leaves room for a busy machine
    expect([sort, Math.min(...times)]).toEqual([sort, expect.toSatisfy((ms: number) => ms < 600)]);
  }
});
