import { describeError } from '../lib/plain-error';
import type { Cluster } from './cluster';

const everyMs = 500;

/** Starts the cluster again when it was killed. The returned function ends the watch and waits for a start under way. */
export function keepAlive(cluster: Cluster, say: (line: string) => void): () => Promise<void> {
  let isStopped = false;
  let pause = everyMs;
  let current: Promise<void> = Promise.resolve();
  let timer: NodeJS.Timeout;

  const look = async () => {
    if (cluster.pid !== null) {
      pause = everyMs;
      return;
    }
    say('it has ended; starting it again');
    try {
      await cluster.start();
      say('running again');
    } catch (error) {
      pause = Math.min(pause * 2, 15_000);
      say(`${describeError(error)}\n  trying again in ${pause / 1000} s`);
    }
  };
  const next = () => {
    timer = setTimeout(() => {
      current = look().then(() => {
        if (!isStopped) next();
      });
    }, pause);
  };
  next();
  return async () => {
    isStopped = true;
    clearTimeout(timer);
    await current;
  };
}
