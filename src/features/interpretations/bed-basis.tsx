import type { FitResult } from '../../../server/contract/fit-result';
import { BedSwatch } from '../../runs/bed-swatch';
import { HELD } from '../../ui/format';
import { bedNumbers } from './bed-numbers';

/** What stands fixed about a bed: its colour, value, depths, their ranges and how well each is determined. */
export function BedBasis({ result, layerIndex }: { result: FitResult; layerIndex: number }) {
  const bed = bedNumbers(result, layerIndex);
  return (
    <div className="leading-snug">
      <p className="font-semibold whitespace-nowrap">
        <BedSwatch resistivity={bed.resistivityOhmM} /> Bed {layerIndex + 1}
      </p>
      <p className="figure whitespace-nowrap">{bed.resistivity}</p>
      <Range range={bed.resistivityRange} grade={bed.resistivityGrade} />
      <p className="figure mt-1 whitespace-nowrap">{bed.place}</p>
      {bed.baseRange === null ? null : <Range of="base" range={bed.baseRange} grade={bed.baseGrade} />}
    </div>
  );
}

/** A held value has no range. */
function Range({ of, range, grade }: { of?: string; range: string; grade: string | null }) {
  const what = range === HELD ? '' : '95\u00a0% ';
  return (
    <p className="text-sm text-muted">
      {of === undefined ? '' : `${of}, `}
      {what}
      <span className="figure whitespace-nowrap">{range}</span>
      {grade === null ? null : <span className="block text-xs">{grade}</span>}
    </p>
  );
}
