import { readFileSync } from 'node:fs';
import { errorCode } from './plain-error';

/** The fields of /proc/<pid>/stat after the name, the state first; null where there is no such file. */
function statFields(pid: number): string[] | null {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    return stat.slice(stat.lastIndexOf(')') + 2).split(' ');
  } catch {
    return null;
  }
}

/** A process that has ended but whose parent has not asked how (a zombie) is not alive. */
export function isAlive(pid: number): boolean {
  try {
    process.kill(pid, 0);
  } catch (error) {
    if (errorCode(error) !== 'EPERM') return false;
  }
  return statFields(pid)?.[0] !== 'Z';
}

/** When the process was started, in kernel ticks: with the number it names one process, even after numbers are used again. */
export const startTicks = (pid: number): string | null => statFields(pid)?.[19] ?? null;

export const delay = (milliseconds: number) =>
  new Promise<void>((resolve) => setTimeout(resolve, milliseconds));

/** true as soon as `check` holds, false when the time is over. */
export async function waitUntil(
  check: () => boolean | Promise<boolean>,
  milliseconds: number,
): Promise<boolean> {
  const end = Date.now() + milliseconds;
  for (;;) {
    if (await check()) return true;
    if (Date.now() >= end) return false;
    await delay(50);
  }
}
