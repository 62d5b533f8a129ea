import { rmSync } from 'node:fs';
import { join } from 'node:path';
import { runCommand } from './command';
import { PlainError } from './plain-error';
import { buildInputs, hashInputs, isStale, markFresh, stampPath } from './staleness';

async function viteBuild(root: string, config: string): Promise<void> {
  const vite = join(root, 'node_modules', 'vite', 'bin', 'vite.js');
  // The runner writes no file into node_modules, which may belong to another account.
  const args = [vite, 'build', '--config', config, '--logLevel', 'warn', '--configLoader', 'runner'];
  const env = { ...process.env, NODE_ENV: 'production' };
  const { code, output } = await runCommand(process.execPath, args, { cwd: root, env });
  if (code !== 0) throw new PlainError(`The build failed (vite build --config ${config}):\n${output}`);
}

/** Builds client and server when what they are made from has changed; says whether it did. */
export async function buildIfStale(root: string): Promise<boolean> {
  const hash = hashInputs(root, buildInputs);
  if (!isStale(root, hash)) return false;
  rmSync(stampPath(root), { force: true });
  await Promise.all(['vite.config.ts', 'vite.server.config.ts'].map((config) => viteBuild(root, config)));
  markFresh(root, hash);
  return true;
}
