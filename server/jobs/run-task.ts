import { setTimeout as delay } from 'node:timers/promises';
import type { Logger } from 'pino';
import { z } from 'zod';
import { ENGINE_VERSION } from '../../inversion/index';
import { fitResultSchema } from '../contract/fit-result';
import { errorOfPostgres } from '../errors';
import type { FitPool } from './fit-pool';
import type { ProgressReport } from './fit-progress';
import type { FitAnswer } from './fit-thread';
import { lostLeases } from './lost-leases';
import {
  failRun,
  finishFromCache,
  giveBackRun,
  storeResult,
  takeRun,
  writeProgress,
  type LeaseServices,
  type RunLease,
} from './run-lease';

export interface RunTaskServices extends LeaseServices {
  readonly log: Logger;
  readonly fits: FitPool;
}

const payloadSchema = z.object({ runId: z.string() });
const STORE_PATIENCE_MS = 120_000;
const STORE_RETRY_MS = 500;

/** Why a computation was broken off. */
type Ending = 'lost' | 'stopping';

interface Computing {
  readonly lease: RunLease;
  readonly abort: AbortController;
}

export interface RunTask {
  /** One job of the queue, done when it returns. */
  perform(payload: unknown, workerId: string): Promise<void>;
  /** The run is no longer to be computed here: it was cancelled, or given to another. */
  drop(runId: string): void;
  /** Looks up whether what is being computed is still wanted. */
  recheck(): Promise<void>;
  /** Gives back what is being computed and takes nothing more. */
  stop(): void;
}

export function createRunTask(services: RunTaskServices): RunTask {
  const { db, jobs, fits, log } = services;
  const computing = new Map<string, Computing>();
  let stopping = false;

  const compute = async (lease: RunLease, abort: AbortController): Promise<void> => {
    if (lease.engineVersion !== ENGINE_VERSION)
      return failRun(
        services,
        lease,
        `The run was asked of engine ${lease.engineVersion}; this worker has ${ENGINE_VERSION}. Ask again.`,
      );
    if (!lease.recomputesRunId && (await finishFromCache(services, lease))) return;
    const reports = progressWriter(services, lease, abort);
    const answer = await fits.compute(lease.input, abort.signal, reports.take).finally(reports.end);
    await storeAnswer(services, lease, answer, abort.signal);
  };

  return {
    async perform(payload, workerId) {
      const { runId } = payloadSchema.parse(payload);
      if (stopping) return db.transaction((trx) => jobs.enqueueRun(trx, runId));
      const lease = await takeRun(services, workerId, runId);
      if (!lease) return;
      const abort = new AbortController();
      const entry = { lease, abort };
      computing.get(runId)?.abort.abort('lost' satisfies Ending);
      computing.set(runId, entry);
      if (stopping) abort.abort('stopping' satisfies Ending);
      try {
        await compute(lease, abort);
      } catch (error) {
        if (abort.signal.reason === 'stopping') await giveBackRun(services, lease);
        else if (abort.signal.aborted) log.info({ runId }, 'broke off a run that is no longer wanted here');
        else if (isDatabaseLost(error)) throw error;
        else {
          log.error({ err: error, runId }, 'a run could not be computed');
          await failRun(services, lease, 'The computation met a fault on our side; it has been logged.');
        }
      } finally {
        if (computing.get(runId) === entry) computing.delete(runId);
      }
    },
    drop(runId) {
      computing.get(runId)?.abort.abort('lost' satisfies Ending);
    },
    async recheck() {
      const entries = [...computing.values()];
      const lost = await lostLeases(
        db,
        entries.map(({ lease }) => lease),
      );
      for (const { lease, abort } of entries) if (lost.has(lease.runId)) abort.abort('lost' satisfies Ending);
    },
    stop() {
      stopping = true;
      for (const { abort } of computing.values()) abort.abort('stopping' satisfies Ending);
    },
  };
}

const isDatabaseLost = (error: unknown): boolean => errorOfPostgres(error)?.code === 'unavailable';

/** A result is worth keeping through a restart of the database, so storing waits for it. */
async function storeAnswer(
  services: RunTaskServices,
  lease: RunLease,
  answer: FitAnswer,
  signal: AbortSignal,
): Promise<void> {
  if ('refusal' in answer) return failRun(services, lease, answer.refusal);
  const result = fitResultSchema.parse(answer.result);
  const giveUpAt = Date.now() + STORE_PATIENCE_MS;
  for (;;) {
    try {
      const stored = await storeResult(services, lease, result, answer.durationMs);
      if (!stored) services.log.info({ runId: lease.runId }, 'dropped a result that came too late');
      return;
    } catch (error) {
      if (!isDatabaseLost(error) || Date.now() > giveUpAt) throw error;
      await delay(STORE_RETRY_MS, undefined, { signal });
    }
  }
}

/** Writes the latest report, one at a time; reports that come while one is being written replace each other. */
function progressWriter(services: RunTaskServices, lease: RunLease, abort: AbortController) {
  let latest: ProgressReport | null = null;
  let writing = false;
  let ended = false;
  const write = async (): Promise<void> => {
    writing = true;
    while (latest && !ended) {
      const { share, text } = latest;
      latest = null;
      const held = await writeProgress(services, lease, share, text).catch((error: unknown) => {
        services.log.debug({ err: error, runId: lease.runId }, 'progress could not be written');
        return true;
      });
      if (!held) abort.abort('lost' satisfies Ending);
    }
    writing = false;
  };
  return {
    take: (report: ProgressReport): void => {
      latest = report;
      if (!writing) void write();
    },
    end: (): void => {
      ended = true;
    },
  };
}
