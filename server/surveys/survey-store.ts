import type { Knex } from 'knex';
import type { z } from 'zod';
import type { Actor } from '../access/actor';
import type { Role } from '../contract/roles';
import type { createSurveySchema, updateSurveySchema } from '../contract/surveys';
import { notFound } from '../errors';

export interface SurveyRow {
  id: string;
  name: string;
  description: string;
  grid: string;
  epsg_code: number | null;
  error_floor: number;
  version: number;
  created_at: Date;
  role: Role;
  soundings: number;
  measured: number;
  fitted: number;
  interpreted: number;
  in_review: number;
  accepted: number;
}

const PROGRESS = `
  SELECT count(*)::int AS soundings,
    count(current_revision_id)::int AS measured,
    (count(*) FILTER (WHERE EXISTS (
      SELECT FROM run JOIN run_state ON run_state.run_id = run.id
      WHERE run.sounding_id = sounding.id AND run_state.state = 'finished')))::int AS fitted,
    count(stated.sounding_id)::int AS interpreted,
    coalesce(sum(stated.in_review), 0)::int AS in_review,
    coalesce(sum(stated.accepted), 0)::int AS accepted
  FROM sounding
  LEFT JOIN (
    SELECT interpretation.sounding_id,
      count(*) FILTER (WHERE state = 'in-review') AS in_review,
      count(*) FILTER (WHERE state = 'accepted') AS accepted
    FROM interpretation JOIN sounding AS own ON own.id = interpretation.sounding_id
    WHERE own.survey_id = survey.id GROUP BY interpretation.sounding_id
  ) AS stated ON stated.sounding_id = sounding.id
  WHERE sounding.survey_id = survey.id`;

/** Surveys of the actor with all counts, in one query however many there are. */
const surveys = (db: Knex, actor: Actor): Knex.QueryBuilder =>
  db('survey')
    .join('survey_member', 'survey_member.survey_id', 'survey.id')
    .joinRaw(`CROSS JOIN LATERAL (${PROGRESS}) AS progress`)
    .where('survey_member.user_id', actor.userId)
    .select('survey.*', 'survey_member.role', 'progress.*');

export const listSurveyRows = (db: Knex, actor: Actor): Promise<SurveyRow[]> =>
  surveys(db, actor).orderBy(['survey.name', 'survey.id']);

export async function getSurveyRow(db: Knex, actor: Actor, surveyId: string): Promise<SurveyRow> {
  const row = await surveys(db, actor).where('survey.id', surveyId).first<SurveyRow | undefined>();
  if (!row) throw notFound('The survey');
  return row;
}

export async function insertSurvey(
  trx: Knex,
  fields: z.output<typeof createSurveySchema>,
  leadId: string,
): Promise<string> {
  const [row] = await trx('survey').insert(columnsOf(fields)).returning<{ id: string }[]>('id');
  if (!row) throw new Error('the new survey was not returned');
  await trx('survey_member').insert({ survey_id: row.id, user_id: leadId, role: 'lead' });
  return row.id;
}

/** False when the row has another version by now. */
export async function updateSurveyRow(
  trx: Knex,
  surveyId: string,
  version: number,
  fields: z.output<typeof updateSurveySchema>,
): Promise<boolean> {
  const changed = await trx('survey')
    .where({ id: surveyId, version })
    .update({ ...columnsOf(fields), version: version + 1, updated_at: trx.fn.now() });
  return changed === 1;
}

// Knex leaves out what is undefined
const columnsOf = (fields: z.output<typeof updateSurveySchema>) => ({
  name: fields.name,
  description: fields.description,
  grid: fields.grid,
  epsg_code: fields.epsgCode,
  error_floor: fields.errorFloor,
});
