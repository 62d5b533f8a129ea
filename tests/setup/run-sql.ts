import pg from 'pg';

export function withDatabase(url: string, name: string): string {
  const changed = new URL(url);
  changed.pathname = `/${name}`;
  return changed.toString();
}

/** One statement on a connection of its own. */
export async function runSql(url: string, sql: string): Promise<void> {
  const client = new pg.Client(url);
  await client.connect();
  try {
    await client.query(sql);
  } finally {
    await client.end();
  }
}

/** What PostgreSQL says where a session is not the role's to end. */
const NOT_ITS_OWN = '42501';
const ATTEMPTS = 50;
const WAIT_MS = 200;

/** Drops a database and ends whoever is connected; a worker of autovacuum, which is the cluster's own, is waited for. */
export async function dropDatabase(url: string, name: string): Promise<void> {
  for (let attempt = 1; ; attempt++) {
    try {
      return await runSql(url, `DROP DATABASE IF EXISTS ${name} WITH (FORCE)`);
    } catch (error) {
      if (!(error instanceof pg.DatabaseError) || error.code !== NOT_ITS_OWN || attempt === ATTEMPTS)
        throw error;
      await new Promise((resolve) => setTimeout(resolve, WAIT_MS));
    }
  }
}
