import { delay } from './alive';

/** Where a server that listens on `host` answers on this machine. */
export const localAddress = (host: string, port: number) => {
  const reachable = host === '0.0.0.0' ? '127.0.0.1' : host === '::' ? '::1' : host;
  return `http://${reachable.includes(':') ? `[${reachable}]` : reachable}:${port}`;
};

async function answers(url: string): Promise<boolean> {
  try {
    return (await fetch(url, { signal: AbortSignal.timeout(2_000) })).ok;
  } catch {
    return false;
  }
}

/** true once the address answers 2xx; false when the time is over or `isHopeless` says so. */
export async function waitForAnswer(
  url: string,
  milliseconds: number,
  isHopeless: () => boolean = () => false,
): Promise<boolean> {
  const end = Date.now() + milliseconds;
  while (Date.now() < end && !isHopeless()) {
    if (await answers(url)) return true;
    await delay(60);
  }
  return false;
}
