import { readFileSync } from 'node:fs';
import { errorCode } from './plain-error';

export function isAlive(pid: number): boolean {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return errorCode(error) === 'EPERM';
  }
}

/** When the process was started, in kernel ticks: with the number it names one process, even after numbers are used again. */
export function startTicks(pid: number): string | null {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    return stat.slice(stat.lastIndexOf(')') + 2).split(' ')[19] ?? null;
  } catch {
    return null;
  }
}

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
