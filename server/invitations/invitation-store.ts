import type { Knex } from 'knex';
import type { Role } from '../contract/roles';
import { notFound } from '../errors';

export interface InvitationRow {
  id: string;
  email: string;
  role: Role;
  survey_name: string;
  inviter_id: string;
  inviter_name: string;
  created_at: Date;
  expires_at: Date;
  accepted_at: Date | null;
  revoked_at: Date | null;
}

export interface OfferRow extends InvitationRow {
  survey_id: string;
  has_account: boolean;
}

const invitations = (db: Knex): Knex.QueryBuilder =>
  db('invitation')
    .join('app_user as inviter', 'inviter.id', 'invitation.invited_by')
    .join('survey', 'survey.id', 'invitation.survey_id')
    .select(
      'invitation.*',
      'inviter.name as inviter_name',
      'inviter.id as inviter_id',
      'survey.name as survey_name',
    );

export const listInvitationRows = (db: Knex, surveyId: string): Promise<InvitationRow[]> =>
  invitations(db).where({ survey_id: surveyId }).orderBy('invitation.created_at', 'desc');

export async function getInvitation(db: Knex, surveyId: string, id: string): Promise<InvitationRow> {
  const row = await invitations(db)
    .where({ survey_id: surveyId, 'invitation.id': id })
    .first<InvitationRow | undefined>();
  if (!row) throw notFound('The invitation');
  return row;
}

const open = (db: Knex): Knex.QueryBuilder =>
  db('invitation').whereNull('accepted_at').whereNull('revoked_at');

export async function findOffer(db: Knex, tokenHash: string): Promise<OfferRow | null> {
  const row = await invitations(db)
    .where({ token_hash: tokenHash })
    .whereNull('accepted_at')
    .whereNull('revoked_at')
    .where('expires_at', '>', db.fn.now())
    .select(db.raw('EXISTS (SELECT FROM app_user WHERE app_user.email = invitation.email) AS has_account'))
    .first<OfferRow | undefined>();
  return row ?? null;
}

export async function insertInvitation(
  trx: Knex,
  given: {
    email: string;
    surveyId: string;
    role: Role;
    tokenHash: string;
    invitedBy: string;
    lifeS: number;
  },
): Promise<string> {
  const [row] = await trx('invitation')
    .insert({
      email: given.email,
      survey_id: given.surveyId,
      role: given.role,
      token_hash: given.tokenHash,
      invited_by: given.invitedBy,
      expires_at: trx.raw('now() + make_interval(secs => ?)', [given.lifeS]),
    })
    .returning<{ id: string }[]>('id');
  if (!row) throw new Error('the new invitation was not returned');
  return row.id;
}

export async function revokeOpenTo(trx: Knex, surveyId: string, email: string): Promise<void> {
  await open(trx).where({ survey_id: surveyId, email }).update({ revoked_at: trx.fn.now() });
}

export const markRevoked = async (trx: Knex, id: string): Promise<boolean> =>
  (await open(trx).where({ id }).update({ revoked_at: trx.fn.now() })) > 0;

/** False when someone was faster: an invitation is accepted once. */
export const spendInvitation = async (trx: Knex, id: string): Promise<boolean> =>
  (await open(trx)
    .where({ id })
    .where('expires_at', '>', trx.fn.now())
    .update({ accepted_at: trx.fn.now() })) > 0;

export const isMember = async (db: Knex, surveyId: string, email: string): Promise<boolean> =>
  (await db('survey_member')
    .join('app_user', 'app_user.id', 'survey_member.user_id')
    .where({ survey_id: surveyId, email })
    .first<{ user_id: string } | undefined>('user_id')) !== undefined;

/** Someone who joined meanwhile in another way keeps the role they have. */
export async function insertMember(trx: Knex, surveyId: string, userId: string, role: Role): Promise<void> {
  await trx('survey_member')
    .insert({ survey_id: surveyId, user_id: userId, role })
    .onConflict(['survey_id', 'user_id'])
    .ignore();
}
