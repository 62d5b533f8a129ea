import { randomBytes } from 'node:crypto';
import { join } from 'node:path';
import { afterAll } from 'vitest';
import { Child, tailOf } from '../../scripts/lib/child';
import { anyFreePort } from '../../scripts/lib/port';
import { waitForAnswer } from '../../scripts/lib/ready';
import { createTestDatabase, type TestDatabase } from './test-database';

export interface RunningApp extends TestDatabase {
  /** Where the web process answers, without a trailing slash. */
  baseUrl: string;
  web: Child;
  worker: Child;
}

export interface StartAppOptions {
  /** On a database that holds the demo survey. */
  demo?: boolean;
  /** Puts rows in the database before the processes start. */
  seed?: (database: TestDatabase) => Promise<void>;
  /** Settings on top of the defaults. */
  env?: Record<string, string>;
}

/**
 * A real web process and a real worker process, from the built bundles, on a database of their own. Await it at the top
 * of a test file; everything ends with the file.
 */
export async function startApp({ demo = false, seed, env = {} }: StartAppOptions = {}): Promise<RunningApp> {
  const database = await createTestDatabase({ demo });
  await seed?.(database);
  const port = await anyFreePort();
  const baseUrl = `http://127.0.0.1:${port}`;
  const settings = {
    DATABASE_URL: database.url,
    PORT: String(port),
    PUBLIC_URL: baseUrl,
    NODE_ENV: 'production',
  };
  const run = randomBytes(4).toString('hex');
  const part = (name: string) => {
    const log = join('.cache', 'test-logs', `${run}-${name}.log`);
    const args = ['--enable-source-maps', join('dist', 'server', `${name}.js`)];
    return {
      log,
      child: new Child({
        name,
        args,
        log,
        cwd: process.cwd(),
        env: { ...process.env, ...settings, ...env },
        say: console.error,
      }),
    };
  };
  const [web, worker] = [part('main'), part('worker')];
  afterAll(async () => {
    await Promise.all([web.child.stop(), worker.child.stop()]);
  });
  web.child.start();
  worker.child.start();
  if (!(await waitForAnswer(`${baseUrl}/readyz`, 30_000, () => web.child.failures >= 2))) {
    throw new Error(`The web process did not become ready:\n${tailOf(web.log, 20)}`);
  }
  return { ...database, baseUrl, web: web.child, worker: worker.child };
}
