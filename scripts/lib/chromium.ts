import { existsSync } from 'node:fs';
import { installPackage } from './debian';
import { PlainError } from './plain-error';

const path = '/usr/bin/chromium';

/** Debian's browser; installed when root lacks it. */
export async function ensureChromium(say: (line: string) => void): Promise<string> {
  if (!existsSync(path)) await installPackage('chromium', 'Chromium', say);
  if (!existsSync(path))
    throw new PlainError(`The chromium package was installed, but ${path} is not there.`);
  return path;
}
