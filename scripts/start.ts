import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { buildIfStale } from './lib/build';
import { Child, tailOf } from './lib/child';
import { PlainError } from './lib/plain-error';
import { describePrepared, prepareDatabase, printAccounts } from './lib/prepare';
import { localAddress, waitForAnswer } from './lib/ready';
import { reachDatabase } from './lib/reach-database';
import { choosePort, readSettings } from './lib/settings';
import { runWith, Shutdown } from './lib/shutdown';
import { claimCheckout } from './lib/single';
import { say, step } from './lib/step';
import { startPrivateCluster } from './postgres/private-cluster';

const root = fileURLToPath(new URL('..', import.meta.url));
const built = (name: string) => join('dist', 'server', `${name}.js`);
const logOf = (name: string) => join(root, '.layerwell', 'logs', `${name}.log`);

/** Settings for the parts: an outside database gets no demo unless it is asked for. */
const demoSetting = (isPrivate: boolean) => process.env.LOAD_DEMO || String(isPrivate);

function startPart(name: string, env: NodeJS.ProcessEnv, shutdown: Shutdown): Child {
  const label = `the ${name} process`;
  const child = new Child({
    name: label,
    args: ['--enable-source-maps', built(name === 'web' ? 'main' : name)],
    cwd: root,
    env,
    log: logOf(name),
    say: (line) => say(line),
  });
  shutdown.add(
    label,
    () => child.stop(),
    () => child.kill(),
  );
  child.start();
  return child;
}

async function start(shutdown: Shutdown): Promise<void> {
  const settings = readSettings();
  if (settings.databaseUrl !== null) await reachDatabase(settings.databaseUrl);
  const lock = claimCheckout(root, 'start', shutdown);
  console.log('Layerwell');
  const port = await choosePort(settings, say);
  const building = buildIfStale(root);
  // Told when its own step awaits it.
  building.catch(() => undefined);
  const databaseUrl = settings.databaseUrl ?? (await startPrivateCluster(root, shutdown));
  await step(
    'Build',
    () => building,
    (isNew) => (isNew ? 'made' : 'up to date'),
  );
  const env = {
    ...process.env,
    NODE_ENV: 'production',
    DATABASE_URL: databaseUrl,
    PORT: String(port),
    LOAD_DEMO: demoSetting(settings.databaseUrl === null),
  };
  const prepared = await step('Database', () => prepareDatabase([built('prepare')], env), describePrepared);
  await step(
    'Worker',
    () => Promise.resolve(startPart('worker', env, shutdown)),
    (child) => `process ${child.pid}`,
  );
  const address = localAddress(settings.config.host, port);
  await step('Web server', async () => {
    const web = startPart('web', env, shutdown);
    const isReady = await waitForAnswer(`${address}/readyz`, 60_000, () => web.failures >= 3);
    if (!isReady)
      throw new PlainError(
        `The web server did not become ready. ${logOf('web')} ends with:\n  ${tailOf(logOf('web'), 12)}`,
      );
  });
  const publicUrl = process.env.PUBLIC_URL || address;
  lock.note(publicUrl);
  printAccounts(prepared);
  console.log(`\n  Layerwell is at ${publicUrl}\n  Logs are in .layerwell/logs. Ctrl-C stops everything.\n`);
}

const shutdown = new Shutdown();
void runWith(shutdown, () => start(shutdown));
