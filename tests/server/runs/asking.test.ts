import { describe, expect, it } from 'vitest';
import { ENGINE_VERSION } from '../../../inversion/index';
import type { RunSummary } from '../../../server/contract/runs';
import { threeLayerReadings } from '../../setup/factories';
import { createRunServer, startWorkerHere, THREE } from '../../setup/run-server';

const { server, db, survey, geophysicist, authorId, measured, ask, asked, finished } =
  await createRunServer();
startWorkerHere(server);

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
