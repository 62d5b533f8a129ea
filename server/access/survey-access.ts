import type { Knex } from 'knex';
import { ROLE_NAMES, type Role, type SurveyCan } from '../contract/roles';
import { AppError, notFound } from '../errors';
import type { Actor } from './actor';
import { surveyCan, type SurveyAction } from './policy';

export interface SurveyAccess {
  readonly surveyId: string;
  readonly role: Role;
  readonly can: SurveyCan;
}

export interface SoundingAccess extends SurveyAccess {
  readonly soundingId: string;
  readonly soundingName: string;
}

interface MembershipRow {
  survey_id: string;
  role: Role;
}

/** The actor's rights in a survey; not found for everyone who is no member, administrators included. */
export async function getSurveyAccess(knex: Knex, actor: Actor, surveyId: string): Promise<SurveyAccess> {
  const row = await knex('survey_member')
    .where({ survey_id: surveyId, user_id: actor.userId })
    .first<MembershipRow | undefined>('survey_id', 'role');
  if (!row) throw notFound('The survey');
  return accessOf(row);
}

/** The actor's rights in the survey that a sounding belongs to. */
export async function getSoundingAccess(
  knex: Knex,
  actor: Actor,
  soundingId: string,
): Promise<SoundingAccess> {
  const row = await knex('sounding')
    .join('survey_member', 'survey_member.survey_id', 'sounding.survey_id')
    .where({ 'sounding.id': soundingId, 'survey_member.user_id': actor.userId })
    .first<(MembershipRow & { name: string }) | undefined>(
      'survey_member.survey_id',
      'survey_member.role',
      'sounding.name',
    );
  if (!row) throw notFound('The sounding');
  return { ...accessOf(row), soundingId, soundingName: row.name };
}

const accessOf = (row: MembershipRow): SurveyAccess => ({
  surveyId: row.survey_id,
  role: row.role,
  can: surveyCan(row.role),
});

const ACTION_WORDS: Record<SurveyAction, string> = {
  editSurvey: 'change the survey',
  manageMembers: 'manage members and invitations',
  editSoundings: 'add or change soundings and lines',
  editReadings: 'change readings',
  run: 'ask for or cancel runs',
  recompute: 'have runs computed again',
  annotateRuns: 'write notes on runs',
  interpret: 'write interpretations',
  submit: 'submit interpretations for review',
  decide: 'decide on interpretations',
  comment: 'comment',
  editBoreholes: 'add or change boreholes',
};

export function requireCan(access: Pick<SurveyAccess, 'role' | 'can'>, action: SurveyAction): void {
  if (!access.can[action])
    throw new AppError(
      'forbidden',
      `As ${ROLE_NAMES[access.role]} of this survey you may not ${ACTION_WORDS[action]}.`,
    );
}
