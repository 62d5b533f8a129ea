import { randomBytes } from 'node:crypto';
import type { Knex } from 'knex';
import { recordAudit } from '../access/audit';
import { hashPassword } from '../access/password';
import { createToken } from '../access/secret-token';
import { findUserByEmail, insertUser } from '../access/user-store';
import { insertReset } from '../access/password-reset-store';

const LINK_LIFE_S = 3600;

/** Makes an account an administrator, adding it where there is none; returns the secret of a link that sets its password. */
export function addAdministrator(db: Knex, person: { email: string; name: string }): Promise<string> {
  return db.transaction(async (trx) => {
    const user =
      (await findUserByEmail(trx, person.email)) ??
      // nobody knows this password: the link sets the first one
      (await insertUser(trx, {
        ...person,
        passwordHash: await hashPassword(randomBytes(32).toString('hex')),
      }));
    await trx('app_user').where({ id: user.id }).update({ is_admin: true, disabled_at: null });
    const { token, hash } = createToken();
    await insertReset(trx, { userId: user.id, tokenHash: hash, lifeS: LINK_LIFE_S });
    await recordAudit(trx, {
      actorId: null,
      surveyId: null,
      action: 'administrator.added',
      subject: person.email,
    });
    return token;
  });
}
