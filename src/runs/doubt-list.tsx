import { describeDoubt, hasCells } from '../../inversion';
import type { FitResult } from '../../server/contract/fit-result';
import type { FitSettings } from '../../server/contract/fit-settings';
import type { Run } from '../../server/contract/runs';
import { spacingLabel } from '../soundings/spread-words';
import { Sentence } from '../ui/sentence';
import { priorWords } from './run-settings-words';

export interface DoubtListProps {
  result: FitResult;
  run: Pick<Run, 'excluded' | 'settings'>;
}

/** Everything that stands beside a result because the readings leave it open, in sentences. */
export function doubtsOf(result: FitResult, { excluded, settings }: DoubtListProps['run']): string[] {
  return [
    ...describeDoubt(result).map((item) => item.text),
    ...settings.priors.map(
      (prior) => `The ranges rest on what was known beforehand as well: ${priorWords(prior)}.`,
    ),
    ...result.warnings,
    ...excluded.map(
      (reading) =>
        `The reading at ${spacingLabel(reading.spread)} (row ${reading.row}) is left out: ${reading.reason}.`,
    ),
  ];
}

/** Whether the readings, and nothing else, set both ends of every range. */
export function isLimitedByReadings(result: FitResult, { fixed, priors }: FitSettings): boolean {
  const { resistivity, thickness, depth } = result.intervals;
  const isClosed = ([low, high]: (typeof resistivity)[number]) => low !== null && high !== null;
  return (
    fixed.length + priors.length === 0 &&
    !hasCells(result) &&
    [...resistivity, ...thickness, ...depth].every(isClosed)
  );
}

export function DoubtList({ result, run }: DoubtListProps) {
  const doubts = doubtsOf(result, run);
  const isSettled = doubts.length === 0 && isLimitedByReadings(result, run.settings);
  return (
    <div className="border-l-2 border-water pl-3">
      <ul className="flex flex-col gap-2">
        {isSettled ? <li>The readings limit every value at both ends, and determine each of them.</li> : null}
        {doubts.map((doubt) => (
          <li key={doubt}>
            <Sentence text={doubt} />
          </li>
        ))}
        <li className="text-muted">All intervals assume flat layers.</li>
      </ul>
    </div>
  );
}
