import type { Knex } from 'knex';
import type { z } from 'zod';
import { ENGINE_VERSION } from '../../inversion/index';
import { recordAudit } from '../access/audit';
import { getSoundingAccess, requireCan, type SoundingAccess } from '../access/survey-access';
import { runLetter } from '../contract/run-letter';
import type { createRunSchema, Run, RunInput, RunSummary, updateRunNoteSchema } from '../contract/runs';
import { AppError } from '../errors';
import type { Work } from '../http/context';
import { fitReadingsOf } from '../readings/fit-readings';
import { computationKey } from './computation-key';
import { requireEnoughReadings } from './require-enough-readings';
import { presentRun, presentRunSummary } from './runs-presenter';
import { findComputation, findRunSource, holdSounding, insertRun } from './new-run-store';
import { cancelRun, getRun, listRuns, updateNote, type FullRunRow } from './runs-store';

export async function listSoundingRuns(
  { db, actor }: Work,
  soundingId: string,
): Promise<{ items: RunSummary[] }> {
  await getSoundingAccess(db, actor, soundingId);
  return { items: (await listRuns(db, actor, soundingId)).map(presentRunSummary) };
}

export const showRun = async ({ db, actor }: Work, runId: string): Promise<Run> =>
  presentRun(await getRun(db, actor, runId));

export async function requestRun(
  context: Work,
  soundingId: string,
  { revisionId, settings }: z.output<typeof createRunSchema>,
): Promise<Run> {
  const { db, actor } = context;
  const access = await getSoundingAccess(db, actor, soundingId);
  requireCan(access, 'run');
  return db.transaction(async (trx) => {
    const source = await findRunSource(trx, soundingId, revisionId);
    if (!source) throw noReadings(revisionId);
    const kept = fitReadingsOf(source.readings, source.error_floor);
    requireEnoughReadings(kept.length, source.readings.length - kept.length, settings);
    const input: RunInput = { readings: kept.map(({ reading }) => reading), settings };
    const key = computationKey(ENGINE_VERSION, input);
    const runId = await addRun(context, trx, access, {
      revisionId: source.revision_id,
      input,
      key,
      recomputes: null,
      computationId: await findComputation(trx, key),
    });
    return presentRun(await getRun(trx, actor, runId));
  });
}

const noReadings = (revisionId: string | undefined): AppError =>
  revisionId === undefined
    ? new AppError(
        'invalid',
        'This sounding has no saved readings yet. Enter or import them on its Field sheet and save.',
      )
    : new AppError('invalid', 'This revision does not belong to the sounding.', {
        faults: [{ path: ['body', 'revisionId'], message: 'is not a revision of this sounding' }],
      });

/** The same request once more, past the cache; the worker compares the two results. */
export async function requestRecomputation(context: Work, runId: string): Promise<Run> {
  const { db, actor } = context;
  const first = await getRun(db, actor, runId);
  const access = await getSoundingAccess(db, actor, first.sounding_id);
  requireCan(access, 'recompute');
  if (first.state !== 'finished')
    throw new AppError(
      'wrong-state',
      `Only a finished run can be computed again; this one ${stateWords(first)}.`,
    );
  return db.transaction(async (trx) => {
    await holdSounding(trx, first.sounding_id);
    const againId = await addRun(context, trx, access, {
      revisionId: first.revision_id,
      input: first.input,
      key: computationKey(ENGINE_VERSION, first.input),
      recomputes: first.id,
      computationId: null,
    });
    return presentRun(await getRun(trx, actor, againId));
  });
}

interface Request {
  revisionId: string;
  input: RunInput;
  key: string;
  recomputes: string | null;
  computationId: string | null;
}

async function addRun(
  { actor, jobs, runEvents }: Work,
  trx: Knex.Transaction,
  { surveyId, soundingId, soundingName }: SoundingAccess,
  request: Request,
): Promise<string> {
  const run = await insertRun(trx, {
    soundingId,
    revisionId: request.revisionId,
    input: request.input,
    computationKey: request.key,
    engineVersion: ENGINE_VERSION,
    requestedBy: actor.userId,
    recomputesRunId: request.recomputes,
    computationId: request.computationId,
  });
  if (!request.computationId) await jobs.enqueueRun(trx, run.id);
  await recordAudit(trx, {
    actorId: actor.userId,
    surveyId,
    action: request.recomputes ? 'run.recomputed' : 'run.requested',
    subject: `run ${runLetter(run.number)} of ${soundingName}`,
    details: { soundingId, runId: run.id },
  });
  await runEvents.publish(trx, {
    soundingId,
    runId: run.id,
    state: request.computationId ? 'finished' : 'queued',
  });
  return run.id;
}

const STATE_WORDS: Record<RunSummary['state'], string> = {
  queued: 'still waits',
  running: 'is still being computed',
  finished: 'has finished',
  failed: 'has failed',
  cancelled: 'was cancelled',
};
const stateWords = (run: Pick<FullRunRow, 'state'>): string => STATE_WORDS[run.state];

export async function requestCancellation(context: Work, runId: string): Promise<Run> {
  const { db, actor, jobs, runEvents } = context;
  const run = await getRun(db, actor, runId);
  const access = await getSoundingAccess(db, actor, run.sounding_id);
  requireCan(access, 'run');
  return db.transaction(async (trx) => {
    const cancelled = await cancelRun(trx, runId);
    const after = await getRun(trx, actor, runId);
    if (!cancelled) {
      if (after.state === 'cancelled') return presentRun(after);
      throw new AppError(
        'wrong-state',
        `Only a run that waits or is being computed can be cancelled; this one ${stateWords(after)}.`,
      );
    }
    await jobs.dropRun(trx, runId);
    await recordAudit(trx, {
      actorId: actor.userId,
      surveyId: access.surveyId,
      action: 'run.cancelled',
      subject: `run ${runLetter(run.number)} of ${access.soundingName}`,
      details: { soundingId: run.sounding_id, runId },
    });
    await runEvents.publish(trx, { soundingId: run.sounding_id, runId, state: 'cancelled' });
    return presentRun(after);
  });
}

export async function changeRunNote(
  { db, actor, runEvents }: Work,
  runId: string,
  version: number,
  change: z.output<typeof updateRunNoteSchema>,
): Promise<Run> {
  const run = await getRun(db, actor, runId);
  const access = await getSoundingAccess(db, actor, run.sounding_id);
  requireCan(access, 'annotateRuns');
  return db.transaction(async (trx) => {
    const changed = await updateNote(trx, runId, version, change);
    const after = await getRun(trx, actor, runId);
    if (!changed)
      throw new AppError('conflict', 'Someone else changed the note of this run meanwhile.', {
        current: presentRun(after),
      });
    await runEvents.publish(trx, { soundingId: run.sounding_id, runId, state: run.state });
    return presentRun(after);
  });
}
