import { AppError } from '../errors';
import type { PublicContext } from '../http/context';
import { addressKey, countAttempt, forgiveAttempt, type AttemptLimit } from './attempts';
import { verifyPassword } from './password';
import { findUserByEmail, type UserRow } from './user-store';

const WINDOW_S = 900;

/**
 * One address can use up its own tries at an account, never the account's: its owner signs in from elsewhere meanwhile.
 * The account's own limit, against guessing from many addresses at once, lies above what one address may spend.
 */
const limitsOf = (email: string, clientAddress: string): AttemptLimit[] => {
  const address = addressKey(clientAddress);
  return [
    { key: `address ${address}`, limit: 30, windowS: WINDOW_S },
    { key: `account ${email} from ${address}`, limit: 10, windowS: WINDOW_S },
    { key: `account ${email}`, limit: 100, windowS: WINDOW_S },
  ];
};

/** The account of these credentials. An unknown address is told and timed like a wrong password. */
export async function checkCredentials(
  { db, clientAddress }: Pick<PublicContext, 'db' | 'clientAddress'>,
  { email, password }: { email: string; password: string },
): Promise<UserRow> {
  const limits = limitsOf(email, clientAddress);
  await countAttempt(db, limits);
  const user = await findUserByEmail(db, email);
  const matches = await verifyPassword(user?.password_hash ?? null, password);
  if (!user || !matches)
    throw new AppError('unauthenticated', 'This e-mail address and password do not belong together.');
  await forgiveAttempt(db, limits);
  if (user.disabled_at)
    throw new AppError('forbidden', 'This account is switched off. Ask an administrator to switch it on.');
  return user;
}
