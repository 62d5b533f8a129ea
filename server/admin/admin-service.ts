import { recordAudit } from '../access/audit';
import { keepALead } from '../access/keep-a-lead';
import { invalidateSessionsOf } from '../access/sessions';
import type { Role } from '../contract/roles';
import { AppError } from '../errors';
import type { Context } from '../http/context';
import { presentAdminSurvey, presentAdminUser, presentAuditEvent, presentMail } from './admin-presenter';
import {
  getAdminSurvey,
  getAdminUser,
  listAdminSurveyRows,
  listAdminUserRows,
  pageOfAudit,
  pageOfMail,
  setDisabled,
  setMembership,
  type PageAsked,
} from './admin-store';

export async function listUsers({ db }: Context) {
  return { items: (await listAdminUserRows(db)).map(presentAdminUser) };
}

export async function setUserState({ db, actor }: Context, userId: string, disabled: boolean) {
  if (userId === actor.userId && disabled)
    throw new AppError('wrong-state', 'You cannot switch off your own account. Ask another administrator.');
  return db.transaction(async (trx) => {
    const before = await getAdminUser(trx, userId);
    if ((before.disabled_at !== null) === disabled) return presentAdminUser(before);
    await setDisabled(trx, userId, disabled);
    if (disabled) await invalidateSessionsOf(trx, userId);
    await recordAudit(trx, {
      actorId: actor.userId,
      surveyId: null,
      action: disabled ? 'account.switched-off' : 'account.switched-on',
      subject: before.email,
    });
    return presentAdminUser(await getAdminUser(trx, userId));
  });
}

export async function listSurveys({ db, actor }: Context) {
  return { items: (await listAdminSurveyRows(db, actor.userId)).map(presentAdminSurvey) };
}

export const joinSurvey = ({ db, actor }: Context, surveyId: string, role: Role) =>
  db.transaction(async (trx) => {
    const before = await getAdminSurvey(trx, actor.userId, surveyId);
    if (before.own_role === role) return presentAdminSurvey(before);
    if (before.own_role === 'lead') await keepALead(trx, surveyId, actor.userId);
    await setMembership(trx, surveyId, actor.userId, role);
    await recordAudit(trx, {
      actorId: actor.userId,
      surveyId,
      action: 'survey.joined-by-administrator',
      subject: before.name,
      details: { from: before.own_role, to: role },
    });
    return presentAdminSurvey(await getAdminSurvey(trx, actor.userId, surveyId));
  });

export async function listMail({ db, config }: Context, asked: PageAsked) {
  const { rows, total } = await pageOfMail(db, asked);
  return { items: rows.map(presentMail), total, ...asked, sink: config.mailUrl === null };
}

export async function listAuditEvents({ db }: Context, asked: PageAsked) {
  const { rows, total } = await pageOfAudit(db, asked);
  return { items: rows.map(presentAuditEvent), total, ...asked };
}
