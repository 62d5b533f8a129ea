import { runMigrations } from 'graphile-worker';
import type { Knex } from 'knex';
import type { Pool } from 'pg';
import { migrations, type NamedMigration } from '../../migrations/index';

/** Modules instead of a folder, so that it works alike under tsx, vitest and in the bundle. */
const migrationSource: Knex.MigrationSource<NamedMigration> = {
  getMigrations: () => Promise.resolve([...migrations]),
  getMigrationName: (entry) => entry.name,
  getMigration: (entry) => Promise.resolve(entry.migration),
};

const settings: Knex.MigratorConfig = { migrationSource, tableName: 'schema_migration' };

/** Returns the names of the migrations that ran now. */
export async function migrateToLatest(knex: Knex): Promise<string[]> {
  const [, names] = (await knex.migrate.latest(settings)) as [number, string[]];
  return names;
}

/** Undoes every migration, the last one first. */
export async function migrateToNothing(knex: Knex): Promise<void> {
  await knex.migrate.rollback(settings, true);
}

/** The queue keeps its own tables; they must be there before the first job is added inside a transaction. */
export async function migrateQueue(pool: Pool): Promise<void> {
  await runMigrations({ pgPool: pool });
}
