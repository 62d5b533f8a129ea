import { addressKey, countAttempt } from '../access/attempts';
import { recordAudit } from '../access/audit';
import { hashPassword } from '../access/password';
import { createToken, hashToken } from '../access/secret-token';
import { invalidateSessionsOf } from '../access/sessions';
import { findUserByEmail, setPasswordHash } from '../access/user-store';
import { AppError } from '../errors';
import type { PublicContext } from '../http/context';
import { findOpenReset, insertReset, useReset } from '../access/password-reset-store';

const HOUR_S = 3600;

/** Everything that depends on the account happens after the answer, so that its time tells nothing either. */
export async function requestPasswordReset(context: PublicContext, email: string): Promise<void> {
  const address = addressKey(context.clientAddress);
  await countAttempt(context.db, [{ key: `reset by ${address}`, limit: 20, windowS: HOUR_S }]);
  context.background.run('sending a password reset', () => sendReset(context, email));
}

async function sendReset({ db, config, mailer, log }: PublicContext, email: string): Promise<void> {
  const user = await findUserByEmail(db, email);
  if (!user || user.disabled_at) return;
  try {
    await countAttempt(db, [{ key: `reset of ${user.id}`, limit: 5, windowS: HOUR_S }]);
  } catch (error) {
    if (!(error instanceof AppError)) throw error;
    return log.warn({ userId: user.id }, 'no more password resets are sent to this account for now');
  }
  const { token, hash } = createToken();
  await insertReset(db, { userId: user.id, tokenHash: hash, lifeS: HOUR_S });
  await mailer.send({
    to: email,
    subject: 'Set a new password for Layerwell',
    text: [
      `Hello ${user.name},`,
      'Someone asked to set a new password for your Layerwell account. If it was you, open this address within one hour:',
      `${config.publicUrl}/reset-password/${token}`,
      'It works once. If it was not you, do nothing: your password stays as it is.',
    ].join('\n\n'),
  });
}

export async function resetPassword(
  { db }: PublicContext,
  token: string,
  newPassword: string,
): Promise<void> {
  const tokenHash = hashToken(token);
  // hashing is dear: never for a made-up link
  if (!(await findOpenReset(db, tokenHash))) throw spentLink();
  const passwordHash = await hashPassword(newPassword);
  await db.transaction(async (trx) => {
    const user = await useReset(trx, tokenHash);
    if (!user) throw spentLink();
    await setPasswordHash(trx, user.id, passwordHash);
    await invalidateSessionsOf(trx, user.id);
    await recordAudit(trx, {
      actorId: user.id,
      surveyId: null,
      action: 'password.reset',
      subject: user.email,
    });
  });
}

const spentLink = (): AppError =>
  new AppError('not-found', 'This link was used already or has expired. Ask for a new one.');
