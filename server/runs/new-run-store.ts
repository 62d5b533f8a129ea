import type { Knex } from 'knex';
import type { Reading } from '../contract/readings';
import type { RunInput } from '../contract/runs';

export interface RunSource {
  error_floor: number;
  revision_id: string;
  revision_number: number;
  readings: Reading[];
}

/**
 * The readings that a run would take, from a revision of this sounding or from its current one; null when there is none.
 * Holds the sounding's row, so that two requests at the same moment get two numbers.
 */
export async function findRunSource(
  trx: Knex.Transaction,
  soundingId: string,
  revisionId: string | undefined,
): Promise<RunSource | null> {
  const sounding = await trx('sounding')
    .where({ id: soundingId })
    .forNoKeyUpdate()
    .first<{ survey_id: string; current_revision_id: string | null }>('survey_id', 'current_revision_id');
  const row = await trx('data_revision')
    .join('survey', 'survey.id', trx.raw('?', [sounding.survey_id]))
    .where({ sounding_id: soundingId, 'data_revision.id': revisionId ?? sounding.current_revision_id })
    .first<RunSource | undefined>(
      'survey.error_floor',
      'data_revision.id as revision_id',
      'data_revision.number as revision_number',
      'data_revision.readings',
    );
  return row ?? null;
}

export async function holdSounding(trx: Knex.Transaction, soundingId: string): Promise<void> {
  await trx('sounding').where({ id: soundingId }).forNoKeyUpdate().first('id');
}

export interface NewRun {
  soundingId: string;
  revisionId: string;
  input: RunInput;
  computationKey: string;
  engineVersion: string;
  requestedBy: string;
  recomputesRunId: string | null;
  /** answers the run at once */
  computationId: string | null;
}

/** The caller holds the sounding's row. */
export async function insertRun(trx: Knex.Transaction, run: NewRun): Promise<{ id: string; number: number }> {
  const [made] = await trx('run')
    .insert({
      sounding_id: run.soundingId,
      number: trx.raw('(SELECT coalesce(max(number), 0) + 1 FROM run WHERE sounding_id = ?)', [
        run.soundingId,
      ]),
      revision_id: run.revisionId,
      input: JSON.stringify(run.input),
      computation_key: run.computationKey,
      engine_version: run.engineVersion,
      recomputes_run_id: run.recomputesRunId,
      requested_by: run.requestedBy,
    })
    .returning<{ id: string; number: number }[]>(['id', 'number']);
  if (!made) throw new Error('a run was not inserted');
  const answered = run.computationId !== null;
  await trx('run_state').insert({
    run_id: made.id,
    state: answered ? 'finished' : 'queued',
    progress: answered ? 1 : 0,
    from_cache: answered,
    computation_id: run.computationId,
    ended_at: answered ? trx.fn.now() : null,
  });
  await trx('run_note').insert({ run_id: made.id });
  return made;
}

export async function findComputation(knex: Knex, key: string): Promise<string | null> {
  const row = await knex('computation')
    .where({ key })
    .orderBy('created_at')
    .first<{ id: string } | undefined>('id');
  return row?.id ?? null;
}
