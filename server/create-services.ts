import { setMaxListeners } from 'node:events';
import type { Knex } from 'knex';
import type { Pool } from 'pg';
import type { Logger } from 'pino';
import { createSessions } from './access/sessions';
import { createBackgroundTasks } from './background-tasks';
import type { Config } from './config';
import type { Services } from './http/context';
import { createJobQueue } from './jobs/job-queue';
import { createRunEvents } from './jobs/run-events';
import type { MailSink } from './mail/mail-sink';
import { createMailer } from './mail/mailer';

export interface RunningServices {
  readonly services: Services;
  /** Ends streams, waits for background work, then closes mail and events; the database stays the caller's. */
  close(): Promise<void>;
}

/** Everything a request may need, on a database that the caller opened. */
export async function createServices(given: {
  config: Config;
  log: Logger;
  db: Knex;
  pool: Pool;
}): Promise<RunningServices> {
  const { config, log, db, pool } = given;
  const stop = new AbortController();
  // every open stream listens
  setMaxListeners(0, stop.signal);
  const sink = config.mailUrl === null ? await startSink(db, log) : null;
  const mailer = createMailer(config.mailUrl ?? sink?.url ?? '', config.mailFrom);
  const background = createBackgroundTasks(log);
  const runEvents = createRunEvents(pool, log);
  return {
    services: {
      config,
      db,
      pool,
      log,
      sessions: createSessions(pool, config),
      mailer,
      background,
      jobs: createJobQueue(pool),
      runEvents,
      stopping: stop.signal,
    },
    async close() {
      stop.abort();
      await background.idle();
      mailer.close();
      await sink?.close();
      await runEvents.close();
    },
  };
}

async function startSink(db: Knex, log: Logger): Promise<MailSink> {
  const { startMailSink } = await import('./mail/mail-sink');
  return startMailSink(db, log);
}
