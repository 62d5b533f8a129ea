import { createHash } from 'node:crypto';
import type { z } from 'zod';
import { checkReadings } from '../../inversion/readings/check-readings';
import { getSoundingAccess, requireCan } from '../access/survey-access';
import type { ImportMapping, ImportPreview, Revision } from '../contract/readings';
import { AppError } from '../errors';
import type { Work } from '../http/context';
import { Reply } from '../http/endpoint';
import type { importFormSchema } from './import-form';
import { readSheetFile, type SheetFile } from './read-sheet-file';
import { refuseRowFaults } from './refuse-row-faults';
import { presentRevision } from './revision-presenter';
import { getRevisionRow } from './revision-store';
import { saveReadings } from './save-readings';
import { getSheetSounding, holdSheetSounding } from './sheet-sounding-store';

/** What a person sent in the field `file`. */
export interface UploadedFile {
  readonly originalname: string;
  readonly buffer: Buffer;
}

function requireFile(file: UploadedFile | undefined): { name: string; bytes: Buffer; sha256: string } {
  if (!file)
    throw new AppError('invalid', 'No file was sent.', {
      faults: [{ path: ['body', 'file'], message: 'is missing', allowed: 'one file in the field "file"' }],
    });
  const name = file.originalname.split(/[\\/]/).at(-1)?.trim().slice(-255);
  return {
    name: name === undefined || name === '' ? 'sheet.csv' : name,
    bytes: file.buffer,
    sha256: createHash('sha256').update(file.buffer).digest('hex'),
  };
}

/** What would be imported, and every fault; stores nothing. */
export async function previewImport(
  { db, actor }: Work,
  soundingId: string,
  upload: UploadedFile | undefined,
  mapping: ImportMapping | undefined,
): Promise<ImportPreview> {
  requireCan(await getSoundingAccess(db, actor, soundingId), 'editReadings');
  const file = requireFile(upload);
  const sounding = await getSheetSounding(db, soundingId);
  const sheet = readSheetFile(file.name, file.bytes, {
    spreadType: sounding.spread_type,
    errorFloor: sounding.error_floor,
    mapping: mapping ?? null,
  });
  return {
    fileName: file.name,
    sha256: file.sha256,
    headings: [...sheet.headings],
    mapping: sheet.mapping,
    unitsStated: sheet.unitsStated,
    rows: [...sheet.rows],
    readings: sheet.good.map(({ line, derived }) => ({ ...derived, line })),
    faults: [...sheet.headingFaults, ...sheet.rowFaults],
    checks: checkReadings(sheet.good.map(({ line, reading, derived }) => ({ row: line, reading, derived }))),
    missingColumns: [...sheet.missingColumns],
  };
}

/** The file and the revision read from it are stored together, or not at all. Drafts are left as they are. */
export async function importFile(
  { db, actor }: Work,
  soundingId: string,
  upload: UploadedFile | undefined,
  form: z.output<typeof importFormSchema>,
): Promise<Reply<Revision>> {
  requireCan(await getSoundingAccess(db, actor, soundingId), 'editReadings');
  const file = requireFile(upload);
  return db.transaction(async (trx) => {
    const sounding = await holdSheetSounding(trx, soundingId);
    const sheet = readSheetFile(file.name, file.bytes, {
      spreadType: sounding.spread_type,
      errorFloor: sounding.error_floor,
      mapping: form.mapping,
    });
    requireUsable(sheet, form.accept);
    const { revisionId, created } = await saveReadings(trx, actor, {
      soundingId,
      sounding,
      readings: sheet.good.map(({ reading }) => reading),
      baseRevisionId: form.baseRevisionId,
      file: { ...file, faults: sheet.rowFaults },
    });
    return new Reply(created ? 201 : 200, presentRevision(await getRevisionRow(trx, actor, revisionId)));
  });
}

function requireUsable(sheet: SheetFile, accept: 'all' | 'good-rows'): void {
  if (sheet.missingColumns.length > 0)
    throw new AppError('invalid', `No column of the file is mapped to ${sheet.missingColumns.join(', ')}.`, {
      faults: sheet.missingColumns.map((name) => ({
        path: ['body', 'mapping', 'columns'],
        message: `nothing is mapped to ${name}`,
      })),
    });
  refuseRowFaults(
    accept === 'all' ? [...sheet.headingFaults, ...sheet.rowFaults] : sheet.headingFaults,
    'Line',
  );
  if (sheet.good.length === 0) throw new AppError('invalid', 'The file holds no reading that can be used.');
}
