import type { FitResult } from '../../../server/contract/fit-result';
import { determinationOf, DETERMINATION_WORDS } from '../../../inversion';
import { timesOrDivided } from '../../../inversion/three-digits';
import { isRejected } from '../../runs/rejected-fit';
import { classNames } from '../../ui/class-names';
import { formatRange, HELD } from '../../ui/format';
import type { ModelValue } from './hand-model';
import { heldKey } from './hand-model-store';

interface BedRangeProps {
  result: FitResult;
  value: ModelValue;
  heldInRun: readonly string[];
}

/** The 95 % range of a value and how well the readings determine it. */
export function BedRange({ result, value, heldInRun }: BedRangeProps) {
  const { on, index } = value;
  const isHeld = heldInRun.includes(heldKey(value));
  const factor = result.factors[on][index] ?? null;
  const grade = determinationOf(factor, isHeld);
  // Where the readings reject the model, what its ranges say of them means nothing.
  const isOpen = !isHeld && isRejected(result);
  return (
    <span className="block pb-1 leading-tight">
      <span className={classNames('figure block text-sm', isOpen && 'text-muted')}>
        {isHeld ? HELD : formatRange(result.intervals[on][index] ?? [null, null])}
      </span>
      {isHeld || isOpen ? null : (
        <span className="block text-xs text-muted">
          {DETERMINATION_WORDS[grade]}
          {factor === null ? null : <span className="figure block sm:inline"> {timesOrDivided(factor)}</span>}
        </span>
      )}
    </span>
  );
}
