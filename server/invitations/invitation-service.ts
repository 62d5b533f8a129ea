import type { z } from 'zod';
import { countAttempt } from '../access/attempts';
import { recordAudit } from '../access/audit';
import { createToken } from '../access/secret-token';
import { getSurveyAccess, requireCan } from '../access/survey-access';
import { ROLE_NAMES } from '../contract/roles';
import type { createInvitationSchema } from '../contract/surveys';
import { AppError } from '../errors';
import type { Context } from '../http/context';
import { presentInvitation } from './invitation-presenter';
import {
  getInvitation,
  insertInvitation,
  isMember,
  listInvitationRows,
  markRevoked,
  revokeOpenTo,
  type InvitationRow,
} from './invitation-store';

const LIFE_S = 14 * 86_400;

export async function listInvitations({ db, actor }: Context, surveyId: string) {
  requireCan(await getSurveyAccess(db, actor, surveyId), 'manageMembers');
  return { items: (await listInvitationRows(db, surveyId)).map(presentInvitation) };
}

export async function invite(
  context: Context,
  surveyId: string,
  { email, role }: z.output<typeof createInvitationSchema>,
) {
  const { db, actor } = context;
  requireCan(await getSurveyAccess(db, actor, surveyId), 'manageMembers');
  // an account that was broken into must not send mail without end
  await countAttempt(db, [{ key: `invitations by ${actor.userId}`, limit: 100, windowS: 3600 }]);
  const { token, hash } = createToken();
  const row = await db.transaction(async (trx) => {
    if (await isMember(trx, surveyId, email))
      throw new AppError('already-exists', `${email} is a member of this survey already.`);
    await revokeOpenTo(trx, surveyId, email);
    const id = await insertInvitation(trx, {
      email,
      surveyId,
      role,
      tokenHash: hash,
      invitedBy: actor.userId,
      lifeS: LIFE_S,
    });
    await recordAudit(trx, {
      actorId: actor.userId,
      surveyId,
      action: 'invitation.sent',
      subject: email,
      details: { role },
    });
    return getInvitation(trx, surveyId, id);
  });
  context.background.run('sending an invitation', () => sendInvitation(context, row, token));
  return presentInvitation(row);
}

const sendInvitation = (
  { config, mailer, actor }: Context,
  row: InvitationRow,
  token: string,
): Promise<void> =>
  mailer.send({
    to: row.email,
    subject: `${actor.name} invites you to the survey ${row.survey_name}`,
    text: [
      'Hello,',
      `${actor.name} invites you to the survey “${row.survey_name}” in Layerwell as ${ROLE_NAMES[row.role]}. Open this address within 14 days to accept:`,
      `${config.publicUrl}/invitations/${token}`,
      'If you do not expect this, do nothing.',
    ].join('\n\n'),
  });

export async function revokeInvitation(
  { db, actor }: Context,
  path: { surveyId: string; invitationId: string },
): Promise<void> {
  requireCan(await getSurveyAccess(db, actor, path.surveyId), 'manageMembers');
  await db.transaction(async (trx) => {
    const row = await getInvitation(trx, path.surveyId, path.invitationId);
    const revoked = await markRevoked(trx, row.id);
    if (!revoked && row.accepted_at)
      throw new AppError('wrong-state', 'This invitation was accepted already. Remove the member instead.');
    if (!revoked) return;
    await recordAudit(trx, {
      actorId: actor.userId,
      surveyId: path.surveyId,
      action: 'invitation.revoked',
      subject: row.email,
    });
  });
}
