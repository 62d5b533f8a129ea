import { randomBytes } from 'node:crypto';
import { hash, verify } from '@node-rs/argon2';

// OWASP Password Storage Cheat Sheet: argon2id with 19 MiB, two passes, one lane; argon2id is the package's default.
const ARGON2 = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

export const hashPassword = (password: string): Promise<string> => hash(password, ARGON2);

// Compared when there is no account, so that an unknown address takes as long as a wrong password.
const nobodysHash = hashPassword(randomBytes(32).toString('hex'));

export async function verifyPassword(stored: string | null, password: string): Promise<boolean> {
  const matches = await verify(stored ?? (await nobodysHash), password);
  return stored !== null && matches;
}
