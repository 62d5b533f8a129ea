import type { z } from 'zod';
import { recordAudit } from '../access/audit';
import { getSurveyAccess, requireCan } from '../access/survey-access';
import type { Borehole, writeBoreholeSchema } from '../contract/surveys';
import { changedMeanwhile } from '../errors';
import type { Work } from '../http/context';
import { presentBorehole } from './borehole-presenter';
import { requireDaysUpTo, tomorrow } from './require-days-up-to';
import {
  getBoreholeRow,
  insertBorehole,
  listBoreholeRows,
  replaceParts,
  updateBoreholeRow,
} from './borehole-store';

type BoreholeFields = z.output<typeof writeBoreholeSchema>;

export async function listBoreholes({ db, actor }: Work, surveyId: string): Promise<{ items: Borehole[] }> {
  await getSurveyAccess(db, actor, surveyId);
  return { items: (await listBoreholeRows(db, actor, surveyId)).map(presentBorehole) };
}

export const getBorehole = async ({ db, actor }: Work, id: string): Promise<Borehole> =>
  presentBorehole(await getBoreholeRow(db, actor, id));

export async function createBorehole(
  { db, actor }: Work,
  surveyId: string,
  fields: BoreholeFields,
  lastDay = tomorrow(),
): Promise<Borehole> {
  requireCan(await getSurveyAccess(db, actor, surveyId), 'editBoreholes');
  requireDaysUpTo(lastDay, fields);
  return db.transaction(async (trx) => {
    const id = await insertBorehole(trx, surveyId, fields);
    await replaceParts(trx, id, fields);
    await recordAudit(trx, {
      actorId: actor.userId,
      surveyId,
      action: 'borehole.created',
      subject: fields.name,
    });
    return presentBorehole(await getBoreholeRow(trx, actor, id));
  });
}

export async function replaceBorehole(
  { db, actor }: Work,
  id: string,
  version: number,
  fields: BoreholeFields,
): Promise<Borehole> {
  const { survey_id: surveyId } = await getBoreholeRow(db, actor, id);
  requireCan(await getSurveyAccess(db, actor, surveyId), 'editBoreholes');
  requireDaysUpTo(tomorrow(), fields);
  return db.transaction(async (trx) => {
    if (!(await updateBoreholeRow(trx, id, version, fields)))
      throw changedMeanwhile('this borehole', presentBorehole(await getBoreholeRow(trx, actor, id)));
    await replaceParts(trx, id, fields);
    await recordAudit(trx, {
      actorId: actor.userId,
      surveyId,
      action: 'borehole.changed',
      subject: fields.name,
    });
    return presentBorehole(await getBoreholeRow(trx, actor, id));
  });
}
