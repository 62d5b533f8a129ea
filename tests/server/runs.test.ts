import { createServer, get, type IncomingMessage } from 'node:http';
import type { AddressInfo } from 'node:net';
import { join } from 'node:path';
import { setTimeout as delay } from 'node:timers/promises';
import { pino } from 'pino';
import { afterAll, describe, expect, it } from 'vitest';
import { ENGINE_VERSION } from '../../inversion/index';
import type { FitSettingsInput } from '../../server/contract/fit';
import { runSchema, runSummarySchema, type Run, type RunSummary } from '../../server/contract/runs';
import { startRunWorker } from '../../server/jobs/run-worker';
import { computationKey } from '../../server/runs/computation-key';
import { threeLayerReadings } from '../setup/factories';
import { createRun } from '../setup/run-factory';
import { createTestServer, type Client } from '../setup/server';

const server = await createTestServer();
const { app, db, services } = server;
const survey = await server.createSurvey();
const geophysicist = await server.signInAs('geophysicist', survey.id);
const authorId = geophysicist.user?.id ?? '';
const THREE: FitSettingsInput = { kind: 'layered', layers: 3 };

const worker = startRunWorker({
  db,
  pool: services.pool,
  log: pino({ level: 'silent' }),
  threads: 1,
  threadFile: join(import.meta.dirname, '../../server/jobs/fit-thread.ts'),
});
const web = createServer(app).listen(0, '127.0.0.1');
afterAll(async () => {
  web.closeAllConnections();
  web.close();
  await worker.stop();
});

async function measured(readings = threeLayerReadings()): Promise<string> {
  const sounding = await server.createSounding(survey.id);
  await server.createRevision(sounding.id, authorId, readings);
  return sounding.id;
}

const ask = (soundingId: string, body: object) => geophysicist.post(`/soundings/${soundingId}/runs`, body);

async function asked(soundingId: string, settings: FitSettingsInput = THREE): Promise<Run> {
  const answer = await ask(soundingId, { settings });
  expect(answer).toMatchObject({ status: 201 });
  return runSchema.parse(answer.body);
}

async function finished(run: Run): Promise<Run> {
  for (let tries = 0; tries < 400; tries++) {
    const now = runSchema.parse((await geophysicist.get(`/runs/${run.id}`)).body);
    if (now.endedAt) return now;
    await delay(50);
  }
  throw new Error('the run did not end');
}

