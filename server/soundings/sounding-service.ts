import { recordAudit } from '../access/audit';
import { getSoundingAccess, getSurveyAccess, requireCan } from '../access/survey-access';
import type { Sounding } from '../contract/soundings';
import { AppError, changedMeanwhile } from '../errors';
import type { Work } from '../http/context';
import type { Knex } from 'knex';
import type { Actor } from '../access/actor';
import { countSoundings, listSoundingRows, type SoundingQuery } from './sounding-page-store';
import { presentSounding, presentSoundingRow } from './sounding-presenter';
import {
  getSoundingRow,
  holdSounding,
  insertSounding,
  updateSoundingRow,
  type NewSounding,
  type SoundingChange,
} from './sounding-store';

export async function listSoundings({ db, actor }: Work, surveyId: string, query: SoundingQuery) {
  await getSurveyAccess(db, actor, surveyId);
  const [total, rows] = await Promise.all([
    countSoundings(db, actor, surveyId, query),
    listSoundingRows(db, actor, surveyId, query),
  ]);
  return { items: rows.map(presentSoundingRow), total, page: query.page, pageSize: query.pageSize };
}

export const getSounding = async ({ db, actor }: Work, soundingId: string): Promise<Sounding> =>
  presentSounding(await getSoundingRow(db, actor, soundingId));

export async function createSounding(
  { db, actor }: Work,
  surveyId: string,
  fields: NewSounding,
): Promise<Sounding> {
  requireCan(await getSurveyAccess(db, actor, surveyId), 'editSoundings');
  return db.transaction(async (trx) => {
    const id = await insertSounding(trx, surveyId, fields);
    await recordAudit(trx, {
      actorId: actor.userId,
      surveyId,
      action: 'sounding.created',
      subject: fields.name,
    });
    return presentSounding(await getSoundingRow(trx, actor, id));
  });
}

export async function updateSounding(
  { db, actor }: Work,
  soundingId: string,
  version: number,
  change: SoundingChange,
): Promise<Sounding> {
  const access = await getSoundingAccess(db, actor, soundingId);
  requireCan(access, 'editSoundings');
  return db.transaction(async (trx) => {
    await holdSounding(trx, soundingId);
    await requireSpreadTypeFree(trx, actor, soundingId, change);
    const changed = await updateSoundingRow(trx, soundingId, version, change);
    const row = await getSoundingRow(trx, actor, soundingId);
    if (!changed) throw changedMeanwhile('this sounding', presentSounding(row));
    await recordAudit(trx, {
      actorId: actor.userId,
      surveyId: access.surveyId,
      action: 'sounding.changed',
      subject: row.name,
      details: { fields: Object.keys(change) },
    });
    return presentSounding(row);
  });
}

/** Saved readings name their electrodes: as another spread the same lengths would give another K and another depth. */
async function requireSpreadTypeFree(
  trx: Knex,
  actor: Actor,
  soundingId: string,
  { spreadType }: SoundingChange,
): Promise<void> {
  if (spreadType === undefined) return;
  const row = await getSoundingRow(trx, actor, soundingId);
  if (row.spread_type !== spreadType && row.current_revision_id !== null)
    throw new AppError(
      'wrong-state',
      `The readings of this sounding are saved as ${row.spread_type}. Add another sounding for the readings of another spread.`,
    );
}
