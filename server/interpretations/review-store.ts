import type { Knex } from 'knex';
import type { InterpretationState, ReviewEvent } from '../contract/interpretations';

/** Makes decisions on one sounding wait for each other. */
export async function holdSoundingOf(trx: Knex, interpretationId: string): Promise<void> {
  await trx('sounding')
    .join('interpretation', 'interpretation.sounding_id', 'sounding.id')
    .where('interpretation.id', interpretationId)
    .forNoKeyUpdate('sounding', 'interpretation')
    .first('sounding.id');
}

export async function setState(
  trx: Knex,
  interpretationId: string,
  state: InterpretationState,
): Promise<void> {
  await trx('interpretation')
    .where({ id: interpretationId })
    .update({ state, version: trx.raw('version + 1'), updated_at: trx.fn.now() });
}

/** What stood accepted for this sounding, to be superseded. */
export async function findAccepted(
  trx: Knex,
  soundingId: string,
): Promise<{ id: string; run_id: string } | null> {
  const row = await trx('interpretation')
    .where({ sounding_id: soundingId, state: 'accepted' })
    .first<{ id: string; run_id: string } | undefined>('id', 'run_id');
  return row ?? null;
}

export async function insertEvent(
  trx: Knex,
  event: {
    interpretationId: string;
    kind: ReviewEvent['kind'];
    actorId: string;
    comment: string;
    snapshot?: object;
  },
): Promise<void> {
  await trx('review_event').insert({
    interpretation_id: event.interpretationId,
    kind: event.kind,
    actor_id: event.actorId,
    comment: event.comment,
    snapshot: event.snapshot ? JSON.stringify(event.snapshot) : null,
  });
}

/** The run as a submission freezes it beside the statement. */
export async function getFrozenRun(trx: Knex, runId: string): Promise<object> {
  return trx('run')
    .join('run_state', 'run_state.run_id', 'run.id')
    .join('computation', 'computation.id', 'run_state.computation_id')
    .join('data_revision', 'data_revision.id', 'run.revision_id')
    .where('run.id', runId)
    .first(
      'run.id as runId',
      'run.number as runNumber',
      'run.revision_id as revisionId',
      'data_revision.content_hash as revisionContentHash',
      'run.computation_key as computationKey',
      'run.engine_version as engineVersion',
      'run.input',
      'computation.result',
      'computation.result_hash as resultHash',
    ) as Promise<object>;
}
