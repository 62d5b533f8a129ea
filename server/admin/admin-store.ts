import type { Knex } from 'knex';
import type { Role } from '../contract/roles';
import { notFound } from '../errors';

export interface PageAsked {
  page: number;
  pageSize: number;
}

export interface AdminUserRow {
  id: string;
  email: string;
  name: string;
  is_admin: boolean;
  disabled_at: Date | null;
  created_at: Date;
  surveys: number;
}

export interface AdminSurveyRow {
  id: string;
  name: string;
  members: number;
  own_role: Role | null;
}

export interface MailRow {
  id: string;
  received_at: Date;
  sender: string;
  recipients: string[];
  subject: string;
  text: string;
}

export interface AuditRow {
  id: string;
  at: Date;
  actor_name: string | null;
  survey_id: string | null;
  action: string;
  subject: string;
  details: Record<string, unknown>;
}

const users = (db: Knex): Knex.QueryBuilder =>
  db('app_user').select(
    'app_user.*',
    db.raw('(SELECT count(*)::int FROM survey_member WHERE user_id = app_user.id) AS surveys'),
  );

export const listAdminUserRows = (db: Knex): Promise<AdminUserRow[]> => users(db).orderBy('email');

export async function getAdminUser(db: Knex, id: string): Promise<AdminUserRow> {
  const row = await users(db).where({ id }).first<AdminUserRow | undefined>();
  if (!row) throw notFound('The account');
  return row;
}

export async function setDisabled(trx: Knex, userId: string, disabled: boolean): Promise<void> {
  await trx('app_user')
    .where({ id: userId })
    .update({ disabled_at: disabled ? trx.fn.now() : null });
}

const surveys = (db: Knex, userId: string): Knex.QueryBuilder =>
  db('survey').select(
    'id',
    'name',
    db.raw('(SELECT count(*)::int FROM survey_member WHERE survey_id = survey.id) AS members'),
    db.raw('(SELECT role FROM survey_member WHERE survey_id = survey.id AND user_id = ?) AS own_role', [
      userId,
    ]),
  );

export const listAdminSurveyRows = (db: Knex, userId: string): Promise<AdminSurveyRow[]> =>
  surveys(db, userId).orderBy(['name', 'id']);

export async function getAdminSurvey(db: Knex, userId: string, id: string): Promise<AdminSurveyRow> {
  const row = await surveys(db, userId).where({ id }).first<AdminSurveyRow | undefined>();
  if (!row) throw notFound('The survey');
  return row;
}

export async function setMembership(trx: Knex, surveyId: string, userId: string, role: Role): Promise<void> {
  await trx('survey_member')
    .insert({ survey_id: surveyId, user_id: userId, role })
    .onConflict(['survey_id', 'user_id'])
    .merge(['role']);
}

export async function pageOfMail(db: Knex, asked: PageAsked): Promise<{ rows: MailRow[]; total: number }> {
  const rows = await db('received_mail')
    .orderBy('id', 'desc')
    .limit(asked.pageSize)
    .offset((asked.page - 1) * asked.pageSize)
    .select<MailRow[]>('*');
  return { rows, total: await countOf(db, 'received_mail') };
}

export async function pageOfAudit(db: Knex, asked: PageAsked): Promise<{ rows: AuditRow[]; total: number }> {
  const rows = await db('audit_event')
    .leftJoin('app_user', 'app_user.id', 'audit_event.actor_id')
    .orderBy('audit_event.id', 'desc')
    .limit(asked.pageSize)
    .offset((asked.page - 1) * asked.pageSize)
    .select<AuditRow[]>('audit_event.*', 'app_user.name as actor_name');
  return { rows, total: await countOf(db, 'audit_event') };
}

async function countOf(db: Knex, table: string): Promise<number> {
  const row = await db(table).count({ total: '*' }).first<{ total: string } | undefined>();
  return Number(row?.total ?? 0);
}
