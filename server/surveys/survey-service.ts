import type { z } from 'zod';
import { recordAudit } from '../access/audit';
import { getSurveyAccess, requireCan } from '../access/survey-access';
import type { createSurveySchema, Survey, updateSurveySchema } from '../contract/surveys';
import { changedMeanwhile } from '../errors';
import type { Work } from '../http/context';
import { presentSurvey } from './survey-presenter';
import { getSurveyRow, insertSurvey, listSurveyRows, updateSurveyRow } from './survey-store';

export async function listSurveys({ db, actor }: Work): Promise<{ items: Survey[] }> {
  return { items: (await listSurveyRows(db, actor)).map(presentSurvey) };
}

export const getSurvey = async ({ db, actor }: Work, surveyId: string): Promise<Survey> =>
  presentSurvey(await getSurveyRow(db, actor, surveyId));

export const createSurvey = (
  { db, actor }: Work,
  fields: z.output<typeof createSurveySchema>,
): Promise<Survey> =>
  db.transaction(async (trx) => {
    const surveyId = await insertSurvey(trx, fields, actor.userId);
    await recordAudit(trx, {
      actorId: actor.userId,
      surveyId,
      action: 'survey.created',
      subject: fields.name,
    });
    return presentSurvey(await getSurveyRow(trx, actor, surveyId));
  });

export async function updateSurvey(
  { db, actor }: Work,
  surveyId: string,
  version: number,
  fields: z.output<typeof updateSurveySchema>,
): Promise<Survey> {
  requireCan(await getSurveyAccess(db, actor, surveyId), 'editSurvey');
  return db.transaction(async (trx) => {
    const updated = await updateSurveyRow(trx, surveyId, version, fields);
    const survey = presentSurvey(await getSurveyRow(trx, actor, surveyId));
    if (!updated) throw changedMeanwhile('this survey', survey);
    await recordAudit(trx, {
      actorId: actor.userId,
      surveyId,
      action: 'survey.changed',
      subject: survey.name,
      details: { ...fields },
    });
    return survey;
  });
}