describe('asking for a run', () => {
  it('freezes the kept readings with the floor of the survey, and computes them', async () => {
    const readings = threeLayerReadings();
    readings[3] = { ...readings[3]!, excluded: 'wire moved' };
    const soundingId = await measured(readings);
    await db('survey').where({ id: survey.id }).update({ error_floor: 0.05 });
    const run = await asked(soundingId);
    await db('survey').where({ id: survey.id }).update({ error_floor: 0.03 });
    expect(run.readings).toHaveLength(11);
    expect(run.readings[0]?.relativeError).toBeCloseTo(Math.hypot(0.02, 0.05), 12);
    expect(run.readings.map((reading) => reading.row)).toEqual([1, 2, 3, 5, 6, 7, 8, 9, 10, 11, 12]);
    expect(run.readings[3]?.plottingSpacingM).toBe(10);
    expect(run.excluded).toEqual([
      {
        row: 4,
        spread: readings[3].spread,
        plottingSpacingM: 6,
        apparentResistivity: 76,
        // with the floor the run was asked with, not the one of now
        relativeError: expect.closeTo(Math.hypot(0.02, 0.05), 12),
        reason: 'wire moved',
      },
    ]);
    const done = await finished(run);
    expect(done).toMatchObject({
      state: 'finished',
      number: 1,
      fromCache: false,
      engineVersion: ENGINE_VERSION,
    });
    expect(done.result?.predicted).toHaveLength(11);
    expect(done.outcome).toEqual({
      earth: done.result?.earth,
      status: done.result?.status,
      chi2PerReading: done.result?.chi2PerReading,
      rmsPercent: done.result?.rmsPercent,
      misfitProbability: done.result?.misfitProbability,
    });
  });

  it('answers what was computed before at once, for any sounding with these readings', async () => {
    const first = await finished(await asked(await measured(), { ...THREE, seed: 5 }));
    const again = await asked(await measured(), { ...THREE, seed: 5 });
    expect(again).toMatchObject({ state: 'finished', fromCache: true, result: first.result });
    const other = await asked(await measured(), { ...THREE, seed: 6 });
    expect(other.computationKey).not.toBe(first.computationKey);
    expect(other.state).toBe('queued');
  });

  it('needs saved readings', async () => {
    const empty = await server.createSounding(survey.id);
    const answer = await ask(empty.id, { settings: THREE });
    expect(answer.body).toMatchObject({ status: 422 });
    expect(answer.body.detail).toContain('no saved readings');
    const foreign = await db('data_revision')
      .where({ sounding_id: await measured() })
      .first('id');
    const wrong = await ask(empty.id, { revisionId: foreign.id, settings: THREE });
    expect(wrong.body.faults).toMatchObject([{ path: ['body', 'revisionId'] }]);
  });

  it('needs as many readings as unknown values, and tells how many beds they allow', async () => {
    const readings = threeLayerReadings().slice(0, 6);
    readings[0] = { ...readings[0]!, excluded: 'doubtful' };
    const soundingId = await measured(readings);
    const answer = await ask(soundingId, { settings: { ...THREE, layers: 4 } });
    expect(answer.body.detail).toBe(
      '4 beds have 7 unknown values, and the revision holds 5 kept readings, 1 left out.',
    );
    expect(answer.body.faults[0].allowed).toBe('at most 3 beds with 5 kept readings, or more values held');
    const held = [0, 1].map((index) => ({ on: 'thickness' as const, index, value: 3 }));
    expect((await ask(soundingId, { settings: { ...THREE, layers: 4, fixed: held } })).status).toBe(201);
    const none = await measured(threeLayerReadings().map((one) => ({ ...one, excluded: 'all wrong' })));
    expect((await ask(none, { settings: { ...THREE, layers: 'auto' } })).body).toMatchObject({
      status: 422,
      faults: [{ allowed: 'at least 1 kept reading' }],
    });
  });

  it('takes an older revision on request and says so', async () => {
    const soundingId = await measured();
    const { id: revisionId } = await db('data_revision').where({ sounding_id: soundingId }).first('id');
    await server.createRevision(soundingId, authorId, threeLayerReadings().slice(1));
    const answer = await ask(soundingId, { revisionId, settings: THREE });
    expect(answer.body).toMatchObject({ revisionId, revisionNumber: 1, ofOlderReadings: true });
    expect((await asked(soundingId)).ofOlderReadings).toBe(false);
  });

  it('numbers runs asked for at the same moment one after the other', async () => {
    const soundingId = await measured();
    await Promise.all([1, 2, 3, 4, 5].map((seed) => asked(soundingId, { ...THREE, seed })));
    const list = await geophysicist.get(`/soundings/${soundingId}/runs`);
    expect(list.body.items.map((run: RunSummary) => run.number)).toEqual([5, 4, 3, 2, 1]);
  });

  it('names every setting that is not allowed', async () => {
    const answer = await ask(await measured(), { settings: { kind: 'layered', layers: 9, seed: -1 } });
    expect(answer.status).toBe(422);
    expect(answer.body.faults.map((fault: { path: unknown[] }) => fault.path)).toEqual(
      expect.arrayContaining([
        ['body', 'settings', 'layers'],
        ['body', 'settings', 'seed'],
      ]),
    );
  });
});

describe('the key of a computation', () => {
  const input = {
    readings: [
      { spread: { type: 'wenner' as const, spacing: 5 }, apparentResistivity: 100, relativeError: 0.03 },
    ],
    settings: {
      kind: 'layered' as const,
      layers: 1,
      seed: 1,
      bounds: { resistivity: [0.1, 1e5] as [number, number], thickness: [0.02, 1000] as [number, number] },
      fixed: [],
    },
  };

  it('does not depend on the order of keys, and changes with engine, readings, settings and seed', () => {
    const key = computationKey('1.0.0', input);
    const reordered = { settings: input.settings, readings: input.readings };
    expect(computationKey('1.0.0', reordered)).toBe(key);
    expect(key).toMatch(/^[0-9a-f]{64}$/);
    const others = [
      computationKey('1.0.1', input),
      computationKey('1.0.0', { ...input, settings: { ...input.settings, seed: 2 } }),
      computationKey('1.0.0', { ...input, settings: { ...input.settings, layers: 2 } }),
      computationKey('1.0.0', {
        ...input,
        readings: [{ ...input.readings[0]!, relativeError: 0.030000000000000002 }],
      }),
    ];
    expect(new Set([key, ...others]).size).toBe(5);
  });
});

