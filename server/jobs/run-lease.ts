import { createHash } from 'node:crypto';
import canonicalize from 'canonicalize';
import type { Knex } from 'knex';
import { ENGINE_VERSION } from '../../inversion/index';
import type { FitResult } from '../contract/fit-result';
import type { RunInput } from '../contract/runs';
import { compareWithFirst } from './compare-with-first';
import type { JobQueue } from './job-queue';
import type { RunEvents } from './run-events';

/**
 * A worker's claim on a run. Each taking counts the attempt up, so what an earlier holder still sends (a worker taken for
 * dead that comes back, a run cancelled meanwhile) changes nothing.
 */
export interface RunLease {
  readonly runId: string;
  readonly soundingId: string;
  readonly workerId: string;
  readonly attempt: number;
  readonly input: RunInput;
  readonly computationKey: string;
  readonly engineVersion: string;
  readonly recomputesRunId: string | null;
}

export interface LeaseServices {
  readonly db: Knex;
  readonly jobs: JobQueue;
  readonly runEvents: RunEvents;
}

/** Takes a queued run, or one whose worker was lost; null when it has ended meanwhile. */
export function takeRun(
  { db, runEvents }: LeaseServices,
  workerId: string,
  runId: string,
): Promise<RunLease | null> {
  return db.transaction(async (trx) => {
    const [taken] = await trx('run_state')
      .where({ run_id: runId })
      .whereIn('state', ['queued', 'running'])
      .update({
        state: 'running',
        worker_id: workerId,
        attempt: trx.raw('attempt + 1'),
        progress: 0,
        progress_text: '',
        started_at: trx.fn.now(),
      })
      .returning<{ attempt: number }[]>('attempt');
    if (!taken) return null;
    const run = await trx('run').where({ id: runId }).first();
    await runEvents.publish(trx, { soundingId: run.sounding_id, runId, state: 'running' });
    return {
      runId,
      soundingId: run.sounding_id,
      workerId,
      attempt: taken.attempt,
      input: run.input,
      computationKey: run.computation_key,
      engineVersion: run.engine_version,
      recomputesRunId: run.recomputes_run_id,
    };
  });
}

const heldBy = (lease: RunLease) => ({
  run_id: lease.runId,
  state: 'running',
  worker_id: lease.workerId,
  attempt: lease.attempt,
});

/** False when the run is no longer this lease's: the work can stop. */
export function writeProgress(
  { db, runEvents }: LeaseServices,
  lease: RunLease,
  share: number,
  text: string,
): Promise<boolean> {
  return db.transaction(async (trx) => {
    const rows = await trx('run_state')
      .where(heldBy(lease))
      .update({ progress: trx.raw('greatest(progress, ?)', [share]), progress_text: text });
    if (rows === 0) return false;
    await runEvents.publish(trx, { soundingId: lease.soundingId, runId: lease.runId, state: 'running' });
    return true;
  });
}

export const resultHash = (result: FitResult): string =>
  createHash('sha256')
    .update(canonicalize(result) ?? '')
    .digest('hex');

/** Stores a result and ends the run, both or neither; false when the run was no longer this lease's. */
export function storeResult(
  { db, runEvents }: LeaseServices,
  lease: RunLease,
  result: FitResult,
  durationMs: number,
): Promise<boolean> {
  return db.transaction(async (trx) => {
    if (!(await trx('run_state').where(heldBy(lease)).forUpdate().first('run_id'))) return false;
    const [computation] = await trx('computation')
      .insert({
        key: lease.computationKey,
        engine_version: ENGINE_VERSION,
        input: JSON.stringify(lease.input),
        result: JSON.stringify(result),
        result_hash: resultHash(result),
        duration_ms: durationMs,
      })
      .returning<{ id: string }[]>('id');
    const comparison = lease.recomputesRunId
      ? await compareWithFirst(trx, lease.recomputesRunId, result)
      : null;
    await endRun(trx, runEvents, lease, {
      state: 'finished',
      progress: 1,
      computation_id: computation?.id,
      comparison: comparison && JSON.stringify(comparison),
    });
    return true;
  });
}

/** Ends the run with an earlier computation of the same key, where there is one. A recomputation never asks. */
export function finishFromCache({ db, runEvents }: LeaseServices, lease: RunLease): Promise<boolean> {
  return db.transaction(async (trx) => {
    const earlier = await trx('computation')
      .where({ key: lease.computationKey })
      .orderBy('created_at')
      .first<{ id: string } | undefined>('id');
    if (!earlier) return false;
    await endRun(trx, runEvents, lease, {
      state: 'finished',
      progress: 1,
      computation_id: earlier.id,
      from_cache: true,
    });
    return true;
  });
}

/** `message` is a sentence for the person who asked. */
export async function failRun(services: LeaseServices, lease: RunLease, message: string): Promise<void> {
  await services.db.transaction((trx) =>
    endRun(trx, services.runEvents, lease, { state: 'failed', error_message: message }),
  );
}

interface Ending {
  state: 'finished' | 'failed';
  progress?: number;
  computation_id?: string | undefined;
  comparison?: string | null;
  from_cache?: boolean;
  error_message?: string;
}

async function endRun(trx: Knex, runEvents: RunEvents, lease: RunLease, ending: Ending): Promise<void> {
  const rows = await trx('run_state')
    .where(heldBy(lease))
    .update({ ...ending, progress_text: '', ended_at: trx.fn.now() });
  if (rows > 0)
    await runEvents.publish(trx, {
      soundingId: lease.soundingId,
      runId: lease.runId,
      state: ending.state,
    });
}

/** A worker that stops hands its run back; a fresh job makes another worker take it up at once. */
export async function giveBackRun(
  { db, jobs, runEvents }: LeaseServices,
  { runId, soundingId, ...lease }: RunLease,
): Promise<void> {
  await db.transaction(async (trx) => {
    const rows = await trx('run_state')
      .where(heldBy({ runId, soundingId, ...lease }))
      .update({ state: 'queued', worker_id: null, progress: 0, progress_text: '', started_at: null });
    if (rows === 0) return;
    await jobs.enqueueRun(trx, runId);
    await runEvents.publish(trx, { soundingId, runId, state: 'queued' });
  });
}
