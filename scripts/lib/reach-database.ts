import pg from 'pg';
import { errorCode, PlainError } from './plain-error';

/** Asks the database of `DATABASE_URL` for a connection, so that a mistyped address is told before anything starts. */
export async function reachDatabase(databaseUrl: string): Promise<void> {
  const client = new pg.Client({ connectionString: databaseUrl, connectionTimeoutMillis: 10_000 });
  try {
    await client.connect();
  } catch (error) {
    // a name with several addresses fails with a code alone
    const reason = (error instanceof Error && error.message) || errorCode(error) || String(error);
    throw new PlainError(
      `The database at ${new URL(databaseUrl).host} cannot be used: ${reason}.\n` +
        'See whether DATABASE_URL, in the environment or in .env, is right and PostgreSQL runs there.',
    );
  } finally {
    await client.end();
  }
}
