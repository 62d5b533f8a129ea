import type { Knex } from 'knex';
import type { Pool } from 'pg';

export const RUN_TASK = 'compute-run';
/** A worker not heard of for this long is taken for dead. */
export const WORKER_SILENCE_S = 5;
/** Lost workers that one run may outlive before it is given up. */
export const RUN_MAX_ATTEMPTS = 8;

export interface QueueHealth {
  readonly liveWorkers: number;
  readonly openRuns: number;
}

/** The door to the queue: jobs are added in the caller's transaction, so a run and its job stand or fall together. */
export interface JobQueue {
  enqueueRun(trx: Knex, runId: string): Promise<void>;
  /** Takes a run's job out again; one that a worker holds is left to that worker. */
  dropRun(trx: Knex, runId: string): Promise<void>;
  health(): Promise<QueueHealth>;
}

export const runJobKey = (runId: string): string => `run:${runId}`;

export function createJobQueue(pool: Pool): JobQueue {
  return {
    async enqueueRun(trx, runId) {
      await trx.raw(
        'SELECT graphile_worker.add_job(identifier => ?, payload => ?::json, job_key => ?, max_attempts => ?)',
        [RUN_TASK, JSON.stringify({ runId }), runJobKey(runId), RUN_MAX_ATTEMPTS],
      );
    },
    async dropRun(trx, runId) {
      await trx.raw('SELECT graphile_worker.remove_job(?)', [runJobKey(runId)]);
    },
    async health() {
      const { rows } = await pool.query<{ live: number; open: number }>(
        `SELECT (SELECT count(*)::int FROM worker_heartbeat
                 WHERE seen_at > now() - make_interval(secs => $1)) AS live,
                (SELECT count(*)::int FROM run_state WHERE state IN ('queued', 'running')) AS open`,
        [WORKER_SILENCE_S],
      );
      return { liveWorkers: rows[0]?.live ?? 0, openRuns: rows[0]?.open ?? 0 };
    },
  };
}
