import { recordAudit } from '../access/audit';
import { keepALead } from '../access/keep-a-lead';
import { getSurveyAccess, requireCan } from '../access/survey-access';
import type { Role } from '../contract/roles';
import type { Context } from '../http/context';
import { presentMember } from './member-presenter';
import { deleteMember, getMember, listMemberRows, updateMemberRole } from './member-store';

interface MemberPath {
  surveyId: string;
  userId: string;
}

export async function listMembers({ db, actor }: Context, surveyId: string) {
  await getSurveyAccess(db, actor, surveyId);
  return { items: (await listMemberRows(db, surveyId)).map(presentMember) };
}

export async function setMemberRole({ db, actor }: Context, path: MemberPath, role: Role) {
  requireCan(await getSurveyAccess(db, actor, path.surveyId), 'manageMembers');
  return db.transaction(async (trx) => {
    if (role !== 'lead') await keepALead(trx, path.surveyId, path.userId);
    const before = await getMember(trx, path.surveyId, path.userId);
    await updateMemberRole(trx, path.surveyId, path.userId, role);
    await recordAudit(trx, {
      actorId: actor.userId,
      surveyId: path.surveyId,
      action: 'member.role-set',
      subject: before.email,
      details: { from: before.role, to: role },
    });
    return presentMember({ ...before, role });
  });
}

export async function removeMember({ db, actor }: Context, path: MemberPath): Promise<void> {
  requireCan(await getSurveyAccess(db, actor, path.surveyId), 'manageMembers');
  await db.transaction(async (trx) => {
    await keepALead(trx, path.surveyId, path.userId);
    const member = await getMember(trx, path.surveyId, path.userId);
    await deleteMember(trx, path.surveyId, path.userId);
    await recordAudit(trx, {
      actorId: actor.userId,
      surveyId: path.surveyId,
      action: 'member.removed',
      subject: member.email,
      details: { role: member.role },
    });
  });
}
