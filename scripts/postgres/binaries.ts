import { accessSync, constants, readdirSync } from 'node:fs';
import { delimiter, join } from 'node:path';

const needed = ['postgres', 'initdb', 'pg_ctl'];
const oldestMajor = 14;

const isUsable = (folder: string) =>
  needed.every((name) => {
    try {
      accessSync(join(folder, name), constants.X_OK);
      return true;
    } catch {
      return false;
    }
  });

/** Debian's versions, the newest first, then what is on the PATH. */
export function findPostgres(
  debianRoot = '/usr/lib/postgresql',
  path = process.env.PATH ?? '',
): string | null {
  let majors: number[] = [];
  try {
    majors = readdirSync(debianRoot)
      .map(Number)
      .filter((major) => major >= oldestMajor);
  } catch {
    // No Debian package here.
  }
  const debian = majors.sort((a, b) => b - a).map((major) => join(debianRoot, String(major), 'bin'));
  return [...debian, ...path.split(delimiter).filter(Boolean)].find(isUsable) ?? null;
}
