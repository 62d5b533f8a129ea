import type { FitResult } from '../types';
import { bedDifferences, comparable, type BedDifference } from './bed-differences';
import { describePair, ratio } from './pair-words';

/** Two results set side by side; `first` and `second` index the list that was given. */
export interface FitPairComparison {
  first: number;
  second: number;
  sameLayerCount: boolean;
  /** bed by bed from the surface, as far as both reach */
  beds: BedDifference[];
  /** second − first */
  chi2PerReadingDifference: number;
  rmsPercentDifference: number;
  /** second / first; null where a half-space has none, and for cells, whose grid ends where it will */
  totalConductanceRatio: number | null;
  totalResistanceRatio: number | null;
  /** which values differ beyond their intervals, and which model fits closer, in words */
  text: string;
}

export interface FitComparison {
  pairs: FitPairComparison[];
  /** index of the least χ² per reading */
  bestFitting: number;
}

const DEFAULT_NAMES = ['The first', 'The second'] as const;

/**
 * Every pair of two or more results: bed by bed differences, misfit, S and T, and what the readings make of it in words.
 * `names` begin a sentence in the words, one a result, as "Run A"; without them the words say the first and the second.
 */
export function compareFits(results: readonly FitResult[], names?: readonly string[]): FitComparison {
  const pairs = results.flatMap((a, first) =>
    results.slice(first + 1).map((b, offset): FitPairComparison => {
      const beds = bedDifferences(a, b);
      return {
        first,
        second: first + 1 + offset,
        sameLayerCount: a.earth.resistivity.length === b.earth.resistivity.length,
        beds,
        chi2PerReadingDifference: b.chi2PerReading - a.chi2PerReading,
        rmsPercentDifference: b.rmsPercent - a.rmsPercent,
        totalConductanceRatio: comparable(a, b)
          ? ratio(a.darZarrouk.totalConductanceS, b.darZarrouk.totalConductanceS)
          : null,
        totalResistanceRatio: comparable(a, b)
          ? ratio(a.darZarrouk.totalResistanceOhmM2, b.darZarrouk.totalResistanceOhmM2)
          : null,
        text: describePair(a, b, beds, [
          names?.[first] ?? DEFAULT_NAMES[0],
          names?.[first + 1 + offset] ?? DEFAULT_NAMES[1],
        ]),
      };
    }),
  );
  const bestFitting = results.reduce(
    (best, result, i) => (result.chi2PerReading < results[best]!.chi2PerReading ? i : best),
    0,
  );
  return { pairs, bestFitting };
}
