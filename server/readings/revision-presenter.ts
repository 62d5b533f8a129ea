import type { z } from 'zod';
import { checkReadings } from '../../inversion/readings/check-readings';
import { deriveReading } from '../../inversion/readings/derive-reading';
import type { draftSchema, Revision, revisionSummarySchema } from '../contract/readings';
import type { DraftRow } from './draft-store';
import type { RevisionRow, RevisionSummaryRow } from './revision-store';

const presentHead = (row: RevisionSummaryRow) => ({
  id: row.id,
  soundingId: row.sounding_id,
  number: row.number,
  contentHash: row.content_hash,
  author: { id: row.author_id, name: row.author_name },
  createdAt: row.created_at.toISOString(),
  excluded: row.excluded_count,
  sourceFile:
    row.source_file_id === null
      ? null
      : { id: row.source_file_id, name: row.source_file_name ?? '', sha256: row.source_file_sha256 ?? '' },
  linesLeftOut: row.lines_left_out,
  current: row.current,
});

export const presentRevisionSummary = (row: RevisionSummaryRow): z.infer<typeof revisionSummarySchema> => ({
  ...presentHead(row),
  readings: row.reading_count,
});

export function presentRevision(row: RevisionRow): Revision {
  const derived = row.readings.map((reading) => deriveReading(reading, row.error_floor));
  const checked = row.readings.flatMap((reading, index) => {
    const follows = derived[index];
    return follows ? [{ row: index + 1, reading, derived: follows }] : [];
  });
  return {
    ...presentHead(row),
    readings: row.readings,
    derived,
    checks: checkReadings(checked),
    importFaults: row.import_faults,
  };
}

export const presentDraft = (row: DraftRow): z.infer<typeof draftSchema> => ({
  rows: row.rows,
  units: row.units,
  baseRevisionId: row.base_revision_id,
  updatedAt: row.updated_at.toISOString(),
});
