import type { Shutdown } from '../lib/shutdown';
import { step } from '../lib/step';
import { findAccount } from './account';
import { Cluster } from './cluster';
import { chooseFolder } from './folder';
import { ensurePostgres } from './install';
import { keepAlive } from './keep-alive';

/** The checkout's own PostgreSQL, watched until the command stops; returns its address. */
export function startPrivateCluster(root: string, shutdown: Shutdown): Promise<string> {
  return step(
    'PostgreSQL',
    async (say) => {
      const bin = await ensurePostgres(say);
      const account = await findAccount();
      const folder = await chooseFolder(root, account, say);
      const cluster = new Cluster({ bin, folder, account });
      shutdown.add('PostgreSQL', () => cluster.stop());
      const url = await cluster.start();
      const stopWatching = keepAlive(cluster, (line) => say(line));
      shutdown.add('', () => stopWatching());
      return url;
    },
    (url) => `private cluster on 127.0.0.1:${new URL(url).port}`,
  );
}
