import type { Knex } from 'knex';
import { RUN_TASK, runJobKey, WORKER_SILENCE_S, type JobQueue } from './job-queue';
import { PROCESS_PLACE } from './process-place';
import type { RunEvents } from './run-events';

const KEEP_HEARTBEATS = '10 minutes';

/** Says that this worker lives. `host` names where its process runs, and the process there. */
export async function beat(db: Knex, workerId: string): Promise<void> {
  await db('worker_heartbeat')
    .insert({ worker_id: workerId, host: `${PROCESS_PLACE}/${process.pid}` })
    .onConflict('worker_id')
    .merge({ seen_at: db.fn.now() });
}

export async function endBeat(db: Knex, workerId: string): Promise<void> {
  await db('worker_heartbeat').where({ worker_id: workerId }).delete();
}

/** Frees at once what workers here held whose process is gone; of those elsewhere, only silence tells. */
export async function freeOwnEarlierLives(db: Knex): Promise<string[]> {
  const rows = await db('worker_heartbeat')
    .whereRaw('starts_with(host, ?)', [`${PROCESS_PLACE}/`])
    .select<{ worker_id: string; host: string }[]>('worker_id', 'host');
  const gone = rows
    .filter(({ host }) => !isAlive(Number(host.slice(PROCESS_PLACE.length + 1))))
    .map((row) => row.worker_id);
  await freeWorkers(db, gone);
  return gone;
}

export async function freeWorkers(db: Knex, workerIds: string[]): Promise<void> {
  if (workerIds.length === 0) return;
  await db.raw('SELECT graphile_worker.force_unlock_workers(?::text[])', [workerIds]);
  await db('worker_heartbeat').whereIn('worker_id', workerIds).delete();
}

function isAlive(pid: number): boolean {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return error instanceof Error && 'code' in error && error.code === 'EPERM';
  }
}

/**
 * Frees the jobs of workers that fell silent, on any machine. Just after a start of PostgreSQL everybody looks silent, so
 * nobody is judged before its time.
 */
export async function freeSilentWorkers(db: Knex): Promise<string[]> {
  const { rows } = (await db.raw(
    `SELECT DISTINCT job.locked_by
     FROM graphile_worker.jobs AS job
     LEFT JOIN worker_heartbeat AS heart
       ON heart.worker_id = job.locked_by AND heart.seen_at > now() - make_interval(secs => :silence)
     WHERE job.locked_by IS NOT NULL AND heart.worker_id IS NULL
       AND job.locked_at < now() - make_interval(secs => :silence)
       AND pg_postmaster_start_time() < now() - make_interval(secs => :silence)`,
    { silence: WORKER_SILENCE_S },
  )) as { rows: { locked_by: string }[] };
  const silent = rows.map((row) => row.locked_by);
  await freeWorkers(db, silent);
  await db('worker_heartbeat')
    .where('seen_at', '<', db.raw('now() - ?::interval', [KEEP_HEARTBEATS]))
    .delete();
  return silent;
}

interface StrandedRun {
  run_id: string;
  sounding_id: string;
  attempts: number | null;
}

/** Open runs that no job stands behind any more are queued again; those whose job lost worker after worker are given up. */
export async function rescueStrandedRuns(db: Knex, jobs: JobQueue, runEvents: RunEvents): Promise<void> {
  await db.transaction(async (trx) => {
    const { rows } = (await trx.raw(
      `SELECT state.run_id, run.sounding_id, job.attempts
       FROM run_state AS state
       JOIN run ON run.id = state.run_id
       LEFT JOIN graphile_worker.jobs AS job ON job.key = ? || state.run_id::text
       WHERE state.state IN ('queued', 'running')
         AND (job.id IS NULL OR (job.attempts >= job.max_attempts AND job.locked_at IS NULL))
       FOR UPDATE OF state SKIP LOCKED`,
      [runJobKey('')],
    )) as { rows: StrandedRun[] };
    for (const { run_id: runId, sounding_id: soundingId, attempts } of rows) {
      if (attempts === null) {
        await jobs.enqueueRun(trx, runId);
        continue;
      }
      await trx('run_state')
        .where({ run_id: runId })
        .update({
          state: 'failed',
          ended_at: trx.fn.now(),
          error_message: `The worker was lost ${attempts} times while it computed this run. Ask again with fewer layers.`,
        });
      await runEvents.publish(trx, { soundingId, runId, state: 'failed' });
    }
    await trx.raw(
      `SELECT graphile_worker.complete_jobs(array_agg(id)) FROM graphile_worker.jobs
       WHERE task_identifier = ? AND locked_at IS NULL AND attempts >= max_attempts HAVING count(*) > 0`,
      [RUN_TASK],
    );
  });
}
