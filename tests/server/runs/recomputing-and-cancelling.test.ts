import { describe, expect, it } from 'vitest';
import { ENGINE_VERSION } from '../../../inversion/index';
import { runSchema } from '../../../server/contract/runs';
import { createRun } from '../../setup/run-factory';
import { createRunServer, startWorkerHere, THREE } from '../../setup/run-server';

const { server, db, geophysicist, authorId, measured, asked, finished } = await createRunServer();
startWorkerHere(server);

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
