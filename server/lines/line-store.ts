import type { Knex } from 'knex';
import { notFound } from '../errors';

export interface LineRow {
  id: string;
  survey_id: string;
  name: string;
  version: number;
  soundings: number;
}

const lines = (db: Knex, surveyId: string): Knex.QueryBuilder =>
  db('line')
    .where('line.survey_id', surveyId)
    .select(
      'line.*',
      db.raw(
        `(SELECT count(*)::int FROM sounding
          WHERE sounding.survey_id = line.survey_id AND sounding.line_id = line.id) AS soundings`,
      ),
    );

export const listLineRows = (db: Knex, surveyId: string): Promise<LineRow[]> =>
  lines(db, surveyId).orderBy('line.name');

export async function getLine(db: Knex, surveyId: string, id: string): Promise<LineRow> {
  const row = await lines(db, surveyId).where('line.id', id).first<LineRow | undefined>();
  if (!row) throw notFound('The line');
  return row;
}

export async function insertLine(db: Knex, surveyId: string, name: string): Promise<string> {
  const [row] = await db('line').insert({ survey_id: surveyId, name }).returning<{ id: string }[]>('id');
  if (!row) throw new Error('the new line was not returned');
  return row.id;
}
