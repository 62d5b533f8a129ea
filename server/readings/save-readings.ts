import type { Knex } from 'knex';
import type { Actor } from '../access/actor';
import { recordAudit } from '../access/audit';
import type { Reading, RowFault } from '../contract/readings';
import { AppError } from '../errors';
import { contentHash } from './content-hash';
import { presentRevision } from './revision-presenter';
import { getRevisionRow } from './revision-store';
import type { SheetSounding } from './sheet-sounding-store';

export interface SourceFile {
  readonly name: string;
  readonly sha256: string;
  readonly bytes: Buffer;
  /** of the lines that were left out */
  readonly faults: readonly RowFault[];
}

export interface ReadingsToSave {
  readonly soundingId: string;
  /** held by the caller */
  readonly sounding: SheetSounding;
  readonly readings: readonly Reading[];
  /** the revision the person started from; undefined = not asked about */
  readonly baseRevisionId: string | null | undefined;
  /** where the readings were read from */
  readonly file: SourceFile | null;
}

export interface SavedRevision {
  readonly revisionId: string;
  /** false when a revision of equal content was there */
  readonly created: boolean;
}

/**
 * Makes the readings the sounding's current revision. Equal content is the same revision, an older one included; other
 * content on a revision that is no longer current is a conflict, told with the current one.
 */
export async function saveReadings(
  trx: Knex.Transaction,
  actor: Actor,
  request: ReadingsToSave,
): Promise<SavedRevision> {
  const { soundingId, sounding, readings, baseRevisionId } = request;
  const hash = contentHash(readings);
  const equal = await findEqual(trx, soundingId, hash);
  const current = sounding.current_revision_id;
  if (equal !== null && equal === current) return { revisionId: equal, created: false };
  if (baseRevisionId !== undefined && baseRevisionId !== current) await refuseStale(trx, actor, current);
  const revisionId = equal ?? (await insertRevision(trx, actor, request, hash));
  await trx('sounding')
    .where({ id: soundingId })
    .update({ current_revision_id: revisionId, updated_at: trx.fn.now() });
  await recordAudit(trx, {
    actorId: actor.userId,
    surveyId: sounding.survey_id,
    action: equal === null ? 'readings.saved' : 'readings.restored',
    subject: sounding.name,
    details: { revisionId, readings: readings.length, file: request.file?.name ?? null },
  });
  return { revisionId, created: equal === null };
}

async function refuseStale(trx: Knex, actor: Actor, current: string | null): Promise<never> {
  const message = 'Someone else saved readings of this sounding after you opened it. Your draft is kept.';
  if (current === null) throw new AppError('conflict', message, { current: null });
  throw new AppError('conflict', message, {
    current: presentRevision(await getRevisionRow(trx, actor, current)),
  });
}

async function findEqual(trx: Knex, soundingId: string, hash: string): Promise<string | null> {
  const row = await trx('data_revision')
    .where({ sounding_id: soundingId, content_hash: hash })
    .first<{ id: string } | undefined>('id');
  return row?.id ?? null;
}

async function insertRevision(
  trx: Knex,
  actor: Actor,
  { soundingId, readings, file }: ReadingsToSave,
  hash: string,
): Promise<string> {
  const fileId = file && (await insertFile(trx, actor, soundingId, file));
  return insertReturningId(trx, 'data_revision', {
    sounding_id: soundingId,
    number: trx.raw('(SELECT coalesce(max(number), 0) + 1 FROM data_revision WHERE sounding_id = ?)', [
      soundingId,
    ]),
    content_hash: hash,
    readings: JSON.stringify(readings),
    source_file_id: fileId,
    import_faults: JSON.stringify(file?.faults ?? []),
    author_id: actor.userId,
  });
}

const insertFile = (trx: Knex, actor: Actor, soundingId: string, file: SourceFile): Promise<string> =>
  insertReturningId(trx, 'source_file', {
    sounding_id: soundingId,
    name: file.name,
    sha256: file.sha256,
    bytes: file.bytes,
    uploaded_by: actor.userId,
  });

async function insertReturningId(trx: Knex, table: string, values: object): Promise<string> {
  const [row] = await trx(table).insert(values).returning<{ id: string }[]>('id');
  if (!row) throw new Error(`nothing was inserted into ${table}`);
  return row.id;
}
