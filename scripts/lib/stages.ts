import { mkdirSync, readFileSync, rmSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { runCommand } from './command';

export interface Tally {
  passed: number;
  failed: number;
}

export interface Stage {
  name: string;
  what: string;
  /** The command that runs this stage alone, without what it needs being started. */
  run: (env: NodeJS.ProcessEnv) => Promise<Tally>;
  needs?: ('postgres' | 'chromium')[];
}

interface VitestReport {
  numPassedTests: number;
  numFailedTests: number;
  /** Files that could not be loaded count as failed without a test of theirs. */
  numFailedTestSuites: number;
  success: boolean;
}

const bin = (root: string, path: string) => join(root, 'node_modules', path);

/** A tool that passes or fails as a whole. */
const check = (root: string, name: string, what: string, tool: string, args: string[]): Stage => ({
  name,
  what,
  async run(env) {
    const { code } = await runCommand(process.execPath, [bin(root, tool), ...args], {
      cwd: root,
      env,
      inherit: true,
      group: true,
    });
    return code === 0 ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 };
  },
});

export function tallyOf(report: VitestReport | null, code: number): Tally {
  if (report === null) return { passed: 0, failed: 1 };
  const isBroken = code !== 0 || !report.success || report.numFailedTestSuites > 0;
  return { passed: report.numPassedTests, failed: Math.max(report.numFailedTests, isBroken ? 1 : 0) };
}

function readReport(path: string): VitestReport | null {
  try {
    return JSON.parse(readFileSync(path, 'utf8')) as VitestReport;
  } catch {
    return null;
  }
}

const vitest = (root: string, name: string, what: string, needs: Stage['needs'] = []): Stage => ({
  name,
  what,
  needs,
  async run(env) {
    const file = join(root, '.cache', 'test-results', `${name}.json`);
    mkdirSync(dirname(file), { recursive: true });
    rmSync(file, { force: true });
    const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${file}`];
    const args = [bin(root, 'vitest/vitest.mjs'), 'run', '--project', name, ...reporters];
    const { code } = await runCommand(process.execPath, args, { cwd: root, env, inherit: true, group: true });
    return tallyOf(readReport(file), code);
  },
});

/** In the order they run: the quick ones first. */
export const stages = (root: string): Stage[] => [
  check(root, 'types', 'types of every folder', 'typescript/bin/tsc', ['-b']),
  check(root, 'lint', 'lint with types', 'oxlint/bin/oxlint', ['--type-aware', '--deny-warnings']),
  check(root, 'format', 'format', 'prettier/bin/prettier.cjs', ['--check', '--log-level', 'warn', '.']),
  vitest(root, 'inversion', 'inversion tests'),
  vitest(root, 'src', 'client tests'),
  vitest(root, 'server', 'server tests', ['postgres']),
  vitest(root, 'scripts', 'command tests', ['postgres']),
  vitest(root, 'browser', 'browser tests', ['postgres', 'chromium']),
  vitest(root, 'examples', 'examples', ['postgres']),
];
