import type { FitResult } from '../../../server/contract/fit';
import { BedSwatch } from '../../runs/bed-swatch';
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
      <p className="text-sm text-muted">
        95 % <span className="figure whitespace-nowrap">{bed.resistivityRange}</span>
      </p>
      <p className="figure mt-1 whitespace-nowrap">{bed.place}</p>
      {bed.baseRange === null ? null : (
        <p className="text-sm text-muted">
          base, 95 % <span className="figure whitespace-nowrap">{bed.baseRange}</span>
        </p>
      )}
    </div>
  );
}
