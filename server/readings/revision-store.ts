import type { Knex } from 'knex';
import type { Actor } from '../access/actor';
import type { Reading, RowFault } from '../contract/readings';
import { notFound } from '../errors';

export interface RevisionSummaryRow {
  id: string;
  sounding_id: string;
  number: number;
  content_hash: string;
  author_id: string;
  author_name: string;
  created_at: Date;
  reading_count: number;
  excluded_count: number;
  source_file_id: string | null;
  source_file_name: string | null;
  source_file_sha256: string | null;
  lines_left_out: number;
  current: boolean;
}

export interface RevisionRow extends RevisionSummaryRow {
  readings: Reading[];
  import_faults: RowFault[];
  error_floor: number;
}

/** Revisions of surveys that the actor is a member of. */
const visibleRevisions = (db: Knex, actor: Actor) =>
  db('data_revision')
    .join('sounding', 'sounding.id', 'data_revision.sounding_id')
    .join('survey', 'survey.id', 'sounding.survey_id')
    .join('survey_member', 'survey_member.survey_id', 'survey.id')
    .join('app_user', 'app_user.id', 'data_revision.author_id')
    .leftJoin('source_file', 'source_file.id', 'data_revision.source_file_id')
    .where('survey_member.user_id', actor.userId)
    .select(
      'data_revision.id',
      'data_revision.sounding_id',
      'data_revision.number',
      'data_revision.content_hash',
      'data_revision.author_id',
      'app_user.name as author_name',
      'data_revision.created_at',
      'data_revision.source_file_id',
      'source_file.name as source_file_name',
      'source_file.sha256 as source_file_sha256',
      db.raw('jsonb_array_length(data_revision.readings) AS reading_count'),
      db.raw(
        `(SELECT count(*)::int FROM jsonb_array_elements(data_revision.readings) AS reading
          WHERE reading ->> 'excluded' IS NOT NULL) AS excluded_count`,
      ),
      db.raw(
        `(SELECT count(DISTINCT fault -> 'row')::int
          FROM jsonb_array_elements(data_revision.import_faults) AS fault) AS lines_left_out`,
      ),
      db.raw('sounding.current_revision_id IS NOT DISTINCT FROM data_revision.id AS current'),
    );

/** Newest first. */
export async function listRevisionRows(
  db: Knex,
  actor: Actor,
  soundingId: string,
): Promise<RevisionSummaryRow[]> {
  const rows = await visibleRevisions(db, actor)
    .where('sounding.id', soundingId)
    .orderBy('data_revision.number', 'desc');
  return rows as RevisionSummaryRow[];
}

async function findWhere(db: Knex, actor: Actor, where: object): Promise<RevisionRow | null> {
  const row = await visibleRevisions(db, actor)
    .where(where)
    .first('data_revision.readings', 'data_revision.import_faults', 'survey.error_floor');
  return (row as RevisionRow | undefined) ?? null;
}

export async function getRevisionRow(db: Knex, actor: Actor, revisionId: string): Promise<RevisionRow> {
  const row = await findWhere(db, actor, { 'data_revision.id': revisionId });
  if (!row) throw notFound('The revision');
  return row;
}

export const findCurrentRevisionRow = (
  db: Knex,
  actor: Actor,
  soundingId: string,
): Promise<RevisionRow | null> =>
  findWhere(db, actor, {
    'sounding.id': soundingId,
    'data_revision.id': db.ref('sounding.current_revision_id'),
  });

export interface SourceFileRow {
  name: string;
  bytes: Buffer;
}

/** The file that a revision was read from. */
export async function getSourceFile(db: Knex, actor: Actor, revisionId: string): Promise<SourceFileRow> {
  const row = await db('source_file')
    .join('data_revision', 'data_revision.source_file_id', 'source_file.id')
    .join('sounding', 'sounding.id', 'data_revision.sounding_id')
    .join('survey_member', 'survey_member.survey_id', 'sounding.survey_id')
    .where({ 'data_revision.id': revisionId, 'survey_member.user_id': actor.userId })
    .first<SourceFileRow | undefined>('source_file.name', 'source_file.bytes');
  if (!row) throw notFound('The file of this revision');
  return row;
}
