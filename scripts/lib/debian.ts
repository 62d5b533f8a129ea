import { existsSync } from 'node:fs';
import { runCommand } from './command';
import { PlainError } from './plain-error';

const apt = '/usr/bin/apt-get';
const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };

// dpkg asks about a settings file that is already there whatever the frontend; the one that is there stays.
const options = [
  'DPkg::Lock::Timeout=120',
  'Dpkg::Options::=--force-confdef',
  'Dpkg::Options::=--force-confold',
];

async function aptGet(args: string[], what: string): Promise<void> {
  const { code, output } = await runCommand(
    apt,
    ['-qq', ...options.flatMap((option) => ['-o', option]), ...args],
    { env },
  );
  if (code === 0) return;
  const tail = output.split('\n').slice(-6).join('\n  ');
  throw new PlainError(`${what} could not be installed: apt-get ${args.join(' ')} failed:\n  ${tail}`);
}

/** Installs a Debian package as root; anyone else is told the one command to run. */
export async function installPackage(
  name: string,
  what: string,
  say: (line: string) => void,
  before: () => void = () => undefined,
): Promise<void> {
  if (!existsSync(apt))
    throw new PlainError(
      `${what} is missing and there is no apt-get here: install ${what}, then start again.`,
    );
  if (process.getuid?.() !== 0) {
    throw new PlainError(
      `${what} is missing. Install it, then start again:\n  sudo apt-get install --no-install-recommends ${name}`,
    );
  }
  before();
  say(`installing Debian's ${name} package`);
  await aptGet(['update'], what);
  await aptGet(['install', '-y', '--no-install-recommends', name], what);
}
