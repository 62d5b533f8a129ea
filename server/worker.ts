import { join } from 'node:path';
import { pino } from 'pino';
import { createDatabase } from './db/knex';
import { createPool } from './db/pool';
import { startRunWorker } from './jobs/run-worker';
import { readConfig } from './read-config';
import { stopOnSignal } from './stop-on-signal';

const config = readConfig();
const log = pino({ level: config.logLevel, base: { process: 'worker' } });

function fail(error: unknown): void {
  log.fatal({ err: error }, 'unexpected fault; the worker ends');
  process.exit(1);
}
process.on('uncaughtException', fail);
process.on('unhandledRejection', fail);

const lost = (error: Error) => log.warn({ err: error }, 'a connection to the database was lost');
const db = createDatabase(config, lost);
// two connections listen for good, the others take and end jobs
const databasePool = Math.max(config.databasePool, config.workerThreads + 4);
const pool = createPool({ ...config, databasePool }, lost);
const isSource = import.meta.url.endsWith('.ts');
const worker = startRunWorker({
  db,
  pool,
  log,
  threads: config.workerThreads,
  threadFile: join(import.meta.dirname, isSource ? 'jobs/fit-thread.ts' : 'fit-thread.js'),
});
log.info({ threads: config.workerThreads }, 'worker started');

stopOnSignal(log, async () => {
  await worker.stop();
  await db.destroy();
  await pool.end();
});
