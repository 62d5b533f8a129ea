import { chmodSync, mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { findAccount } from './account';
import { Cluster } from './cluster';
import { ensurePostgres } from './install';

/** A cluster for one test run; it is gone, folder and all, when it stops or when this process ends in any way. */
export async function startThrowAwayCluster(say: (line: string) => void = () => undefined) {
  const bin = await ensurePostgres(say);
  const account = await findAccount();
  const folder = mkdtempSync(join(tmpdir(), 'layerwell-test-'));
  chmodSync(folder, 0o700);
  const cluster = new Cluster({ bin, folder, account, throwAway: true });
  const url = await cluster.start('postgres_tests');
  return { url, stop: () => cluster.stop() };
}
