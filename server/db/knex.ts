import knex, { type Knex } from 'knex';
import type { Config } from '../config';
import { keepDatesAsText } from './types';

keepDatesAsText();

export type DatabaseConfig = Pick<Config, 'databaseUrl' | 'databasePool'>;

interface Connection {
  on(event: 'error', listener: (error: Error) => void): void;
}

/** `onError` hears of connections lost while idle, which would otherwise end the process. */
export function createDatabase(
  config: DatabaseConfig,
  onError: (error: Error) => void = () => undefined,
): Knex {
  const tell = (message: unknown) => onError(message instanceof Error ? message : new Error(String(message)));
  // thrown to the caller as well, who knows how often it tries
  const isThrown = (message: unknown) => String(message).startsWith('Acquire connection error');
  return knex({
    client: 'pg',
    connection: { connectionString: config.databaseUrl, application_name: 'layerwell' },
    pool: {
      min: 0,
      max: config.databasePool,
      afterCreate(connection: Connection, done: (error: Error | null, connection: Connection) => void) {
        connection.on('error', onError);
        done(null, connection);
      },
    },
    acquireConnectionTimeout: 15_000,
    // Knex writes to the console by itself, past the log
    log: {
      warn: (message) => isThrown(message) || tell(message),
      error: tell,
      deprecate: tell,
      debug: () => undefined,
    },
  });
}
