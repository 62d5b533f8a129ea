import type { Knex } from 'knex';

export interface AuditEntry {
  readonly actorId: string | null;
  readonly surveyId: string | null;
  /** area and verb, such as `member.role-set` */
  readonly action: string;
  /** what it was done to, in words a person can find it by */
  readonly subject: string;
  readonly details?: Record<string, unknown>;
}

/** Written in the transaction of the act itself, so that neither stands without the other. */
export async function recordAudit(trx: Knex, entry: AuditEntry): Promise<void> {
  await trx('audit_event').insert({
    actor_id: entry.actorId,
    survey_id: entry.surveyId,
    action: entry.action,
    subject: entry.subject,
    details: JSON.stringify(entry.details ?? {}),
  });
}
