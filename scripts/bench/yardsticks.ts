import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** Debian's own Python, for which python3-scipy and python3-emcee are packaged. */
const PYTHON = '/usr/bin/python3';

const pathOf = (name: string): string => fileURLToPath(new URL(`yardsticks/${name}`, import.meta.url));

/** What is missing for the Python yardsticks, or null. */
export function missingPython(...modules: string[]): string | null {
  const missing = modules.filter((name) => spawnSync(PYTHON, ['-c', `import ${name}`]).status !== 0);
  return missing.length === 0
    ? null
    : `apt-get install ${missing.map((name) => `python3-${name}`).join(' ')}`;
}

/** Runs a Python yardstick on lines of JSON and returns its lines. */
export function runPython<Answer>(script: string, jobs: readonly object[]): Answer[] {
  const input = jobs.map((job) => JSON.stringify(job)).join('\n');
  const { stdout, stderr, status } = spawnSync(PYTHON, [pathOf(script)], {
    input,
    encoding: 'utf8',
    maxBuffer: 1 << 26,
  });
  if (status !== 0) throw new Error(`${script} failed: ${stderr}`);
  return stdout
    .trim()
    .split('\n')
    .map((line) => JSON.parse(line) as Answer);
}

export interface CompiledKernel {
  /** microseconds of a forward run, and of one with all derivatives */
  readonly run: () => { forwardMicroseconds: number; jacobianMicroseconds: number };
  readonly remove: () => void;
}

/** `kernel.c` by gcc -O3 -march=native, or null where there is no gcc. */
export function compileKernel(): CompiledKernel | null {
  const folder = mkdtempSync(join(tmpdir(), 'bench-'));
  const remove = () => rmSync(folder, { recursive: true, force: true });
  const program = join(folder, 'kernel');
  const built = spawnSync('gcc', ['-O3', '-march=native', pathOf('kernel.c'), '-o', program, '-lm']);
  if (built.status !== 0) {
    remove();
    return null;
  }
  return {
    run: () =>
      JSON.parse(spawnSync(program, { encoding: 'utf8' }).stdout) as ReturnType<CompiledKernel['run']>,
    remove,
  };
}
