import { expect, test } from 'vitest';
import { addressKey, countAttempt, deleteOldAttempts, forgiveAttempt } from '../../../server/access/attempts';
import { createTestDatabase } from '../../setup/test-database';

const { knex } = await createTestDatabase();
const failuresOf = async (key: string): Promise<number | undefined> =>
  (await knex('sign_in_attempt').where({ key }).first<{ failures: number } | undefined>('failures'))
    ?.failures;

test('a home network of IPv6 counts as one address, an IPv4 one as itself', () => {
  expect(addressKey('2001:db8:1:2:3:4:5:6')).toBe(addressKey('2001:db8:1:2:ffff::1'));
  expect(addressKey('2001:db8:1:3::1')).not.toBe(addressKey('2001:db8:1:2::1'));
  expect(addressKey('192.0.2.1')).not.toBe(addressKey('192.0.2.2'));
  expect(addressKey('::ffff:192.0.2.1')).toBe(addressKey('192.0.2.1'));
});

test('every key is counted, and the longest wait is told', async () => {
  const limits = [
    { key: 'a', limit: 1, windowS: 60 },
    { key: 'b', limit: 1, windowS: 600 },
  ];
  await countAttempt(knex, limits);
  await expect(countAttempt(knex, limits)).rejects.toMatchObject({
    code: 'rate-limited',
    message: 'Too many attempts. Try again in 10 minutes.',
    details: { retryAfterS: 600 },
  });
  expect(await failuresOf('a')).toBe(2);
});

test('a good attempt is taken back, never below none', async () => {
  const limits = [{ key: 'c', limit: 5, windowS: 60 }];
  await countAttempt(knex, limits);
  await forgiveAttempt(knex, limits);
  await forgiveAttempt(knex, limits);
  expect(await failuresOf('c')).toBe(0);
});

test('what is over is removed', async () => {
  await knex('sign_in_attempt').insert({
    key: 'old',
    failures: 3,
    window_ends_at: knex.raw("now() - interval '1 second'"),
  });
  await deleteOldAttempts(knex);
  expect(await failuresOf('old')).toBeUndefined();
  expect(await failuresOf('a')).toBe(2);
});
