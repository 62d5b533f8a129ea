import { getSurveyAccess, requireCan } from '../access/survey-access';
import type { Work } from '../http/context';
import { presentLine } from './line-presenter';
import { getLine, insertLine, listLineRows } from './line-store';

export async function listLines({ db, actor }: Work, surveyId: string) {
  await getSurveyAccess(db, actor, surveyId);
  return { items: (await listLineRows(db, surveyId)).map(presentLine) };
}

export async function createLine({ db, actor }: Work, surveyId: string, name: string) {
  requireCan(await getSurveyAccess(db, actor, surveyId), 'editSoundings');
  const id = await insertLine(db, surveyId, name);
  return presentLine(await getLine(db, surveyId, id));
}
