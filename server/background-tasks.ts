import type { Logger } from 'pino';

/** Work that an answer does not wait for; failures are logged, and a stop waits until all of it is done. */
export interface BackgroundTasks {
  run(what: string, task: () => Promise<void>): void;
  idle(): Promise<void>;
}

export function createBackgroundTasks(log: Logger): BackgroundTasks {
  const open = new Set<Promise<void>>();
  return {
    run(what, task) {
      const ended = task()
        .catch((error: unknown) => log.error({ err: error }, `${what} failed`))
        .finally(() => open.delete(ended));
      open.add(ended);
    },
    async idle() {
      while (open.size > 0) await Promise.all(open);
    },
  };
}
