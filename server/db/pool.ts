import { Pool } from 'pg';
import type { DatabaseConfig } from './knex';

/** The pool that sessions, the job queue and LISTEN share; Knex cannot take a pool and keeps its own. */
export function createPool(config: DatabaseConfig, onError: (error: Error) => void = () => undefined): Pool {
  const pool = new Pool({
    connectionString: config.databaseUrl,
    application_name: 'layerwell',
    max: config.databasePool,
    connectionTimeoutMillis: 15_000,
  });
  pool.on('error', onError);
  pool.on('connect', (client) => client.on('error', onError));
  return pool;
}
