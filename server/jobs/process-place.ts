import { readFileSync, readlinkSync } from 'node:fs';
import { hostname } from 'node:os';

function told(read: () => string): string {
  try {
    return read().trim();
  } catch {
    // Linux alone tells it; elsewhere a machine goes by its name
    return '';
  }
}

/** Where a process id names one process: a boot and a container of a machine. Names of machines are not unique. */
export const PROCESS_PLACE = [
  hostname(),
  told(() => readFileSync('/proc/sys/kernel/random/boot_id', 'utf8')),
  told(() => readlinkSync('/proc/self/ns/pid')),
].join('/');
