import type { Knex } from 'knex';
import type { z } from 'zod';
import type { Actor } from '../access/actor';
import type { Reading } from '../contract/readings';
import type { RunInput } from '../contract/runs';
import type { SoundingState, soundingQuerySchema } from '../contract/soundings';
import type { SpreadType } from '../contract/spread';
import { leastWeightSql, OF_RUN_SQL } from '../db/interpretation-weight';
import { SOUNDING_STATE_SQL, SOUNDING_STATES } from './sounding-state';

export type SoundingQuery = z.output<typeof soundingQuerySchema>;

export interface SoundingPageRow {
  id: string;
  name: string;
  line_name: string | null;
  spread_type: SpreadType;
  x_m: number | null;
  y_m: number | null;
  measured_on: string | null;
  state: SoundingState;
  updated_at: Date;
  current_revision_id: string | null;
  revision_number: number | null;
  readings: Reading[] | null;
  run_id: string | null;
  run_number: number | null;
  run_revision_id: string | null;
  run_readings: RunInput['readings'] | null;
  layers: number | null;
  chi2_per_reading: number | null;
  rms_percent: number | null;
  misfit_probability: number | null;
  predicted: number[] | null;
}

const HAS_BEDS_SQL = `(run.input -> 'settings' ->> 'kind' = 'layered')`;

/**
 * The run that stands for a sounding: the pinned finished one, else that of the weightiest interpretation, else the newest that
 * has beds, else the newest.
 */
const LATEST_RUN_SQL = `LATERAL (
  SELECT run.id, run.number, run.revision_id, run.input, computation.result
  FROM run
  JOIN run_state ON run_state.run_id = run.id AND run_state.state = 'finished'
  JOIN run_note ON run_note.run_id = run.id
  JOIN computation ON computation.id = run_state.computation_id
  WHERE run.sounding_id = sounding.id
  ORDER BY run_note.pinned DESC, ${leastWeightSql(OF_RUN_SQL)} ASC NULLS LAST,
    ${HAS_BEDS_SQL} DESC, run.number DESC LIMIT 1
) AS latest ON true`;

/** Cells are no beds, so a ground of cells has no count. */
const LAYERS_SQL = `CASE WHEN latest.input -> 'settings' ->> 'kind' = 'layered'
  THEN jsonb_array_length(latest.result -> 'earth' -> 'resistivity') END`;
const MISFIT_SQL = `(latest.result ->> 'chi2PerReading')::float8`;
const NAME_SQL = 'sounding.name COLLATE natural_order';

const SORT_SQL: Record<SoundingQuery['sort'], string> = {
  name: NAME_SQL,
  line: 'line.name COLLATE natural_order',
  measuredOn: 'sounding.measured_on',
  state: `array_position(ARRAY['${SOUNDING_STATES.join("','")}'], ${SOUNDING_STATE_SQL})`,
  misfit: MISFIT_SQL,
  layers: LAYERS_SQL,
  updatedAt: 'sounding.updated_at',
};

function matching(db: Knex, actor: Actor, surveyId: string, query: SoundingQuery): Knex.QueryBuilder {
  const rows = db('sounding')
    .join('survey_member', 'survey_member.survey_id', 'sounding.survey_id')
    .leftJoin('line', 'line.id', 'sounding.line_id')
    .where({ 'sounding.survey_id': surveyId, 'survey_member.user_id': actor.userId });
  if (query.lineId !== undefined) rows.where('sounding.line_id', query.lineId);
  if (query.spreadType !== undefined) rows.where('sounding.spread_type', query.spreadType);
  if (query.state !== undefined) rows.whereRaw(`${SOUNDING_STATE_SQL} = ?`, [query.state]);
  if (query.search !== '')
    rows.whereRaw(
      `position(lower(?) IN lower(concat_ws(' ', sounding.name, line.name, sounding.crew, sounding.note))) > 0`,
      [query.search],
    );
  return rows;
}

export async function countSoundings(
  db: Knex,
  actor: Actor,
  surveyId: string,
  query: SoundingQuery,
): Promise<number> {
  const [row] = await matching(db, actor, surveyId, query).select<{ total: number }[]>(
    db.raw('count(*)::int AS total'),
  );
  return row?.total ?? 0;
}

/** One page in order. The large JSON of readings and results is read for the rows of the page alone. */
export async function listSoundingRows(
  db: Knex,
  actor: Actor,
  surveyId: string,
  query: SoundingQuery,
): Promise<SoundingPageRow[]> {
  const order = query.order === 'asc' ? 'ASC' : 'DESC';
  const page = matching(db, actor, surveyId, query)
    .select(
      'sounding.id',
      db.raw(
        `row_number() OVER (ORDER BY ${SORT_SQL[query.sort]} ${order} NULLS LAST, ${NAME_SQL}) AS place`,
      ),
    )
    .orderBy('place')
    .limit(query.pageSize)
    .offset((query.page - 1) * query.pageSize);
  if (query.sort === 'misfit' || query.sort === 'layers') page.joinRaw(`LEFT JOIN ${LATEST_RUN_SQL}`);
  return db
    .with('page', page)
    .from('page')
    .join('sounding', 'sounding.id', 'page.id')
    .leftJoin('line', 'line.id', 'sounding.line_id')
    .leftJoin('data_revision', 'data_revision.id', 'sounding.current_revision_id')
    .joinRaw(`LEFT JOIN ${LATEST_RUN_SQL}`)
    .orderBy('page.place')
    .select<SoundingPageRow[]>(
      'sounding.id',
      'sounding.name',
      'line.name as line_name',
      'sounding.spread_type',
      'sounding.x_m',
      'sounding.y_m',
      'sounding.measured_on',
      'sounding.updated_at',
      'sounding.current_revision_id',
      'data_revision.number as revision_number',
      'data_revision.readings',
      'latest.id as run_id',
      'latest.number as run_number',
      'latest.revision_id as run_revision_id',
      db.raw(`${SOUNDING_STATE_SQL} AS state`),
      db.raw(`latest.input -> 'readings' AS run_readings`),
      db.raw(`${LAYERS_SQL} AS layers`),
      db.raw(`${MISFIT_SQL} AS chi2_per_reading`),
      db.raw(`(latest.result ->> 'rmsPercent')::float8 AS rms_percent`),
      db.raw(`(latest.result ->> 'misfitProbability')::float8 AS misfit_probability`),
      db.raw(`latest.result -> 'predicted' AS predicted`),
    );
}
