import { pino } from 'pino';
import { loadConfig, readEnvFile } from './config';
import { createDatabase } from './db/knex';
import { migrateQueue, migrateToLatest } from './db/migrate';
import { createPool } from './db/pool';
import { loadDemo, type LoadedDemo } from './demo/load-demo';
import { createJobQueue } from './jobs/job-queue';
import { createRunEvents } from './jobs/run-events';

/** What the start command reads from the last line of this process. */
export interface Prepared {
  migrated: string[];
  /** null when no demo is asked for */
  demo: LoadedDemo | null;
}

async function prepare(): Promise<Prepared> {
  readEnvFile();
  const config = { ...loadConfig(process.env), databasePool: 2 };
  const log = pino({ level: 'warn' }, pino.destination(2));
  const [db, pool] = [createDatabase(config), createPool(config)];
  const runEvents = createRunEvents(pool, log);
  try {
    const migrated = await migrateToLatest(db);
    await migrateQueue(pool);
    const demo = config.loadDemo ? await loadDemo({ db, jobs: createJobQueue(pool), runEvents }) : null;
    return { migrated, demo };
  } finally {
    await runEvents.close();
    await db.destroy();
    await pool.end();
  }
}

process.stdout.write(`${JSON.stringify(await prepare())}\n`);
