import type { Request } from 'express';
import { AppError } from '../errors';
import type { Actor } from './actor';
import type { Sessions } from './sessions';

/** Who asks, by the session cookie; a prolonged session's later cookie goes out with the answer. */
export async function authenticate({ sessions }: { sessions: Sessions }, request: Request): Promise<Actor> {
  const session = await sessions.validate(request.headers.cookie);
  if (!session) throw new AppError('unauthenticated', 'Sign in first.');
  if (session.renewedCookie) request.res?.append('Set-Cookie', session.renewedCookie);
  const { id: userId, email, name, isAdmin } = session.user;
  return { userId, email, name, isAdmin, sessionId: session.id };
}
