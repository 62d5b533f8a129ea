// Runs before anything is installed: plain JavaScript, Node alone.
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('..', import.meta.url));
const commands = ['start', 'dev', 'worker', 'test'];

const stop = (message) => {
  console.error(`\n${message}`);
  process.exit(1);
};

const checkNode = () => {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major === 20 && minor >= 12) return;
  stop(`Layerwell needs Node 20.12 or a later 20. Found ${process.versions.node} at ${process.execPath}.`);
};

/** `npm ci` only when the lock file is not the one that was installed. */
const installPackages = () => {
  const hash = createHash('sha256');
  for (const name of ['package.json', 'package-lock.json']) hash.update(readFileSync(join(root, name)));
  hash.update(process.versions.modules);
  const wanted = hash.digest('hex');
  const stamp = join(root, 'node_modules', '.layerwell-lock');
  const isInstalled = existsSync(join(root, 'node_modules', 'tsx'));
  if (isInstalled && existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return;
  console.log('· npm packages: installing, about a minute');
  const arguments_ = ['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'];
  const { status, error } = spawnSync('npm', arguments_, { cwd: root, stdio: 'inherit' });
  if (status !== 0) {
    stop(
      `The npm packages could not be installed${error ? ` (${error.message})` : ''}. Run "npm ci" to see why, then start again.`,
    );
  }
  writeFileSync(stamp, wanted);
};

const command = process.argv[2];
if (!commands.includes(command)) stop(`Say which: ${commands.join(', ')}. Found "${command ?? ''}".`);
checkNode();
process.chdir(root);
try {
  installPackages();
} catch (error) {
  stop(`The npm packages could not be checked in ${root}: ${error.message}`);
}
const { register } = await import('tsx/esm/api');
register();
// In this same process: signals reach it without a messenger, and a kill of it is a kill of the command.
await import(`./${command}.ts`);
