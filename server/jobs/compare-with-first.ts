import type { Knex } from 'knex';
import type { z } from 'zod';
import { compareResults } from '../../inversion/index';
import type { FitResult } from '../contract/fit-result';
import type { runComparisonSchema } from '../contract/runs';

type RunComparison = z.infer<typeof runComparisonSchema>;

const MOST_DIFFERENCES = 200;
const shown = (value: unknown): string => (typeof value === 'string' ? value : JSON.stringify(value ?? null));

/** The verdict of Compute again: the new result against that of the run it repeats, value by value. */
export async function compareWithFirst(
  trx: Knex,
  firstRunId: string,
  result: FitResult,
): Promise<RunComparison> {
  const { result: first } = await trx('run_state')
    .join('computation', 'computation.id', 'run_state.computation_id')
    .where('run_state.run_id', firstRunId)
    .first<{ result: FitResult }>('computation.result');
  // as it will be read back, so that a number is compared with itself
  const { verdict, differences } = compareResults(first, JSON.parse(JSON.stringify(result)) as FitResult);
  return {
    againstRunId: firstRunId,
    verdict,
    differences: differences
      .slice(0, MOST_DIFFERENCES)
      .map(({ path, before, after }) => ({ path: String(path), before: shown(before), after: shown(after) })),
  };
}
