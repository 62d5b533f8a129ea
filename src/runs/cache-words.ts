import type { RunSummary } from '../../server/contract/runs';
import { letterOfRun } from './run-title';

type Asked = Pick<RunSummary, 'number' | 'computationKey'>;

/** Where an answer came from that was not computed for this run: the first run of the sounding that asked the same. */
export function cacheWords(run: Asked, runs: readonly Asked[]): string {
  const [first] = runs
    .filter((other) => other.computationKey === run.computationKey && other.number < run.number)
    .toSorted((a, b) => a.number - b.number);
  return first ? `from run ${letterOfRun(first)}` : 'computed before';
}
