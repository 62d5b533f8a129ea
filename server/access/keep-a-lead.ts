import type { Knex } from 'knex';
import { KEEP_A_LEAD } from '../contract/roles';
import { AppError } from '../errors';

/**
 * Called in the transaction that takes a person's lead away. The survey's row is locked, so that two leads cannot make each
 * other step down at the same moment.
 */
export async function keepALead(trx: Knex, surveyId: string, leavingUserId: string): Promise<void> {
  await trx('survey').where({ id: surveyId }).forUpdate().first('id');
  const members = await trx('survey_member')
    .where({ survey_id: surveyId, role: 'lead' })
    .select<{ user_id: string }[]>('user_id');
  const leads = members.map((member) => member.user_id);
  if (leads.length === 1 && leads[0] === leavingUserId) throw new AppError('wrong-state', KEEP_A_LEAD);
}