describe('what stands on a run', () => {
  it('is told by the weightiest state of its interpretations', async () => {
    const soundingId = await measured();
    const [run, other] = [
      await createRun(db, soundingId, { requestedBy: authorId }),
      await createRun(db, soundingId, { requestedBy: authorId }),
    ];
    const told = async () => {
      const list = await geophysicist.get(`/soundings/${soundingId}/runs`);
      return list.body.items.map((one: RunSummary) => [one.id, one.interpretedAs]);
    };
    expect(await told()).toEqual([
      [other.id, null],
      [run.id, null],
    ]);
    const states = [
      'superseded',
      'draft',
      'accepted',
      'draft',
      'changes-asked',
      'accepted',
      'in-review',
      'draft',
    ];
    const seen: unknown[] = [];
    for (const state of states) {
      await db('interpretation').where({ run_id: run.id, state: 'accepted' }).update({ state: 'superseded' });
      await db('interpretation').insert({
        sounding_id: soundingId,
        run_id: run.id,
        author_id: authorId,
        title: state,
        state,
      });
      seen.push((await told())[1]?.[1]);
    }
    expect(seen).toEqual([
      null,
      'draft',
      'accepted',
      'draft',
      'changes-asked',
      'changes-asked',
      'in-review',
      'in-review',
    ]);
    expect(await told()).toContainEqual([other.id, null]);
    expect((await geophysicist.get(`/runs/${run.id}`)).body).toMatchObject({ interpretedAs: 'in-review' });
  });
});

describe('compute again', () => {
  it('computes past the cache and finds the same bits', async () => {
    const first = await finished(await asked(await measured(), { ...THREE, seed: 21 }));
    const answer = await geophysicist.post(`/runs/${first.id}/recomputation`);
    expect(answer.body).toMatchObject({ state: 'queued', recomputesRunId: first.id, fromCache: false });
    const again = await finished(runSchema.parse(answer.body));
    expect(again.comparison).toEqual({ againstRunId: first.id, verdict: 'identical', differences: [] });
    expect(await db('computation').where({ key: first.computationKey })).toHaveLength(2);
  });

  it('names every value that differs from what is stored', async () => {
    const soundingId = await measured();
    const first = await createRun(db, soundingId, {
      requestedBy: authorId,
      settings: { ...THREE, seed: 22 },
    });
    const stored = await storedResult(first.id);
    const altered = { ...stored, iterations: stored.iterations + 1 };
    // the stored result of another computation stands in for one that a different machine computed
    const [computation] = await db('computation')
      .insert({
        key: 'from elsewhere',
        engine_version: ENGINE_VERSION,
        input: '{}',
        result: JSON.stringify(altered),
        result_hash: '',
        duration_ms: 1,
      })
      .returning('id');
    await db('run_state').where({ run_id: first.id }).update({ computation_id: computation.id });
    const answer = await geophysicist.post(`/runs/${first.id}/recomputation`);
    const again = await finished(runSchema.parse(answer.body));
    expect(again.comparison).toEqual({
      againstRunId: first.id,
      verdict: 'differs',
      differences: [
        { path: 'iterations', before: String(altered.iterations), after: String(stored.iterations) },
      ],
    });
  });

  it('is for finished runs', async () => {
    const waiting = await createRun(db, await measured(), { requestedBy: authorId, finished: false });
    await db('run_state').where({ run_id: waiting.id }).update({ state: 'cancelled', ended_at: db.fn.now() });
    const answer = await geophysicist.post(`/runs/${waiting.id}/recomputation`);
    expect(answer.body).toMatchObject({
      status: 409,
      code: 'wrong-state',
      detail: 'Only a finished run can be computed again; this one was cancelled.',
    });
  });

  const storedResult = async (runId: string) =>
    (
      await db('run_state')
        .join('computation', 'computation.id', 'run_state.computation_id')
        .where({ run_id: runId })
        .first('computation.result')
    ).result;
});

describe('cancelling', () => {
  it('tells what a run that has ended became', async () => {
    const run = await finished(await asked(await measured(), { ...THREE, seed: 31 }));
    const answer = await geophysicist.put(`/runs/${run.id}/cancellation`);
    expect(answer.body).toMatchObject({ status: 409, code: 'wrong-state' });
    expect(answer.body.detail).toContain('this one has finished');
  });

  it('is the same answer when it is asked twice', async () => {
    const waiting = await createRun(db, await measured(), { requestedBy: authorId, finished: false });
    for (const ask of [1, 2]) {
      const answer = await geophysicist.put(`/runs/${waiting.id}/cancellation`);
      expect([ask, answer.status, answer.body.state]).toEqual([ask, 200, 'cancelled']);
    }
  });
});

describe('the note of a run', () => {
  it('is kept beside the run, guarded by its version', async () => {
    const run = await createRun(db, await measured(), { requestedBy: authorId });
    const path = `/runs/${run.id}/note`;
    const first = await geophysicist.patch(path, { label: 'wet top', pinned: true }, 1);
    expect(first.body.note).toEqual({ label: 'wet top', note: '', pinned: true, version: 2 });
    const stale = await geophysicist.patch(path, { note: 'Other.' }, 1);
    expect(stale.body).toMatchObject({ status: 409, current: { note: { label: 'wet top', version: 2 } } });
    const second = await geophysicist.patch(path, { note: 'Mine.' }, 2);
    expect(second.body.note).toEqual({ label: 'wet top', note: 'Mine.', pinned: true, version: 3 });
  });
});

