import { NodePostgresAdapter } from '@lucia-auth/adapter-postgresql';
import type { Knex } from 'knex';
import { Lucia, TimeSpan } from 'lucia';
import type { Pool } from 'pg';
import type { Config } from '../config';
import { createToken, hashToken } from './secret-token';

interface UserColumns {
  email: string;
  name: string;
  is_admin: boolean;
  disabled_at: Date | null;
}

interface SessionColumns {
  user_agent: string;
}

declare module 'lucia' {
  interface Register {
    Lucia: Lucia<SessionColumns, UserColumns>;
    DatabaseUserAttributes: UserColumns;
    DatabaseSessionAttributes: SessionColumns;
  }
}

export interface ValidSession {
  /** the stored id: a hash of the cookie's secret */
  readonly id: string;
  readonly user: { id: string; email: string; name: string; isAdmin: boolean };
  /** set when the session was prolonged and the browser needs a later cookie */
  readonly renewedCookie: string | null;
}

/** The only place that knows which library keeps the sessions. */
export interface Sessions {
  /** Value of the Set-Cookie header for a new session. */
  create(userId: string, userAgent: string): Promise<string>;
  /** null when the cookie is missing, unknown or expired, or when the account is disabled. */
  validate(cookieHeader: string | undefined): Promise<ValidSession | null>;
  /** The same question for a session known by its stored id, as long streams ask it. */
  isLive(sessionId: string): Promise<boolean>;
  invalidate(sessionId: string): Promise<void>;
  deleteExpired(): Promise<void>;
  readonly blankCookie: string;
}

export const SESSION_COOKIE = 'layerwell_session';

export function createSessions(pool: Pool, config: Pick<Config, 'sessionDays' | 'secureCookies'>): Sessions {
  const lucia = new Lucia(new NodePostgresAdapter(pool, { user: 'app_user', session: 'session' }), {
    sessionExpiresIn: new TimeSpan(config.sessionDays, 'd'),
    sessionCookie: { name: SESSION_COOKIE, attributes: { secure: config.secureCookies, sameSite: 'lax' } },
    getUserAttributes: (columns) => columns,
    getSessionAttributes: (columns) => columns,
  });
  const find = async (id: string) => {
    const { session, user } = await lucia.validateSession(id);
    return session && user.disabled_at === null ? { session, user } : null;
  };
  return {
    async create(userId, userAgent) {
      const { token, hash } = createToken();
      await lucia.createSession(userId, { user_agent: userAgent.slice(0, 300) }, { sessionId: hash });
      return lucia.createSessionCookie(token).serialize();
    },
    async validate(cookieHeader) {
      const token = lucia.readSessionCookie(cookieHeader ?? '');
      const found = token ? await find(hashToken(token)) : null;
      if (!token || !found) return null;
      const { id, email, name, is_admin: isAdmin } = found.user;
      return {
        id: found.session.id,
        user: { id, email, name, isAdmin },
        renewedCookie: found.session.fresh ? lucia.createSessionCookie(token).serialize() : null,
      };
    },
    isLive: async (sessionId) => (await find(sessionId)) !== null,
    invalidate: (sessionId) => lucia.invalidateSession(sessionId),
    deleteExpired: () => lucia.deleteExpiredSessions(),
    blankCookie: lucia.createBlankSessionCookie().serialize(),
  };
}

export interface SessionRow {
  id: string;
  created_at: Date;
  expires_at: Date;
  user_agent: string;
}

/** Ends a person's sessions together with the change that calls for it. */
export async function invalidateSessionsOf(trx: Knex, userId: string, exceptId = ''): Promise<void> {
  await trx('session').where({ user_id: userId }).whereNot({ id: exceptId }).delete();
}

export const listSessionsOf = (db: Knex, userId: string): Promise<SessionRow[]> =>
  db('session')
    .where({ user_id: userId })
    .where('expires_at', '>', db.fn.now())
    .orderBy('created_at', 'desc')
    .select<SessionRow[]>('id', 'created_at', 'expires_at', 'user_agent');
