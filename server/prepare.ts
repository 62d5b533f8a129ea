import { loadConfig, readEnvFile } from './config';
import { createDatabase } from './db/knex';
import { migrateQueue, migrateToLatest } from './db/migrate';
import { createPool } from './db/pool';

/** What the start command reads from the last line of this process. */
export interface Prepared {
  migrated: string[];
}

async function prepare(): Promise<Prepared> {
  readEnvFile();
  const config = { ...loadConfig(process.env), databasePool: 2 };
  const [knex, pool] = [createDatabase(config), createPool(config)];
  try {
    const migrated = await migrateToLatest(knex);
    await migrateQueue(pool);
    return { migrated };
  } finally {
    await knex.destroy();
    await pool.end();
  }
}

process.stdout.write(`${JSON.stringify(await prepare())}\n`);
