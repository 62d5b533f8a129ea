import type { Knex } from 'knex';
import type { Pool } from 'pg';
import type { Logger } from 'pino';
import type { Actor } from '../access/actor';
import type { Sessions } from '../access/sessions';
import type { BackgroundTasks } from '../background-tasks';
import type { Config } from '../config';
import type { JobQueue } from '../jobs/job-queue';
import type { RunEvents } from '../jobs/run-events';
import type { Mailer } from '../mail/mailer';

/** What the server is made of; built once in main, given to every request. */
export interface Services {
  readonly config: Config;
  readonly db: Knex;
  readonly pool: Pool;
  readonly log: Logger;
  readonly sessions: Sessions;
  readonly mailer: Mailer;
  readonly background: BackgroundTasks;
  readonly jobs: JobQueue;
  readonly runEvents: RunEvents;
  /** aborted when the process stops; streams end then */
  readonly stopping: AbortSignal;
}

/** One request as a service sees it. */
export interface PublicContext extends Services {
  readonly requestId: string;
  readonly clientAddress: string;
}

export interface Context extends PublicContext {
  readonly actor: Actor;
}

/** What a service of the domain needs of a request: who asks, and what it reads, writes and announces with. */
export type Work = Pick<Context, 'actor' | 'db' | 'jobs' | 'runEvents'>;