describe('run events', () => {
  it('tell the runs that are there, then every change up to the end', async () => {
    const soundingId = await measured();
    const before = await createRun(db, soundingId, { requestedBy: authorId });
    const stream = await openStream(geophysicist, soundingId);
    expect(stream.response.headers['content-type']).toMatch('text/event-stream');
    await stream.until((runs) => runs.some((run) => run.id === before.id));
    const run = await asked(soundingId, { ...THREE, seed: 41 });
    const states = (
      await stream.until((runs) => runs.some((one) => one.id === run.id && one.endedAt !== null))
    )
      .filter((one) => one.id === run.id)
      .map((one) => one.state);
    expect(states.at(-1)).toBe('finished');
    // a quick worker may be further on before the first change is read, but never back
    const course = ['queued', 'running', 'finished'];
    expect(states).toEqual(states.toSorted((a, b) => course.indexOf(a) - course.indexOf(b)));
    stream.response.destroy();
  });

  it('tell that an interpretation stands on a run, and that it was discarded', async () => {
    const soundingId = await measured();
    const run = await createRun(db, soundingId, { requestedBy: authorId });
    const stream = await openStream(geophysicist, soundingId);
    await stream.until((runs) => runs.length > 0);
    const made = await geophysicist.post(`/soundings/${soundingId}/interpretations`, {
      runId: run.id,
      title: 'Sand',
    });
    await stream.until((runs) => runs.at(-1)?.interpretedAs === 'draft');
    expect(await geophysicist.delete(`/interpretations/${made.body.id}`)).toMatchObject({ status: 204 });
    await stream.until((runs) => runs.at(-1)?.interpretedAs === null);
    stream.response.destroy();
  });

  it('say nothing of other soundings', async () => {
    const [here, there] = [await measured(), await measured()];
    const stream = await openStream(geophysicist, here);
    await finished(await asked(there, { ...THREE, seed: 42 }));
    const mine = await asked(here, { ...THREE, seed: 43 });
    const heard = await stream.until((runs) => runs.some((run) => run.id === mine.id));
    expect(new Set(heard.map((run) => run.soundingId))).toEqual(new Set([here]));
    stream.response.destroy();
  });

  it('tell nothing more to a person who is no longer a member, and end', { timeout: 30_000 }, async () => {
    const soundingId = await measured();
    const leaver = await server.signInAs('guest', survey.id);
    const stream = await openStream(leaver, soundingId);
    await db('survey_member')
      .where({ user_id: leaver.user?.id ?? '' })
      .delete();
    const run = await asked(soundingId, { ...THREE, seed: 44 });
    await stream.ended;
    expect(stream.heard.map((one) => one.id)).not.toContain(run.id);
  });

  it('end after a sign-out everywhere', { timeout: 30_000 }, async () => {
    const leaver = await server.signInAs('guest', survey.id);
    const stream = await openStream(leaver, await measured());
    expect(await leaver.delete('/sessions')).toMatchObject({ status: 204 });
    await stream.ended;
  });
});

/** Hears the run events of a sounding over a real connection. */
async function openStream(client: Client, soundingId: string) {
  const cookie = (await server.services.sessions.create(client.user?.id ?? '', 'vitest')).split(';')[0];
  const { port } = web.address() as AddressInfo;
  const url = `http://127.0.0.1:${port}/api/v1/soundings/${soundingId}/run-events`;
  const response = await new Promise<IncomingMessage>((resolve, reject) => {
    get(url, { headers: { cookie } }, resolve).on('error', reject);
  });
  const heard: RunSummary[] = [];
  let buffer = '';
  response.setEncoding('utf8').on('data', (text: string) => {
    const parts = (buffer + text).split('\n\n');
    buffer = parts.pop() ?? '';
    for (const part of parts) {
      const data = /^event: run\ndata: (.*)$/.exec(part)?.[1];
      if (data) heard.push(runSummarySchema.parse(JSON.parse(data)));
    }
  });
  const ended = new Promise<void>((resolve) => response.on('close', resolve));
  const until = async (reached: (runs: RunSummary[]) => boolean): Promise<RunSummary[]> => {
    for (let tries = 0; tries < 300; tries++) {
      if (reached(heard)) return heard;
      await delay(50);
    }
    throw new Error(`not heard; only ${JSON.stringify(heard.map((run) => run.state))}`);
  };
  return { response, heard, ended, until };
}
