import { randomBytes } from 'node:crypto';
import type { Knex } from 'knex';
import type { Pool } from 'pg';
import { afterAll, inject } from 'vitest';
import { loadConfig, type Config } from '../../server/config';
import { createDatabase } from '../../server/db/knex';
import { createPool } from '../../server/db/pool';
import { dropDatabase, runSql, withDatabase } from './run-sql';

export interface TestDatabase {
  url: string;
  /** Every other setting is its default; logs are silent. */
  config: Config;
  knex: Knex;
  pool: Pool;
}

interface DatabaseOptions {
  empty?: boolean;
  demo?: boolean;
}

const templateOf = ({ empty = false, demo = false }: DatabaseOptions): string =>
  empty ? 'template0' : inject(demo ? 'demoTemplateName' : 'templateName');

const runOnCluster = (sql: string) => runSql(inject('clusterUrl'), sql);

/**
 * A migrated database of one's own, dropped after the file. Await it at the top of a test file or in a describe block's
 * body, not inside a hook. `empty` gives one without a single table,
 * `demo` (browser tests) one that holds the demo survey.
 */
export async function createTestDatabase(options: DatabaseOptions = {}): Promise<TestDatabase> {
  const name = `test_${randomBytes(6).toString('hex')}`;
  await runOnCluster(`CREATE DATABASE ${name} TEMPLATE ${templateOf(options)}`);
  const url = withDatabase(inject('clusterUrl'), name);
  const config = loadConfig({ DATABASE_URL: url, LOG_LEVEL: 'silent' });
  const [knex, pool] = [createDatabase(config), createPool(config)];
  afterAll(async () => {
    await knex.destroy();
    if (!pool.ended) await pool.end();
    await dropDatabase(inject('clusterUrl'), name);
  });
  return { url, config, knex, pool };
}
