import { join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { Child } from './lib/child';
import { nextFreePort } from './lib/port';
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
const tsx = join(root, 'node_modules', 'tsx', 'dist', 'cli.mjs');
const vite = join(root, 'node_modules', 'vite', 'bin', 'vite.js');
const followParent = pathToFileURL(join(root, 'scripts', 'lib', 'follow-parent.mjs')).href;

function startPart(name: string, args: string[], env: NodeJS.ProcessEnv, shutdown: Shutdown): void {
  const child = new Child({ name, args, cwd: root, env, say });
  shutdown.add(
    name,
    () => child.stop(),
    () => child.kill(),
  );
  child.start();
}

async function dev(shutdown: Shutdown): Promise<void> {
  const settings = readSettings();
  if (settings.databaseUrl !== null) await reachDatabase(settings.databaseUrl);
  claimCheckout(root, 'dev', shutdown);
  const port = await choosePort(settings, say);
  const clientPort = await nextFreePort('127.0.0.1', 5173);
  if (clientPort === null) throw new PlainError('No port from 5173 on is free for the client.');
  const databaseUrl = settings.databaseUrl ?? (await startPrivateCluster(root, shutdown));
  const clientUrl = `http://127.0.0.1:${clientPort}`;
  const env = {
    ...process.env,
    DATABASE_URL: databaseUrl,
    PORT: String(port),
    PUBLIC_URL: clientUrl,
    LOAD_DEMO: process.env.LOAD_DEMO || String(settings.databaseUrl === null),
    // What the watcher starts must follow it as well.
    NODE_OPTIONS: `${process.env.NODE_OPTIONS ?? ''} --import ${followParent}`.trim(),
  };
  const prepared = await step(
    'Database',
    () => prepareDatabase(['--import', 'tsx', 'server/prepare.ts'], env),
    describePrepared,
  );
  const apiUrl = localAddress(settings.config.host, port);
  startPart('server', [tsx, 'watch', '--clear-screen=false', 'server/main.ts'], env, shutdown);
  startPart('worker', [tsx, 'watch', '--clear-screen=false', 'server/worker.ts'], env, shutdown);
  startPart(
    'client',
    [vite, '--port', String(clientPort), '--strictPort', '--clearScreen', 'false'],
    { ...env, API_URL: apiUrl },
    shutdown,
  );
  await step('Server', async () => {
    if (!(await waitForAnswer(`${apiUrl}/readyz`, 60_000)))
      say('it does not answer yet; its output above says why');
  });
  printAccounts(prepared);
  console.log(
    `\n  The client is at ${clientUrl}, the API at ${apiUrl}. Both follow your edits. Ctrl-C stops everything.\n`,
  );
}

const shutdown = new Shutdown();
void runWith(shutdown, () => dev(shutdown));
