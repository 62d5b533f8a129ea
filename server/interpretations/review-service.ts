import type { Knex } from 'knex';
import type { z } from 'zod';
import { recordAudit } from '../access/audit';
import { surveyCan, type SurveyAction } from '../access/policy';
import { requireCan } from '../access/survey-access';
import type { createReviewEventSchema, Interpretation } from '../contract/interpretations';
import { AppError } from '../errors';
import type { Work } from '../http/context';
import { announceRun } from './announce-run';
import { decideRefusal, MOVES, STATE_WORDS, type Move } from './interpretation-rules';
import { presentBed, presentInterpretation } from './interpretations-presenter';
import { addContributor, getInterpretation, type WholeInterpretation } from './interpretations-store';
import { findAccepted, getFrozenRun, holdSoundingOf, insertEvent, setState } from './review-store';

type EventInput = z.output<typeof createReviewEventSchema>;

const NEEDS: Record<EventInput['kind'], SurveyAction> = {
  submitted: 'submit',
  withdrawn: 'submit',
  'changes-asked': 'decide',
  accepted: 'decide',
  commented: 'comment',
};

const MOVE_WORDS: Record<Move, string> = {
  submitted: 'submitted',
  withdrawn: 'withdrawn',
  'changes-asked': 'sent back',
  accepted: 'accepted',
};

/** A comment, or a move of the interpretation from one state to the next. */
export async function addReviewEvent(
  context: Work,
  interpretationId: string,
  input: EventInput,
): Promise<Interpretation> {
  const { db, actor } = context;
  return db.transaction(async (trx) => {
    const seen = await getInterpretation(trx, actor, interpretationId);
    requireCan({ role: seen.row.role, can: surveyCan(seen.row.role) }, NEEDS[input.kind]);
    await holdSoundingOf(trx, interpretationId);
    const whole = await getInterpretation(trx, actor, interpretationId);
    if (input.version !== undefined && input.version !== whole.row.version)
      throw new AppError('conflict', 'This interpretation changed after you read it. Read it again first.', {
        current: presentInterpretation(actor, whole),
      });
    if (input.kind === 'commented') await insertEvent(trx, eventOf(context, interpretationId, input));
    else await move(context, trx, whole, input.kind, input);
    return presentInterpretation(actor, await getInterpretation(trx, actor, interpretationId));
  });
}

const eventOf = ({ actor }: Work, interpretationId: string, { kind, comment }: EventInput) => ({
  interpretationId,
  kind,
  comment,
  actorId: actor.userId,
});

async function move(
  context: Work,
  trx: Knex,
  whole: WholeInterpretation,
  kind: Move,
  input: EventInput,
): Promise<void> {
  const { actor } = context;
  const { id, state, survey_id: surveyId, sounding_id: soundingId, run_id: runId, title } = whole.row;
  const refusal = NEEDS[kind] === 'decide' ? decideRefusal(actor, whole) : null;
  if (refusal) throw new AppError('forbidden', refusal);
  if (!MOVES[kind].from.includes(state))
    throw new AppError('wrong-state', `It cannot be ${MOVE_WORDS[kind]}: ${STATE_WORDS[state]}.`);
  if (kind === 'submitted') await addContributor(trx, id, actor.userId);
  if (kind === 'accepted') await supersedeAccepted(context, trx, soundingId);
  await setState(trx, id, MOVES[kind].to);
  await insertEvent(trx, {
    ...eventOf(context, id, input),
    ...(kind === 'submitted' && { snapshot: await snapshotOf(trx, whole) }),
  });
  await recordAudit(trx, {
    actorId: actor.userId,
    surveyId,
    action: `interpretation.${kind}`,
    subject: title,
    details: { soundingId, interpretationId: id },
  });
  await announceRun(context, trx, soundingId, runId);
}

/** The whole statement and the run it stands on, as the reviewer gets to see them. */
async function snapshotOf(trx: Knex, { row, beds }: WholeInterpretation): Promise<object> {
  return {
    title: row.title,
    narrative: row.narrative,
    waterLevelDepthM: row.water_level_depth_m,
    authorId: row.author_id,
    beds: beds.map(presentBed),
    run: await getFrozenRun(trx, row.run_id),
  };
}

async function supersedeAccepted(context: Work, trx: Knex, soundingId: string): Promise<void> {
  const older = await findAccepted(trx, soundingId);
  if (!older) return;
  await setState(trx, older.id, 'superseded');
  await insertEvent(trx, {
    interpretationId: older.id,
    kind: 'superseded',
    actorId: context.actor.userId,
    comment: '',
  });
  await announceRun(context, trx, soundingId, older.run_id);
}
