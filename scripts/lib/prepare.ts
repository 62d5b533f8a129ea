import { runCommand } from './command';
import { PlainError } from './plain-error';

interface Prepared {
  migrated: string[];
  /** null when no demo is asked for */
  demo: { loaded: boolean; accounts: { email: string; password: string; role: string }[] } | null;
}

const lineOf = (text: string) => text.slice(text.lastIndexOf('\n') + 1);

/** Runs the server's prepare process, which migrates and loads the demo, and reads its report. */
export async function prepareDatabase(args: string[], env: NodeJS.ProcessEnv): Promise<Prepared> {
  const { code, output } = await runCommand(process.execPath, args, { env });
  if (code !== 0) throw new PlainError(`The database could not be brought up to date:\n${output}`);
  return JSON.parse(lineOf(output)) as Prepared;
}

export function describePrepared({ migrated, demo }: Prepared): string {
  const schema = migrated.length === 0 ? 'up to date' : `${migrated.length} migrations applied`;
  return demo?.loaded === true ? `${schema}, demo survey loaded` : schema;
}

export function printAccounts({ demo }: Prepared): void {
  if (demo === null || demo.accounts.length === 0) return;
  const width = Math.max(...demo.accounts.map(({ email }) => email.length));
  console.log('\n  Demo accounts');
  for (const { email, password, role } of demo.accounts)
    console.log(`  ${email.padEnd(width)}  ${password}  ${role}`);
}
