import type { Knex } from 'knex';
import type { Role } from '../contract/roles';
import { notFound } from '../errors';

export interface MemberRow {
  user_id: string;
  name: string;
  email: string;
  role: Role;
  joined_at: Date;
}

const members = (db: Knex, surveyId: string): Knex.QueryBuilder =>
  db('survey_member')
    .join('app_user', 'app_user.id', 'survey_member.user_id')
    .where({ survey_id: surveyId })
    .select('user_id', 'name', 'email', 'role', 'joined_at');

export const listMemberRows = (db: Knex, surveyId: string): Promise<MemberRow[]> =>
  members(db, surveyId).orderBy(['name', 'email']);

export async function getMember(db: Knex, surveyId: string, userId: string): Promise<MemberRow> {
  const row = await members(db, surveyId).where({ user_id: userId }).first<MemberRow | undefined>();
  if (!row) throw notFound('The member');
  return row;
}

export async function updateMemberRole(
  trx: Knex,
  surveyId: string,
  userId: string,
  role: Role,
): Promise<void> {
  await trx('survey_member').where({ survey_id: surveyId, user_id: userId }).update({ role });
}

export async function deleteMember(trx: Knex, surveyId: string, userId: string): Promise<void> {
  await trx('survey_member').where({ survey_id: surveyId, user_id: userId }).delete();
}
