import type { Logger } from 'pino';

export interface OutageLog {
  failed(error: unknown): void;
  worked(): void;
}

/** One line when something stops working and one when it works again, however often it is tried in between. */
export function createOutageLog(log: Logger, what: string): OutageLog {
  let out = false;
  return {
    failed(error) {
      if (!out) log.warn({ err: error }, `${what}: out of order; trying again until it works`);
      out = true;
    },
    worked() {
      if (out) log.info(`${what}: works again`);
      out = false;
    },
  };
}
