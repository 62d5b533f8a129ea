import { describeDoubt } from '../../inversion';
import type { FitResult } from '../../server/contract/fit';
import type { Run } from '../../server/contract/runs';
import { spacingLabel } from '../soundings/spread-words';

export interface DoubtListProps {
  result: FitResult;
  excluded: Run['excluded'];
}

/** Everything that stands beside a result because the readings leave it open, in sentences. */
export function doubtsOf(result: FitResult, excluded: Run['excluded']): string[] {
  return [
    ...describeDoubt(result).map((item) => item.text),
    ...result.warnings,
    ...excluded.map(
      (reading) =>
        `The reading at ${spacingLabel(reading.spread)} (row ${reading.row}) is left out: ${reading.reason}.`,
    ),
  ];
}

export function DoubtList({ result, excluded }: DoubtListProps) {
  const doubts = doubtsOf(result, excluded);
  return (
    <div className="border-l-2 border-water pl-3">
      {doubts.length === 0 ? (
        <p>
          Every value is limited by the readings and none is tied to another. All intervals assume flat
          layers.
        </p>
      ) : (
        <ul className="flex flex-col gap-2">
          {doubts.map((doubt) => (
            <li key={doubt}>{doubt}</li>
          ))}
          <li className="text-muted">All intervals assume flat layers.</li>
        </ul>
      )}
    </div>
  );
}
