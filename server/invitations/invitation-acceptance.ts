import type { z } from 'zod';
import { recordAudit } from '../access/audit';
import { checkCredentials } from '../access/check-credentials';
import { hashPassword } from '../access/password';
import { presentMe } from '../access/present-me';
import { hashToken } from '../access/secret-token';
import { findUserByEmail, insertUser, type UserRow } from '../access/user-store';
import type { Fault } from '../contract/common';
import { passwordSchema, type acceptInvitationSchema, type Me } from '../contract/session';
import { AppError } from '../errors';
import type { PublicContext } from '../http/context';
import { IN_PLAIN_WORDS } from '../plain-faults';
import { presentOffer } from './invitation-presenter';
import { findOffer, insertMember, spendInvitation, type OfferRow } from './invitation-store';

type Answer = z.output<typeof acceptInvitationSchema>;

export const showOffer = async ({ db }: PublicContext, token: string) =>
  presentOffer(await getOffer({ db }, token));

/** Joins with the account of the invited address: the existing one by its password, else a new one. */
export async function acceptInvitation(
  context: PublicContext,
  token: string,
  answer: Answer,
  userAgent: string,
): Promise<{ me: Me; cookie: string }> {
  const { db } = context;
  const offer = await getOffer(context, token);
  const existing = await findUserByEmail(db, offer.email);
  if (existing) await checkCredentials(context, { email: offer.email, password: answer.password });
  const account = existing ?? (await newAccount(offer.email, answer));
  const user = await db.transaction(async (trx): Promise<UserRow> => {
    if (!(await spendInvitation(trx, offer.id))) throw spentLink();
    const joined = 'passwordHash' in account ? await insertUser(trx, account) : account;
    await insertMember(trx, offer.survey_id, joined.id, offer.role);
    await recordAudit(trx, {
      actorId: joined.id,
      surveyId: offer.survey_id,
      action: 'invitation.accepted',
      subject: joined.email,
      details: { role: offer.role, newAccount: existing === null },
    });
    return joined;
  });
  return {
    me: presentMe({ ...user, isAdmin: user.is_admin }),
    cookie: await context.sessions.create(user.id, userAgent),
  };
}

async function getOffer({ db }: Pick<PublicContext, 'db'>, token: string): Promise<OfferRow> {
  const offer = await findOffer(db, hashToken(token));
  if (!offer) throw spentLink();
  return offer;
}

const spentLink = (): AppError =>
  new AppError(
    'not-found',
    'This invitation was accepted or revoked already, or has expired. Ask for a new one.',
  );

async function newAccount(email: string, answer: Answer) {
  const faults: Fault[] = [];
  if (!answer.name) faults.push({ path: ['body', 'name'], message: 'is needed for a new account' });
  const password = passwordSchema.safeParse(answer.password, IN_PLAIN_WORDS);
  for (const issue of password.error?.issues ?? [])
    faults.push({ path: ['body', 'password'], message: issue.message });
  if (!answer.name || faults.length > 0)
    throw new AppError('invalid', 'The new account needs a name and a password.', { faults });
  return { email, name: answer.name, passwordHash: await hashPassword(answer.password) };
}
