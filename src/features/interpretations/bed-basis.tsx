import type { FitResult } from '../../../server/contract/fit-result';
import { BedSwatch } from '../../runs/bed-swatch';
import { HELD } from '../../ui/format';
import { bedNumbers } from './bed-numbers';

/** What stands fixed about a bed: its colour, value, depths and their ranges. */
export function BedBasis({ result, layerIndex }: { result: FitResult; layerIndex: number }) {
  const bed = bedNumbers(result, layerIndex);
  return (
    <div className="leading-snug">
      <p className="font-semibold whitespace-nowrap">
        <BedSwatch resistivity={bed.resistivityOhmM} /> Bed {layerIndex + 1}
      </p>
      <p className="figure whitespace-nowrap">{bed.resistivity}</p>
      <Range range={bed.resistivityRange} />
      <p className="figure mt-1 whitespace-nowrap">{bed.place}</p>
      {bed.baseRange === null ? null : <Range of="base" range={bed.baseRange} />}
    </div>
  );
}

/** A held value has no range. */
function Range({ of, range }: { of?: string; range: string }) {
  const what = range === HELD ? '' : '95\u00a0% ';
  return (
    <p className="text-sm text-muted">
      {of === undefined ? '' : `${of}, `}
      {what}
      <span className="figure whitespace-nowrap">{range}</span>
    </p>
  );
}
