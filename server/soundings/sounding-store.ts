import type { Knex } from 'knex';
import type { z } from 'zod';
import type { Actor } from '../access/actor';
import type { Role } from '../contract/roles';
import type { createSoundingSchema, SoundingState, updateSoundingSchema } from '../contract/soundings';
import type { SpreadType } from '../contract/spread';
import { notFound } from '../errors';
import { SOUNDING_STATE_SQL } from './sounding-state';

export type NewSounding = z.output<typeof createSoundingSchema>;
export type SoundingChange = z.output<typeof updateSoundingSchema>;

export interface SoundingRow {
  id: string;
  survey_id: string;
  survey_name: string;
  error_floor: number;
  role: Role;
  line_id: string | null;
  line_name: string | null;
  name: string;
  spread_type: SpreadType;
  x_m: number | null;
  y_m: number | null;
  elevation_m: number | null;
  elevation_datum: string;
  azimuth_deg: number | null;
  measured_on: string | null;
  crew: string;
  instrument: string;
  note: string;
  state: SoundingState;
  current_revision_id: string | null;
  version: number;
  created_at: Date;
  updated_at: Date;
}

/** A sounding of a survey that the actor is a member of. */
export async function getSoundingRow(db: Knex, actor: Actor, soundingId: string): Promise<SoundingRow> {
  const row = await db('sounding')
    .join('survey', 'survey.id', 'sounding.survey_id')
    .join('survey_member', 'survey_member.survey_id', 'survey.id')
    .leftJoin('line', 'line.id', 'sounding.line_id')
    .where({ 'sounding.id': soundingId, 'survey_member.user_id': actor.userId })
    .first<SoundingRow | undefined>(
      'sounding.*',
      'survey.name as survey_name',
      'survey.error_floor',
      'survey_member.role',
      'line.name as line_name',
      db.raw(`${SOUNDING_STATE_SQL} AS state`),
    );
  if (!row) throw notFound('The sounding');
  return row;
}

/** Nobody else changes the sounding or saves its readings until the transaction ends. */
export async function holdSounding(trx: Knex, soundingId: string): Promise<void> {
  await trx('sounding').where({ id: soundingId }).forNoKeyUpdate().first('id');
}

const COLUMNS: Record<keyof NewSounding, string> = {
  name: 'name',
  lineId: 'line_id',
  spreadType: 'spread_type',
  xM: 'x_m',
  yM: 'y_m',
  elevationM: 'elevation_m',
  elevationDatum: 'elevation_datum',
  azimuthDeg: 'azimuth_deg',
  measuredOn: 'measured_on',
  crew: 'crew',
  instrument: 'instrument',
  note: 'note',
};

const columnsOf = (fields: SoundingChange): Record<string, unknown> =>
  Object.fromEntries(
    Object.entries(fields)
      .filter(([, value]) => value !== undefined)
      .map(([field, value]) => [COLUMNS[field as keyof NewSounding], value]),
  );

export async function insertSounding(trx: Knex, surveyId: string, fields: NewSounding): Promise<string> {
  const [row] = await trx('sounding')
    .insert({ survey_id: surveyId, ...columnsOf(fields) })
    .returning<{ id: string }[]>('id');
  if (!row) throw new Error('the new sounding was not returned');
  return row.id;
}

/** False when the row has another version by now. */
export async function updateSoundingRow(
  trx: Knex,
  soundingId: string,
  version: number,
  change: SoundingChange,
): Promise<boolean> {
  const changed = await trx('sounding')
    .where({ id: soundingId, version })
    .update({ ...columnsOf(change), version: version + 1, updated_at: trx.fn.now() });
  return changed === 1;
}
