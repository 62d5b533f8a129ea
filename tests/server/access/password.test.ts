import { expect, test } from 'vitest';
import { hashPassword, verifyPassword } from '../../../server/access/password';

test('argon2id with the cost that OWASP asks for', async () => {
  expect(await hashPassword('correct horse battery')).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
});

test('verifies, and nothing matches a missing account', async () => {
  const hash = await hashPassword('correct horse battery');
  expect(await verifyPassword(hash, 'correct horse battery')).toBe(true);
  expect(await verifyPassword(hash, 'correct horse')).toBe(false);
  expect(await verifyPassword(null, 'correct horse battery')).toBe(false);
});
