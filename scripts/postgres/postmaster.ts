import { readdirSync, readFileSync, readlinkSync, realpathSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { isAlive } from '../lib/alive';

export interface Postmaster {
  pid: number;
  port: number;
}

/** What postmaster.pid says, whether or not that process is still there. */
export function readPostmaster(data: string): Postmaster | null {
  try {
    const lines = readFileSync(join(data, 'postmaster.pid'), 'utf8').split('\n');
    const [pid, port] = [Number(lines[0]), Number(lines[3])];
    return Number.isInteger(pid) && pid > 0 ? { pid, port } : null;
  } catch {
    return null;
  }
}

/** Every process of a cluster works inside its data folder, so a number used again by another program is not mistaken for it. */
const worksIn = (pid: number, folder: string) => {
  try {
    return readlinkSync(`/proc/${pid}/cwd`) === folder;
  } catch {
    return false;
  }
};

/** The postmaster of this data folder when it runs. */
export function livePostmaster(data: string): Postmaster | null {
  const noted = readPostmaster(data);
  return noted !== null && isAlive(noted.pid) && worksIn(noted.pid, realpathSync(data)) ? noted : null;
}

/** The processes of this data folder, among them those a killed postmaster left behind. */
export function clusterProcesses(data: string): number[] {
  let folder: string;
  try {
    folder = realpathSync(data);
  } catch {
    return [];
  }
  return readdirSync('/proc')
    .map(Number)
    .filter((pid) => Number.isInteger(pid) && worksIn(pid, folder));
}

/**
 * After a kill, the number in a lock file may belong to another program by now, or to a process that nobody has reaped,
 * which PostgreSQL takes for a running server. Only with no process left in the folder are the files removed.
 */
export function clearStaleLocks(data: string, socket: string | null): void {
  if (clusterProcesses(data).length > 0) return;
  rmSync(join(data, 'postmaster.pid'), { force: true });
  if (socket === null) return;
  for (const name of readdirSync(socket)) rmSync(join(socket, name), { force: true });
}
