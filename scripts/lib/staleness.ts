import { createHash } from 'node:crypto';
import { existsSync, lstatSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/** What the built client and server are made from. */
export const buildInputs = [
  'src',
  'server',
  'inversion',
  'migrations',
  'public',
  'index.html',
  'vite.config.ts',
  'vite.server.config.ts',
  'package.json',
  'package-lock.json',
];

function* filesOf(path: string): Generator<string> {
  if (!lstatSync(path).isDirectory()) return yield path;
  for (const name of readdirSync(path).sort()) yield* filesOf(join(path, name));
}

/** Changes when a file is added, removed, renamed or edited; times do not matter. */
export function hashInputs(root: string, inputs: readonly string[]): string {
  const hash = createHash('sha256');
  for (const input of inputs) {
    const path = join(root, input);
    if (!existsSync(path)) continue;
    for (const file of filesOf(path))
      hash
        .update(`${file.slice(root.length)}\0`)
        .update(readFileSync(file))
        .update('\0');
  }
  return hash.digest('hex');
}

export const stampPath = (root: string) => join(root, 'dist', '.inputs');

export function isStale(root: string, hash: string): boolean {
  const stamp = stampPath(root);
  const outputs = ['dist/client/index.html', 'dist/server/main.js', 'dist/server/worker.js'];
  if (outputs.some((output) => !existsSync(join(root, output)))) return true;
  return !existsSync(stamp) || readFileSync(stamp, 'utf8') !== hash;
}

export const markFresh = (root: string, hash: string) => writeFileSync(stampPath(root), hash);
