import { readdirSync } from 'node:fs';
import type { Knex } from 'knex';
import { describe, expect, it } from 'vitest';
import { migrations } from '../../../migrations/index';
import { migrateQueue, migrateToLatest, migrateToNothing } from '../../../server/db/migrate';
import { createTestDatabase } from '../../setup/test-database';

const empty = await createTestDatabase({ empty: true });
const migrated = await createTestDatabase();

const bookkeeping = new Set(['schema_migration', 'schema_migration_lock']);

/** Tables, columns with their types, indexes, constraints, functions and triggers, as one comparable list. */
async function describeSchema(knex: Knex): Promise<string[]> {
  const { rows } = await knex.raw<{ rows: { line: string }[] }>(`
    SELECT 'column ' || table_name || '.' || column_name || ' ' || data_type || ' ' || is_nullable AS line, table_name AS owner
      FROM information_schema.columns WHERE table_schema = 'public'
    UNION ALL SELECT 'index ' || indexdef, tablename FROM pg_indexes WHERE schemaname = 'public'
    UNION ALL SELECT 'constraint ' || conname || ' ' || pg_get_constraintdef(oid), conrelid::regclass::text
      FROM pg_constraint WHERE connamespace = 'public'::regnamespace
    UNION ALL SELECT 'function ' || proname, '' FROM pg_proc WHERE pronamespace = 'public'::regnamespace
    UNION ALL SELECT 'trigger ' || tgname, tgrelid::regclass::text FROM pg_trigger WHERE NOT tgisinternal
    UNION ALL SELECT 'type ' || typname, '' FROM pg_type WHERE typnamespace = 'public'::regnamespace AND typtype IN ('e', 'd')
    ORDER BY 1`);
  return rows.map(({ line }) => line).filter((line) => !/schema_migration/.test(line));
}

describe('migrations', () => {
  it('are all listed, in the order of their names', () => {
    const files = readdirSync('migrations').filter((name) => /^\d/.test(name));
    expect(migrations.map(({ name }) => `${name}.ts`)).toEqual(files.sort());
  });

  it('go up, down to nothing and up again to the same schema', async () => {
    expect(await migrateToLatest(empty.knex)).toHaveLength(migrations.length);
    const before = await describeSchema(empty.knex);
    expect(before.length).toBeGreaterThan(migrations.length);

    await migrateToNothing(empty.knex);
    expect(await describeSchema(empty.knex)).toEqual([]);

    await migrateToLatest(empty.knex);
    expect(await describeSchema(empty.knex)).toEqual(before);
  });

  it('do nothing the second time', async () => {
    expect(await migrateToLatest(migrated.knex)).toEqual([]);
    await expect(migrateQueue(migrated.pool)).resolves.toBeUndefined();
  });

  it('give the test template every table, the queue among them', async () => {
    const { rows } = await migrated.knex.raw<{ rows: { tablename: string }[] }>(
      `SELECT tablename FROM pg_tables WHERE schemaname = 'public'`,
    );
    expect(rows.filter((row) => !bookkeeping.has(row.tablename)).length).toBeGreaterThan(10);
    await expect(migrated.knex.raw(`SELECT graphile_worker.add_job('nothing')`)).resolves.toBeDefined();
  });
});
