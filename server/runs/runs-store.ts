import type { Knex } from 'knex';
import type { z } from 'zod';
import type { Actor } from '../access/actor';
import type { FitResult } from '../contract/fit-result';
import type { FitSettings } from '../contract/fit-settings';
import type { Reading } from '../contract/readings';
import type { StandingState } from '../contract/interpretations';
import type { RunInput, RunSummary, runComparisonSchema } from '../contract/runs';
import type { SpreadType } from '../contract/spread';
import { OF_RUN_SQL, weightiestStateSql } from '../db/interpretation-weight';
import { notFound } from '../errors';

export interface RunRow {
  id: string;
  sounding_id: string;
  number: number;
  revision_id: string;
  revision_number: number;
  current_revision_id: string | null;
  settings: FitSettings;
  engine_version: string;
  computation_key: string;
  requested_by: string;
  requester_name: string;
  requested_at: Date;
  recomputes_run_id: string | null;
  state: RunSummary['state'];
  progress: number;
  progress_text: string;
  started_at: Date | null;
  ended_at: Date | null;
  from_cache: boolean;
  duration_ms: number | null;
  error_message: string | null;
  comparison: z.infer<typeof runComparisonSchema> | null;
  interpreted_as: StandingState | null;
  earth: FitResult['earth'] | null;
  fit_status: FitResult['status'] | null;
  chi2_per_reading: number | null;
  rms_percent: number | null;
  misfit_probability: number | null;
  label: string;
  note: string;
  pinned: boolean;
  note_version: number;
}

export interface FullRunRow extends RunRow {
  sounding_name: string;
  survey_id: string;
  spread_type: SpreadType;
  input: RunInput;
  revision_readings: Reading[];
  result: FitResult | null;
}

const SUMMARY_COLUMNS = [
  'run.id',
  'run.sounding_id',
  'run.number',
  'run.revision_id',
  'data_revision.number as revision_number',
  'sounding.current_revision_id',
  'run.engine_version',
  'run.computation_key',
  'run.requested_by',
  'app_user.name as requester_name',
  'run.requested_at',
  'run.recomputes_run_id',
  'run_state.state',
  'run_state.progress',
  'run_state.progress_text',
  'run_state.started_at',
  'run_state.ended_at',
  'run_state.from_cache',
  'computation.duration_ms',
  'run_state.error_message',
  'run_state.comparison',
  'run_note.label',
  'run_note.note',
  'run_note.pinned',
  'run_note.version as note_version',
];

/** Runs of surveys that the actor is a member of. */
const visibleRuns = (knex: Knex, actor: Actor) =>
  knex('run')
    .join('run_state', 'run_state.run_id', 'run.id')
    .join('run_note', 'run_note.run_id', 'run.id')
    .join('data_revision', 'data_revision.id', 'run.revision_id')
    .join('sounding', 'sounding.id', 'run.sounding_id')
    .join('survey_member', 'survey_member.survey_id', 'sounding.survey_id')
    .join('app_user', 'app_user.id', 'run.requested_by')
    .leftJoin('computation', 'computation.id', 'run_state.computation_id')
    .where('survey_member.user_id', actor.userId)
    .select(
      ...SUMMARY_COLUMNS,
      knex.raw(`${weightiestStateSql(OF_RUN_SQL)} AS interpreted_as`),
      // only what a list shows of a result: whole ones are large
      knex.raw("run.input -> 'settings' AS settings"),
      knex.raw("computation.result -> 'earth' AS earth"),
      knex.raw("computation.result ->> 'status' AS fit_status"),
      knex.raw("(computation.result ->> 'chi2PerReading')::float8 AS chi2_per_reading"),
      knex.raw("(computation.result ->> 'rmsPercent')::float8 AS rms_percent"),
      knex.raw("(computation.result ->> 'misfitProbability')::float8 AS misfit_probability"),
    );

/** Newest first; only some of them where ids or a limit are given. */
export async function listRuns(
  knex: Knex,
  actor: Actor,
  soundingId: string,
  only: { runIds?: readonly string[]; limit?: number } = {},
): Promise<RunRow[]> {
  const query = visibleRuns(knex, actor).where('run.sounding_id', soundingId).orderBy('run.number', 'desc');
  if (only.runIds) query.whereIn('run.id', only.runIds);
  if (only.limit) query.limit(only.limit);
  return (await query) as RunRow[];
}

export async function getRun(knex: Knex, actor: Actor, runId: string): Promise<FullRunRow> {
  const row = (await visibleRuns(knex, actor)
    .where('run.id', runId)
    .first(
      'sounding.name as sounding_name',
      'sounding.survey_id',
      'sounding.spread_type',
      'run.input',
      'data_revision.readings as revision_readings',
      'computation.result',
    )) as FullRunRow | undefined;
  if (!row) throw notFound('The run');
  return row;
}

/** False when the run had ended already. */
export async function cancelRun(trx: Knex, runId: string): Promise<boolean> {
  const rows = await trx('run_state')
    .where({ run_id: runId })
    .whereIn('state', ['queued', 'running'])
    .update({ state: 'cancelled', progress_text: '', ended_at: trx.fn.now() });
  return rows > 0;
}

/** False when the note has another version by now. */
export async function updateNote(
  trx: Knex,
  runId: string,
  version: number,
  change: { label?: string | undefined; note?: string | undefined; pinned?: boolean | undefined },
): Promise<boolean> {
  const rows = await trx('run_note')
    .where({ run_id: runId, version })
    .update({ ...change, version: version + 1 });
  return rows > 0;
}
