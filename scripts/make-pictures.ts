/** Pictures of every screen for a designer's eye, and the one in the README: `npx tsx scripts/make-pictures.ts [screen …]`. */
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { loadConfig } from '../server/config';
import { createDatabase } from '../server/db/knex';
import { buildIfStale } from './lib/build';
import { Child } from './lib/child';
import { PlainError } from './lib/plain-error';
import { anyFreePort } from './lib/port';
import { prepareDatabase } from './lib/prepare';
import { waitForAnswer } from './lib/ready';
import { runWith, Shutdown } from './lib/shutdown';
import { say, step } from './lib/step';
import { takePictures } from './pictures/take-pictures';
import { startThrowAwayCluster } from './postgres/throw-away';

const root = fileURLToPath(new URL('..', import.meta.url));

async function startServer(databaseUrl: string, shutdown: Shutdown): Promise<string> {
  const port = await anyFreePort();
  const baseUrl = `http://127.0.0.1:${port}`;
  const web = new Child({
    name: 'the web process',
    args: [join('dist', 'server', 'main.js')],
    cwd: root,
    env: {
      ...process.env,
      NODE_ENV: 'production',
      DATABASE_URL: databaseUrl,
      PORT: String(port),
      PUBLIC_URL: baseUrl,
    },
    log: join(root, '.layerwell', 'logs', 'pictures.log'),
    say,
  });
  shutdown.add(
    'the web process',
    () => web.stop(),
    () => web.kill(),
  );
  web.start();
  if (!(await waitForAnswer(`${baseUrl}/readyz`, 60_000, () => web.failures >= 3)))
    throw new PlainError('The web server did not become ready; see .layerwell/logs/pictures.log.');
  return baseUrl;
}

async function makePictures(shutdown: Shutdown): Promise<void> {
  await step('Build', () => buildIfStale(root));
  const cluster = await step('PostgreSQL', startThrowAwayCluster);
  shutdown.add('PostgreSQL', cluster.stop);
  const env = { ...process.env, NODE_ENV: 'production', DATABASE_URL: cluster.url, LOAD_DEMO: 'true' };
  await step('Demo', () => prepareDatabase([join('dist', 'server', 'prepare.js')], env));
  const baseUrl = await step('Web server', () => startServer(cluster.url, shutdown));
  const db = createDatabase({ ...loadConfig({ DATABASE_URL: cluster.url }), databasePool: 1 });
  shutdown.add('', () => db.destroy());
  await step('Pictures', () =>
    takePictures({
      baseUrl,
      db,
      folder: join(root, '.layerwell', 'pictures'),
      benchFile: join(root, 'examples', 'bench.png'),
      chosen: process.argv.slice(2),
      say,
    }),
  );
  await shutdown.end(0);
}

const shutdown = new Shutdown(130);
void runWith(shutdown, () => makePictures(shutdown));
