import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import { installPackage } from '../lib/debian';
import { PlainError } from '../lib/plain-error';
import { findPostgres } from './binaries';

const createClusterConf = '/etc/postgresql-common/createcluster.conf';

/** The file's text with Debian's own first cluster switched off and every other setting kept. */
export function withoutMainCluster(text: string): string {
  const setting = 'create_main_cluster = false';
  const line = /^[ \t]*#?[ \t]*create_main_cluster[ \t]*=.*$/m;
  if (line.test(text)) return text.replace(line, setting);
  return text === '' || text.endsWith('\n') ? `${text}${setting}\n` : `${text}\n${setting}\n`;
}

function refuseMainCluster(): void {
  const before = existsSync(createClusterConf) ? readFileSync(createClusterConf, 'utf8') : '';
  mkdirSync(dirname(createClusterConf), { recursive: true });
  writeFileSync(createClusterConf, withoutMainCluster(before));
}

/** The folder of PostgreSQL's programs; installs Debian's package when root lacks it. */
export async function ensurePostgres(say: (line: string) => void): Promise<string> {
  const found = findPostgres();
  if (found !== null) return found;
  await installPackage('postgresql', 'PostgreSQL', say, refuseMainCluster);
  const installed = findPostgres();
  if (installed === null) {
    throw new PlainError(
      'The postgresql package was installed, but its programs are not in /usr/lib/postgresql/*/bin.',
    );
  }
  return installed;
}
