// Runs before anything is installed: plain JavaScript, Node alone.
import { spawn } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('..', import.meta.url));
const commands = ['start', 'dev', 'worker', 'test', 'add-admin'];

const stop = (message) => {
  console.error(`\n${message}`);
  process.exit(1);
};

const checkNode = () => {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major === 20 && minor >= 12) return;
  stop(`Layerwell needs Node 20.12 or a later 20. Found ${process.versions.node} at ${process.execPath}.`);
};

const packagesOf = (...path) => JSON.parse(readFileSync(join(root, ...path), 'utf8')).packages ?? {};

/** npm notes in node_modules what it installed; packages for other machines are optional and stay out of it. */
const isInstalled = () => {
  if (!existsSync(join(root, 'node_modules', '.package-lock.json'))) return false;
  const wanted = packagesOf('package-lock.json');
  const found = packagesOf('node_modules', '.package-lock.json');
  const isSame = (name) =>
    wanted[name]?.version === found[name]?.version && wanted[name]?.integrity === found[name]?.integrity;
  const isOptional = (name) => wanted[name].optional === true || wanted[name].devOptional === true;
  return (
    Object.keys(found).every(isSame) &&
    Object.keys(wanted).every((name) => name === '' || isSame(name) || (!(name in found) && isOptional(name)))
  );
};

const installPackages = async () => {
  if (isInstalled()) return;
  console.log('· npm packages: installing, about a minute');
  const options = ['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'];
  const npm = spawn('npm', options, { cwd: root, stdio: 'inherit' });
  const passOn = () => npm.kill('SIGTERM');
  process.on('SIGTERM', passOn).on('SIGINT', passOn);
  const fault = await new Promise((resolve) => {
    npm.once('error', (error) => resolve(error.message));
    npm.once('exit', (code, signal) => resolve(code === 0 ? null : `npm ci ended with ${signal ?? code}`));
  });
  process.off('SIGTERM', passOn).off('SIGINT', passOn);
  if (fault !== null)
    stop(`The npm packages could not be installed: ${fault}. Run "npm ci" to see why, then start again.`);
};

const command = process.argv[2];
if (!commands.includes(command)) stop(`Say which: ${commands.join(', ')}. Found "${command ?? ''}".`);
checkNode();
process.chdir(root);
try {
  await installPackages();
} catch (error) {
  stop(`The npm packages could not be checked in ${root}: ${error.message}`);
}
const { register } = await import('tsx/esm/api');
register();
// In this same process: signals reach it without a messenger, and a kill of it is a kill of the command.
await import(`./${command}.ts`);
