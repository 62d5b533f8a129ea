import { z } from 'zod';
import { addAdministrator } from '../server/admin/add-administrator';
import { readConfig } from '../server/read-config';
import { emailSchema, nameSchema } from '../server/contract/common';
import { createDatabase } from '../server/db/knex';
import { migrateToLatest } from '../server/db/migrate';
import { describeError } from './lib/plain-error';
import { reachDatabase } from './lib/reach-database';

const USAGE = 'Usage: DATABASE_URL=postgres://… npm run add-admin -- person@example.org "Full Name"';

/** The first administrator of an installation with a database of its own; prints a link that sets the password. */
async function addAdmin(): Promise<void> {
  const person = z
    .tuple([emailSchema, nameSchema])
    .safeParse(process.argv.slice(process.argv.indexOf('add-admin') + 1));
  if (!person.success) {
    console.error(USAGE);
    process.exitCode = 2;
    return;
  }
  const config = readConfig();
  await reachDatabase(config.databaseUrl);
  const db = createDatabase(config);
  try {
    await migrateToLatest(db);
    const [email, name] = person.data;
    const token = await addAdministrator(db, { email, name });
    console.log(`${email} is an administrator. Set the password within one hour at`);
    console.log(`${config.publicUrl}/reset-password/${token}`);
  } finally {
    await db.destroy();
  }
}

await addAdmin().catch((error: unknown) => {
  console.error(`\n✗ ${describeError(error)}`);
  process.exitCode = 1;
});
