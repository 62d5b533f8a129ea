import type { Knex } from 'knex';
import type { SheetRow, SheetUnits } from '../contract/readings';

export interface DraftRow {
  rows: SheetRow[];
  units: SheetUnits;
  base_revision_id: string | null;
  updated_at: Date;
}

interface DraftKey {
  readonly soundingId: string;
  readonly userId: string;
}

const drafts = (db: Knex, { soundingId, userId }: DraftKey): Knex.QueryBuilder =>
  db('reading_draft').where({ sounding_id: soundingId, user_id: userId });

const DRAFT_COLUMNS = ['rows', 'units', 'base_revision_id', 'updated_at'];

export const findDraft = async (db: Knex, key: DraftKey): Promise<DraftRow | null> =>
  ((await drafts(db, key).first(DRAFT_COLUMNS)) as DraftRow | undefined) ?? null;

export async function writeDraft(
  db: Knex,
  { soundingId, userId }: DraftKey,
  draft: { rows: SheetRow[]; units: SheetUnits; baseRevisionId: string | null },
): Promise<DraftRow> {
  const [row] = await db('reading_draft')
    .insert({
      sounding_id: soundingId,
      user_id: userId,
      rows: JSON.stringify(draft.rows),
      units: JSON.stringify(draft.units),
      base_revision_id: draft.baseRevisionId,
      updated_at: db.fn.now(),
    })
    .onConflict(['sounding_id', 'user_id'])
    .merge()
    .returning<DraftRow[]>(DRAFT_COLUMNS);
  if (!row) throw new Error('the draft was not returned');
  return row;
}

export async function deleteDraft(db: Knex, key: DraftKey): Promise<void> {
  await drafts(db, key).delete();
}

export async function isRevisionOf(db: Knex, soundingId: string, revisionId: string): Promise<boolean> {
  const row: unknown = await db('data_revision')
    .where({ sounding_id: soundingId, id: revisionId })
    .first('id');
  return row !== undefined;
}
