import type { Logger } from 'pino';

const PATIENCE_MS = 10_000;

/**
 * Runs `stop` once at SIGTERM, SIGINT or the parent's end, then leaves. The same signal again leaves at once; another one
 * does not, because Ctrl-C reaches a child both from the terminal and through its supervisor.
 */
export function stopOnSignal(log: Logger, stop: () => Promise<void>): void {
  let first: string | null = null;
  const leave = (reason: string): void => {
    if (reason === first) process.exit(1);
    if (first !== null) return;
    first = reason;
    log.info({ reason }, 'stopping');
    setTimeout(() => process.exit(1), PATIENCE_MS).unref();
    stop().then(
      () => process.exit(0),
      (error: unknown) => {
        log.error({ err: error }, 'the stop was not clean');
        process.exit(1);
      },
    );
  };
  process.on('SIGTERM', () => leave('SIGTERM'));
  process.on('SIGINT', () => leave('SIGINT'));
  // without its supervisor a child would hold the port against the next start
  process.on('disconnect', () => leave('parent gone'));
}
