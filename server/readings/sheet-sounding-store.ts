import type { Knex } from 'knex';
import type { SpreadType } from '../contract/spread';

/** What a Field sheet needs to know of its sounding. */
export interface SheetSounding {
  name: string;
  survey_id: string;
  spread_type: SpreadType;
  current_revision_id: string | null;
  error_floor: number;
}

const COLUMNS = [
  'sounding.name',
  'sounding.survey_id',
  'sounding.spread_type',
  'sounding.current_revision_id',
  'survey.error_floor',
];

/** The caller has the actor's access to the sounding already. */
export async function getSheetSounding(db: Knex, soundingId: string): Promise<SheetSounding> {
  const row = await db('sounding')
    .join('survey', 'survey.id', 'sounding.survey_id')
    .where('sounding.id', soundingId)
    .first<SheetSounding | undefined>(COLUMNS);
  if (!row) throw new Error(`sounding ${soundingId} is gone`);
  return row;
}

/** As `getSheetSounding`; nobody else saves readings of it until the transaction ends. */
export async function holdSheetSounding(trx: Knex.Transaction, soundingId: string): Promise<SheetSounding> {
  await trx('sounding').where({ id: soundingId }).forNoKeyUpdate().first('id');
  return getSheetSounding(trx, soundingId);
}
