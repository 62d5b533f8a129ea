import type { z } from 'zod';
import type { Actor } from '../access/actor';
import { getSoundingAccess, requireCan } from '../access/survey-access';
import { parseSheet } from '../contract/field-sheet';
import type { draftSchema, FieldSheet, Revision, writeDraftSchema } from '../contract/readings';
import { AppError } from '../errors';
import type { Work } from '../http/context';
import { Reply } from '../http/endpoint';
import { deleteDraft, findDraft, isRevisionOf, writeDraft } from './draft-store';
import { refuseRowFaults } from './refuse-row-faults';
import { presentDraft, presentRevision, presentRevisionSummary } from './revision-presenter';
import { findCurrentRevisionRow, getRevisionRow, getSourceFile, listRevisionRows } from './revision-store';
import { saveReadings } from './save-readings';
import { getSheetSounding, holdSheetSounding } from './sheet-sounding-store';

type WriteDraft = z.output<typeof writeDraftSchema>;

const draftKey = (actor: Actor, soundingId: string) => ({ soundingId, userId: actor.userId });

export async function getFieldSheet({ db, actor }: Work, soundingId: string): Promise<FieldSheet> {
  await getSoundingAccess(db, actor, soundingId);
  const sounding = await getSheetSounding(db, soundingId);
  const revision = await findCurrentRevisionRow(db, actor, soundingId);
  const draft = await findDraft(db, draftKey(actor, soundingId));
  return {
    soundingId,
    spreadType: sounding.spread_type,
    revision: revision && presentRevision(revision),
    draft: draft && presentDraft(draft),
  };
}

export async function putDraft(
  { db, actor }: Work,
  soundingId: string,
  draft: WriteDraft,
): Promise<z.infer<typeof draftSchema>> {
  requireCan(await getSoundingAccess(db, actor, soundingId), 'editReadings');
  if (draft.baseRevisionId !== null && !(await isRevisionOf(db, soundingId, draft.baseRevisionId)))
    throw new AppError('invalid', 'The draft starts from a revision that is not of this sounding.', {
      faults: [{ path: ['body', 'baseRevisionId'], message: 'is not a revision of this sounding' }],
    });
  return presentDraft(await writeDraft(db, draftKey(actor, soundingId), draft));
}

export async function dropDraft({ db, actor }: Work, soundingId: string): Promise<void> {
  requireCan(await getSoundingAccess(db, actor, soundingId), 'editReadings');
  await deleteDraft(db, draftKey(actor, soundingId));
}

export async function listRevisions({ db, actor }: Work, soundingId: string) {
  await getSoundingAccess(db, actor, soundingId);
  return { items: (await listRevisionRows(db, actor, soundingId)).map(presentRevisionSummary) };
}

export const getRevision = async ({ db, actor }: Work, revisionId: string): Promise<Revision> =>
  presentRevision(await getRevisionRow(db, actor, revisionId));

export const getRevisionFile = ({ db, actor }: Work, revisionId: string) =>
  getSourceFile(db, actor, revisionId);

/** Save: the sheet is parsed here again, whatever the browser made of it. */
export async function saveSheet(
  { db, actor }: Work,
  soundingId: string,
  sheet: WriteDraft,
): Promise<Reply<Revision>> {
  requireCan(await getSoundingAccess(db, actor, soundingId), 'editReadings');
  return db.transaction(async (trx) => {
    const sounding = await holdSheetSounding(trx, soundingId);
    const { readings, faults } = parseSheet(sheet.rows, sounding.spread_type, sheet.units);
    refuseRowFaults(faults, 'Row');
    if (readings.length === 0) throw new AppError('invalid', 'The sheet holds no reading to save.');
    const { revisionId, created } = await saveReadings(trx, actor, {
      soundingId,
      sounding,
      readings,
      baseRevisionId: sheet.baseRevisionId,
      file: null,
    });
    await deleteDraft(trx, draftKey(actor, soundingId));
    return new Reply(created ? 201 : 200, presentRevision(await getRevisionRow(trx, actor, revisionId)));
  });
}
