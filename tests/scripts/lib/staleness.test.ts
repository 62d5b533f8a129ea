import { mkdirSync, mkdtempSync, renameSync, rmSync, utimesSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { hashInputs, isStale, markFresh } from '../../../scripts/lib/staleness';

let root: string;

beforeEach(() => {
  root = mkdtempSync(join(tmpdir(), 'layerwell-inputs-'));
  mkdirSync(join(root, 'src', 'ui'), { recursive: true });
  writeFileSync(join(root, 'src', 'main.tsx'), 'one');
  writeFileSync(join(root, 'src', 'ui', 'button.tsx'), 'two');
  writeFileSync(join(root, 'index.html'), 'page');
});
afterEach(() => rmSync(root, { recursive: true }));

const hash = () => hashInputs(root, ['src', 'index.html', 'absent']);

it('is the same for the same files, whatever their times', () => {
  const before = hash();
  utimesSync(join(root, 'index.html'), 1, 1);
  expect(hash()).toBe(before);
});

it.each<[string, () => void]>([
  ['edited', () => writeFileSync(join(root, 'src', 'ui', 'button.tsx'), 'three')],
  ['added', () => writeFileSync(join(root, 'src', 'new.ts'), '')],
  ['removed', () => rmSync(join(root, 'index.html'))],
  ['renamed', () => renameSync(join(root, 'src', 'main.tsx'), join(root, 'src', 'start.tsx'))],
])('changes when a file is %s', (_, change) => {
  const before = hash();
  change();
  expect(hash()).not.toBe(before);
});

it('asks for a build without outputs, with other inputs and after a lost output, and not otherwise', () => {
  expect(isStale(root, 'a')).toBe(true);
  for (const path of ['client/index.html', 'server/main.js', 'server/worker.js']) {
    mkdirSync(join(root, 'dist', path, '..'), { recursive: true });
    writeFileSync(join(root, 'dist', path), '');
  }
  expect(isStale(root, 'a')).toBe(true);
  markFresh(root, 'a');
  expect(isStale(root, 'a')).toBe(false);
  expect(isStale(root, 'b')).toBe(true);
  rmSync(join(root, 'dist', 'server', 'worker.js'));
  expect(isStale(root, 'a')).toBe(true);
});
