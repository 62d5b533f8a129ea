import { runCommand } from '../lib/command';
import { PlainError } from '../lib/plain-error';

/** The account PostgreSQL runs under; undefined ids mean the one we are. */
export interface Account {
  uid?: number;
  gid?: number;
}

const readId = async (flag: string) => {
  const { code, output } = await runCommand('id', [flag, 'postgres']);
  return code === 0 ? Number(output) : null;
};

/** PostgreSQL refuses to run as root, so root lends it the postgres account. */
export async function findAccount(): Promise<Account> {
  if (process.getuid?.() !== 0) return {};
  const [uid, gid] = [await readId('-u'), await readId('-g')];
  if (uid === null || gid === null) {
    throw new PlainError(
      'PostgreSQL does not run as root and there is no "postgres" account to run it. Add one, then start again:\n' +
        '  adduser --system --group --home /var/lib/postgresql postgres',
    );
  }
  return { uid, gid };
}
