import { Logger as QueueLogger } from 'graphile-worker';
import type { Logger } from 'pino';

/** The queue's own lines in our log; its notes on every job are for debugging only. */
export const queueLog = (log: Logger): QueueLogger =>
  new QueueLogger((scope) => (level, message) => {
    const entry = { queue: scope.label, worker: scope.workerId, job: scope.jobId };
    if (level === 'error') log.error(entry, message);
    else if (level === 'warning') log.warn(entry, message);
    else log.debug(entry, message);
  });
