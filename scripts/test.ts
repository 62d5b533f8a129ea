import { fileURLToPath } from 'node:url';
import { ensureChromium } from './lib/chromium';
import { PlainError } from './lib/plain-error';
import { runWith, Shutdown } from './lib/shutdown';
import { stages, type Stage, type Tally } from './lib/stages';
import { step } from './lib/step';
import { startThrowAwayCluster } from './postgres/throw-away';

const root = fileURLToPath(new URL('..', import.meta.url));

function chosenStages(names: string[]): Stage[] {
  const all = stages(root);
  const unknown = names.filter((name) => !all.some((stage) => stage.name === name));
  if (unknown.length > 0) {
    throw new PlainError(
      `No such stage: ${unknown.join(', ')}. There are: ${all.map(({ name }) => name).join(', ')}.`,
    );
  }
  return names.length === 0 ? all : all.filter(({ name }) => names.includes(name));
}

/** What the stages need, installed and started before the first of them. */
async function provide(chosen: Stage[], shutdown: Shutdown): Promise<NodeJS.ProcessEnv> {
  const needs = new Set(chosen.flatMap((stage) => stage.needs ?? []));
  const env: NodeJS.ProcessEnv = { ...process.env };
  // The tests bring their own settings; those of the person at the terminal must not reach them.
  for (const name of ['DATABASE_URL', 'PORT', 'HOST', 'PUBLIC_URL', 'MAIL_URL', 'NODE_ENV']) delete env[name];
  for (const name of Object.keys(env)) if (name.startsWith('npm_')) delete env[name];
  if (needs.has('chromium')) await step('Chromium', ensureChromium);
  if (needs.has('postgres')) {
    env.TEST_DATABASE_URL = await step('PostgreSQL for the tests', async (say) => {
      const cluster = await startThrowAwayCluster(say);
      shutdown.add('the PostgreSQL of the tests', cluster.stop);
      return cluster.url;
    });
  }
  return env;
}

async function runStage(stage: Stage, env: NodeJS.ProcessEnv): Promise<Tally> {
  const from = Date.now();
  console.log(`\n▸ ${stage.name}: ${stage.what}`);
  const tally = await stage.run(env);
  const sign = tally.failed === 0 ? '✓' : '✗';
  console.log(
    `${sign} ${stage.name}: ${tally.passed} passed, ${tally.failed} failed (${((Date.now() - from) / 1000).toFixed(1)} s)`,
  );
  return tally;
}

async function test(shutdown: Shutdown): Promise<void> {
  const total: Tally = { passed: 0, failed: 0 };
  // Printed by the last thing that happens, after everything has been stopped.
  process.on('exit', (code) => {
    // Interrupted, or a part did not stop: not a success even when no test failed.
    if (code !== 0) total.failed ||= 1;
    console.log(`${total.passed} passed, ${total.failed} failed`);
  });
  const chosen = chosenStages(process.argv.slice(3));
  const env = await provide(chosen, shutdown);
  for (const stage of chosen) {
    const { passed, failed } = await runStage(stage, env);
    if (shutdown.isUnderWay) return;
    total.passed += passed;
    total.failed += failed;
    if (failed > 0) {
      console.error(`\nStopped at the stage "${stage.name}". To run it alone: npm test -- ${stage.name}`);
      break;
    }
  }
  console.log('');
  await shutdown.end(total.failed === 0 ? 0 : 1);
}

const shutdown = new Shutdown(130);
void runWith(shutdown, () => test(shutdown));
