import type { z } from 'zod';
import { countAttempt, forgiveAttempt } from '../access/attempts';
import { recordAudit } from '../access/audit';
import { checkCredentials } from '../access/check-credentials';
import { hashPassword, verifyPassword } from '../access/password';
import { presentActor, presentMe } from '../access/present-me';
import { invalidateSessionsOf, listSessionsOf } from '../access/sessions';
import { findUser, setPasswordHash } from '../access/user-store';
import type { changePasswordSchema, Me, signInSchema, updateMeSchema } from '../contract/session';
import { AppError } from '../errors';
import type { Context, PublicContext } from '../http/context';
import { presentSession } from './session-presenter';
import { updateUserName } from './session-store';

export async function signIn(
  context: PublicContext,
  credentials: z.output<typeof signInSchema>,
  oldCookies: string | undefined,
  userAgent: string,
): Promise<{ me: Me; cookie: string }> {
  const user = await checkCredentials(context, credentials);
  const old = await context.sessions.validate(oldCookies);
  if (old) await context.sessions.invalidate(old.id);
  const cookie = await context.sessions.create(user.id, userAgent);
  return { me: presentMe({ ...user, isAdmin: user.is_admin }), cookie };
}

export const signOut = ({ sessions, actor }: Context): Promise<void> => sessions.invalidate(actor.sessionId);

export const signOutEverywhere = ({ db, actor }: Context): Promise<void> =>
  invalidateSessionsOf(db, actor.userId);

export async function listSessions({ db, actor }: Context) {
  const rows = await listSessionsOf(db, actor.userId);
  return { items: rows.map((row) => presentSession(row, actor.sessionId)) };
}

export const getMe = ({ actor }: Context): Me => presentActor(actor);

export async function renameMe(
  { db, actor }: Context,
  { name }: z.output<typeof updateMeSchema>,
): Promise<Me> {
  await updateUserName(db, actor.userId, name);
  return presentActor({ ...actor, name });
}

/** Whoever found an open browser must not be able to guess the password here faster than at the door. */
export async function changePassword(
  { db, actor }: Context,
  { currentPassword, newPassword }: z.output<typeof changePasswordSchema>,
): Promise<void> {
  const limits = [{ key: `password of ${actor.userId}`, limit: 10, windowS: 900 }];
  await countAttempt(db, limits);
  const user = await findUser(db, actor.userId);
  if (!(await verifyPassword(user?.password_hash ?? null, currentPassword)))
    throw new AppError('invalid', 'The current password is not right.', {
      faults: [{ path: ['body', 'currentPassword'], message: 'is not the current password' }],
    });
  const passwordHash = await hashPassword(newPassword);
  await db.transaction(async (trx) => {
    await setPasswordHash(trx, actor.userId, passwordHash);
    await invalidateSessionsOf(trx, actor.userId, actor.sessionId);
    await recordAudit(trx, {
      actorId: actor.userId,
      surveyId: null,
      action: 'password.changed',
      subject: actor.email,
    });
  });
  await forgiveAttempt(db, limits);
}
