import { randomBytes } from 'node:crypto';
import type { TestProject } from 'vitest/node';
import { startThrowAwayCluster } from '../../scripts/postgres/throw-away';
import { createDatabase } from '../../server/db/knex';
import { migrateQueue, migrateToLatest } from '../../server/db/migrate';
import { createPool } from '../../server/db/pool';
import { dropDatabase, runSql, withDatabase } from './run-sql';

declare module 'vitest' {
  export interface ProvidedContext {
    /** A role that may create databases. */
    clusterUrl: string;
    /** Migrated once; every test file clones it. */
    templateName: string;
  }
}

async function migrateTemplate(url: string): Promise<void> {
  const config = { databaseUrl: url, databasePool: 2 };
  const [knex, pool] = [createDatabase(config), createPool(config)];
  try {
    await migrateToLatest(knex);
    await migrateQueue(pool);
  } finally {
    await knex.destroy();
    await pool.end();
  }
}

/** TEST_DATABASE_URL: a cluster that the caller started; otherwise one is made for this run alone. */
export default async function setup(project: TestProject) {
  const given = process.env.TEST_DATABASE_URL;
  const cluster = given === undefined || given === '' ? await startThrowAwayCluster() : null;
  const clusterUrl = cluster?.url ?? given ?? '';
  const templateName = `template_${randomBytes(6).toString('hex')}`;
  await runSql(clusterUrl, `CREATE DATABASE ${templateName}`);
  await migrateTemplate(withDatabase(clusterUrl, templateName));
  project.provide('clusterUrl', clusterUrl);
  project.provide('templateName', templateName);

  return async () => {
    if (cluster === null) await dropDatabase(clusterUrl, templateName);
    else await cluster.stop();
  };
}
