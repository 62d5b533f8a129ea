import type { z } from 'zod';
import { hasCells } from '../../inversion';
import type { Actor } from '../access/actor';
import { recordAudit } from '../access/audit';
import { getSoundingAccess, requireCan } from '../access/survey-access';
import { surveyCan } from '../access/policy';
import type {
  createInterpretationSchema,
  Interpretation,
  InterpretationBed,
  updateInterpretationSchema,
} from '../contract/interpretations';
import { AppError, changedMeanwhile } from '../errors';
import type { Work } from '../http/context';
import { announceRun } from './announce-run';
import { discardRefusal, editRefusal, EDITABLE, STATE_WORDS } from './interpretation-rules';
import { presentInterpretation } from './interpretations-presenter';
import {
  addContributor,
  deleteInterpretation,
  findRunOfSounding,
  getInterpretation,
  insertInterpretation,
  listInterpretations,
  updateStatement,
  type WholeInterpretation,
} from './interpretations-store';
import { holdSoundingOf, insertEvent } from './review-store';

export async function listSoundingInterpretations(
  { db, actor }: Work,
  soundingId: string,
): Promise<{ items: Interpretation[] }> {
  await getSoundingAccess(db, actor, soundingId);
  const all = await listInterpretations(db, actor, soundingId);
  return { items: all.map((whole) => presentInterpretation(actor, whole)) };
}

export const showInterpretation = async (
  { db, actor }: Work,
  interpretationId: string,
): Promise<Interpretation> =>
  presentInterpretation(actor, await getInterpretation(db, actor, interpretationId));

export async function createInterpretation(
  context: Work,
  soundingId: string,
  { runId, title }: z.output<typeof createInterpretationSchema>,
): Promise<Interpretation> {
  const { db, actor } = context;
  const access = await getSoundingAccess(db, actor, soundingId);
  requireCan(access, 'interpret');
  const run = await findRunOfSounding(db, soundingId, runId);
  if (!run)
    throw new AppError('invalid', 'This run does not belong to the sounding.', {
      faults: [{ path: ['body', 'runId'], message: 'is not a run of this sounding' }],
    });
  const { result } = run;
  if (!result)
    throw new AppError('wrong-state', `Only a finished run can be interpreted; this one is ${run.state}.`);
  if (hasCells(result))
    throw new AppError('invalid', 'Cells are no beds, and an interpretation names beds; fit beds first.', {
      faults: [{ path: ['body', 'runId'], message: 'is a ground of cells, which are no beds' }],
    });
  return db.transaction(async (trx) => {
    const layers = result.earth.resistivity.length;
    const id = await insertInterpretation(trx, { soundingId, runId, authorId: actor.userId, title, layers });
    await addContributor(trx, id, actor.userId);
    await recordAudit(trx, {
      actorId: actor.userId,
      surveyId: access.surveyId,
      action: 'interpretation.created',
      subject: title,
      details: { soundingId, interpretationId: id },
    });
    await announceRun(context, trx, soundingId, runId);
    return presentInterpretation(actor, await getInterpretation(trx, actor, id));
  });
}

export async function changeInterpretation(
  { db, actor }: Work,
  interpretationId: string,
  version: number,
  change: z.output<typeof updateInterpretationSchema>,
): Promise<Interpretation> {
  return db.transaction(async (trx) => {
    const before = await getInterpretation(trx, actor, interpretationId);
    const { role, state } = before.row;
    requireCan({ role, can: surveyCan(role) }, 'interpret');
    const refusal = editRefusal(actor, before);
    if (refusal) throw new AppError('forbidden', refusal);
    if (!EDITABLE.includes(state))
      throw new AppError(
        'wrong-state',
        `It cannot be edited while ${STATE_WORDS[state]}. ${state === 'in-review' ? 'Withdraw it first, or wait for the review.' : 'Write a new one instead.'}`,
      );
    requireBedsOf(before, change.beds ?? []);
    // the version guards against a submission meanwhile too, which counts it up
    if (!(await updateStatement(trx, interpretationId, version, change)))
      throw changedMeanwhile(
        'this interpretation',
        presentInterpretation(actor, await getInterpretation(trx, actor, interpretationId)),
      );
    await addContributor(trx, interpretationId, actor.userId);
    if (beginsStretch(actor, before))
      await insertEvent(trx, { interpretationId, kind: 'edited', actorId: actor.userId, comment: '' });
    return presentInterpretation(actor, await getInterpretation(trx, actor, interpretationId));
  });
}

/** Of edits one after the other by the same person only the first becomes a line of the history. */
function beginsStretch({ userId }: Actor, { row, events }: WholeInterpretation): boolean {
  const latest = events.at(-1);
  return row.author_id !== userId && !(latest?.kind === 'edited' && latest.actor_id === userId);
}

/** Deletes a draft that nobody was ever asked to review. */
export async function discardInterpretation(context: Work, interpretationId: string): Promise<void> {
  const { db, actor } = context;
  await db.transaction(async (trx) => {
    await getInterpretation(trx, actor, interpretationId);
    // whoever edits, comments or submits at this moment is waited for, and counts
    await holdSoundingOf(trx, interpretationId);
    const whole = await getInterpretation(trx, actor, interpretationId);
    const { role, survey_id: surveyId, sounding_id: soundingId, run_id: runId, title } = whole.row;
    requireCan({ role, can: surveyCan(role) }, 'interpret');
    const refusal = discardRefusal(actor, whole);
    if (refusal) throw refusal;
    await deleteInterpretation(trx, interpretationId);
    await recordAudit(trx, {
      actorId: actor.userId,
      surveyId,
      action: 'interpretation.discarded',
      subject: title,
      details: { soundingId, interpretationId, runId },
    });
    await announceRun(context, trx, soundingId, runId);
  });
}

/** Each bed names a layer of the run, once. */
function requireBedsOf({ beds }: WholeInterpretation, given: readonly InterpretationBed[]): void {
  const seen = new Set<number>();
  const faults = given.flatMap(({ layerIndex }, position) => {
    const twice = seen.has(layerIndex);
    seen.add(layerIndex);
    if (!twice && layerIndex < beds.length) return [];
    return {
      path: ['body', 'beds', position, 'layerIndex'],
      message: twice ? 'is given twice' : 'is no layer of the run',
      found: String(layerIndex),
      allowed: `0 to ${beds.length - 1}, each once`,
    };
  });
  if (faults.length > 0) throw new AppError('invalid', 'Some beds do not fit the run.', { faults });
}
