import { deriveReading } from '../../inversion/readings/derive-reading';
import type { Reading as FitReading } from '../../inversion/types';
import type { Reading } from '../contract/readings';

export interface NumberedFitReading {
  /** position in the revision, from 1 */
  readonly row: number;
  readonly plottingSpacingM: number;
  readonly reading: FitReading;
}

/** The kept readings of a revision as a fit takes them; the survey's floor is added to each own error in quadrature. */
export function fitReadingsOf(readings: readonly Reading[], errorFloor: number): NumberedFitReading[] {
  return readings.flatMap((reading, index) => {
    if (reading.excluded !== null) return [];
    const derived = deriveReading(reading, errorFloor);
    return {
      row: index + 1,
      plottingSpacingM: derived.plottingSpacingM,
      reading: {
        spread: reading.spread,
        apparentResistivity: derived.apparentResistivityOhmM,
        relativeError: derived.relativeError,
      },
    };
  });
}
