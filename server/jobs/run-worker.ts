import { EventEmitter } from 'node:events';
import { setTimeout as delay } from 'node:timers/promises';
import { run, type Runner, type WorkerEvents } from 'graphile-worker';
import type { Knex } from 'knex';
import type { Pool } from 'pg';
import type { Logger } from 'pino';
import {
  beat,
  endBeat,
  freeOwnEarlierLives,
  freeSilentWorkers,
  freeWorkers,
  rescueStrandedRuns,
} from './dead-workers';
import { createFitPool } from './fit-pool';
import { createJobQueue, RUN_TASK } from './job-queue';
import { createOutageLog } from './outage-log';
import { queueLog } from './queue-log';
import { createRunEvents } from './run-events';
import { createRunTask, type RunTask } from './run-task';

export interface RunWorkerOptions {
  readonly db: Knex;
  readonly pool: Pool;
  readonly log: Logger;
  /** fits computed at the same time */
  readonly threads: number;
  readonly threadFile: string;
}

export interface RunWorker {
  /** Gives back what is being computed, so that another worker takes it up at once. */
  stop(): Promise<void>;
}

const BEAT_MS = 1000;
const POLL_MS = 1000;
const RESTART_MS = 1000;

/** Takes runs from the queue and computes them until stopped; a lost database only makes it wait. */
export function startRunWorker({ db, pool, log, threads, threadFile }: RunWorkerOptions): RunWorker {
  const jobs = createJobQueue(pool);
  const runEvents = createRunEvents(pool, log);
  const fits = createFitPool(threadFile, threads);
  const task = createRunTask({ db, jobs, runEvents, log, fits });
  const stop = new AbortController();
  const own: { id: string | null } = { id: null };
  const taken = createOutageLog(log, 'taking runs from the queue');
  const watched = createOutageLog(log, 'watching over runs and workers');

  const unsubscribe = runEvents.subscribe(null, {
    changed: ({ runId, state }) => state === 'cancelled' && task.drop(runId),
    missed: () => void task.recheck().catch((error: unknown) => log.debug({ err: error }, 'recheck failed')),
  });

  const takeJobs = async (): Promise<void> => {
    await freeOwnEarlierLives(db);
    const runner = await launchRunner(pool, log, threads, task, own);
    taken.worked();
    const halt = () => void runner.stop().catch(() => undefined);
    stop.signal.addEventListener('abort', halt);
    if (stop.signal.aborted) halt();
    try {
      await runner.promise;
    } finally {
      stop.signal.removeEventListener('abort', halt);
    }
  };

  const watch = async (): Promise<void> => {
    if (own.id) await beat(db, own.id);
    await task.recheck();
    const silent = await freeSilentWorkers(db);
    if (silent.length > 0) log.warn({ silent }, 'freed the jobs of workers that fell silent');
    await rescueStrandedRuns(db, jobs, runEvents);
  };

  const taking = repeat(stop.signal, RESTART_MS, async () => {
    await takeJobs().catch((error: unknown) => taken.failed(error));
    const { id } = own;
    own.id = null;
    if (id && !stop.signal.aborted) await freeWorkers(db, [id]).catch(() => undefined);
  });
  const watching = repeat(stop.signal, BEAT_MS, () =>
    watch().then(
      () => watched.worked(),
      (error: unknown) => watched.failed(error),
    ),
  );

  return {
    async stop() {
      const { id } = own;
      task.stop();
      stop.abort();
      await Promise.all([taking, watching]);
      unsubscribe();
      if (id) await endBeat(db, id).catch(() => undefined);
      await Promise.all([runEvents.close(), fits.close()]);
    },
  };
}

async function repeat(signal: AbortSignal, everyMs: number, act: () => Promise<void>): Promise<void> {
  while (!signal.aborted) {
    await act();
    await delay(everyMs, undefined, { signal }).catch(() => undefined);
  }
}

/** The queue names each of its pools anew; `own.id` is told before the first job is taken. */
function launchRunner(
  pgPool: Pool,
  log: Logger,
  concurrency: number,
  task: RunTask,
  own: { id: string | null },
): Promise<Runner> {
  const events: WorkerEvents = new EventEmitter();
  events.once('pool:create', ({ workerPool }) => (own.id = workerPool.id));
  return run({
    pgPool,
    concurrency,
    events,
    logger: queueLog(log),
    noHandleSignals: true,
    pollInterval: POLL_MS,
    // Unbatched, a job that cannot be ended for want of a database would be an unhandled rejection.
    preset: { worker: { completeJobBatchDelay: 0, failJobBatchDelay: 0 } },
    taskList: { [RUN_TASK]: (payload) => task.perform(payload, own.id ?? '') },
  });
}
