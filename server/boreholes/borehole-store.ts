import type { Knex } from 'knex';
import type { z } from 'zod';
import type { Actor } from '../access/actor';
import type { writeBoreholeSchema } from '../contract/surveys';
import { notFound } from '../errors';

type BoreholeFields = z.output<typeof writeBoreholeSchema>;

export interface BoreholeRow {
  id: string;
  survey_id: string;
  name: string;
  x_m: number | null;
  y_m: number | null;
  elevation_m: number | null;
  depth_m: number;
  drilled_on: string | null;
  note: string;
  version: number;
  intervals: { topM: number; baseM: number; description: string }[];
  water_levels: { measuredOn: string; depthM: number }[];
}

const INTERVALS = `(SELECT coalesce(json_agg(json_build_object(
    'topM', top_m, 'baseM', base_m, 'description', description) ORDER BY position), '[]')
  FROM borehole_interval WHERE borehole_id = borehole.id) AS intervals`;
const WATER_LEVELS = `(SELECT coalesce(json_agg(json_build_object(
    'measuredOn', measured_on, 'depthM', water_level.depth_m) ORDER BY measured_on), '[]')
  FROM water_level WHERE borehole_id = borehole.id) AS water_levels`;

const boreholes = (db: Knex, actor: Actor): Knex.QueryBuilder =>
  db('borehole')
    .join('survey_member', 'survey_member.survey_id', 'borehole.survey_id')
    .where('survey_member.user_id', actor.userId)
    .select('borehole.*', db.raw(INTERVALS), db.raw(WATER_LEVELS));

export const listBoreholeRows = (db: Knex, actor: Actor, surveyId: string): Promise<BoreholeRow[]> =>
  boreholes(db, actor).where('borehole.survey_id', surveyId).orderBy('borehole.name');

export async function getBoreholeRow(db: Knex, actor: Actor, id: string): Promise<BoreholeRow> {
  const row = await boreholes(db, actor).where('borehole.id', id).first<BoreholeRow | undefined>();
  if (!row) throw notFound('The borehole');
  return row;
}

export async function insertBorehole(trx: Knex, surveyId: string, fields: BoreholeFields): Promise<string> {
  const [row] = await trx('borehole')
    .insert({ survey_id: surveyId, ...columnsOf(fields) })
    .returning<{ id: string }[]>('id');
  if (!row) throw new Error('the new borehole was not returned');
  return row.id;
}

/** False when the row has another version by now. */
export async function updateBoreholeRow(
  trx: Knex,
  id: string,
  version: number,
  fields: BoreholeFields,
): Promise<boolean> {
  const changed = await trx('borehole')
    .where({ id, version })
    .update({ ...columnsOf(fields), version: version + 1, updated_at: trx.fn.now() });
  return changed === 1;
}

/** The log and the water levels belong to the borehole's version: they are written with it, as a whole. */
export async function replaceParts(trx: Knex, id: string, fields: BoreholeFields): Promise<void> {
  await trx('borehole_interval').where({ borehole_id: id }).delete();
  await trx('water_level').where({ borehole_id: id }).delete();
  if (fields.intervals.length > 0)
    await trx('borehole_interval').insert(
      fields.intervals.map((interval, position) => ({
        borehole_id: id,
        position,
        top_m: interval.topM,
        base_m: interval.baseM,
        description: interval.description,
      })),
    );
  if (fields.waterLevels.length > 0)
    await trx('water_level').insert(
      fields.waterLevels.map((level) => ({
        borehole_id: id,
        measured_on: level.measuredOn,
        depth_m: level.depthM,
      })),
    );
}

const columnsOf = (fields: BoreholeFields) => ({
  name: fields.name,
  x_m: fields.xM,
  y_m: fields.yM,
  elevation_m: fields.elevationM,
  depth_m: fields.depthM,
  drilled_on: fields.drilledOn,
  note: fields.note,
});
