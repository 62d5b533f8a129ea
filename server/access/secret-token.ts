import { createHash, randomBytes } from 'node:crypto';

/** What stands in the database for a secret: reading a copy of the tables gives no one a session or a link. */
export const hashToken = (token: string): string => createHash('sha256').update(token).digest('hex');

/** 256 random bits for a link or a cookie, and the hash to store in their place. */
export function createToken(): { token: string; hash: string } {
  const token = randomBytes(32).toString('base64url');
  return { token, hash: hashToken(token) };
}
