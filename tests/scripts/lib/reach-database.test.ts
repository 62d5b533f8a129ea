import { afterAll, describe, expect, it } from 'vitest';
import { anyFreePort } from '../../../scripts/lib/port';
import { PlainError } from '../../../scripts/lib/plain-error';
import { reachDatabase } from '../../../scripts/lib/reach-database';
import { startThrowAwayCluster } from '../../../scripts/postgres/throw-away';

const cluster = await startThrowAwayCluster();
afterAll(() => cluster.stop());

async function refusal(url: string): Promise<string> {
  const error: unknown = await reachDatabase(url).then(
    () => null,
    (reason: unknown) => reason,
  );
  expect(error).toBeInstanceOf(PlainError);
  return (error as PlainError).message;
}

describe('the database of DATABASE_URL', () => {
  it('is taken when it answers', async () => {
    await expect(reachDatabase(cluster.url)).resolves.toBeUndefined();
  });

  it('is refused in plain words when the password is wrong, without telling it', async () => {
    const url = new URL(cluster.url);
    url.password = 'mistyped';
    const message = await refusal(url.toString());
    expect(message).toContain(`The database at ${url.host} cannot be used: password authentication failed`);
    expect(message).not.toContain('mistyped');
  });

  it.each(['127.0.0.1', 'localhost'])(
    'is refused with its reason when nothing listens at %s',
    async (name) => {
      const message = await refusal(`postgres://person:secret@${name}:${await anyFreePort()}/layerwell`);
      expect(message).toMatch(/cannot be used: .*ECONNREFUSED/);
    },
  );
});
