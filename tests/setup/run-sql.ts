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
