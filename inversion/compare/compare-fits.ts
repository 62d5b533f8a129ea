import { threeDigits } from '../three-digits';
import type { FitResult, Interval } from '../types';

export type BedQuantity = 'resistivity' | 'thickness' | 'depth' | 'conductance' | 'resistance';

/** How one quantity of one bed differs between two results. */
export interface BedDifference {
  bed: number;
  quantity: BedQuantity;
  unit: 'Ω·m' | 'm' | 'S' | 'Ω·m²';
  first: number;
  second: number;
  /** second / first */
  ratio: number;
  /** whether the 95 % intervals share a value; null where none is computed (S, T) */
  intervalsOverlap: boolean | null;
}

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
  /** second / first; null where a half-space has none */
  totalConductanceRatio: number | null;
  totalResistanceRatio: number | null;
  /** which differences the data support, in words */
  text: string;
}

export interface FitComparison {
  pairs: FitPairComparison[];
  /** index of the least χ² per reading */
  bestFitting: number;
}

function overlap([lowA, highA]: Interval, [lowB, highB]: Interval): boolean {
  return (lowA ?? 0) <= (highB ?? Infinity) && (lowB ?? 0) <= (highA ?? Infinity);
}

function depths(result: FitResult): number[] {
  let base = 0;
  return result.earth.thickness.map((h) => (base += h));
}

interface Column {
  readonly quantity: BedQuantity;
  readonly unit: BedDifference['unit'];
  readonly values: (result: FitResult) => readonly number[];
  readonly intervals: ((result: FitResult) => readonly Interval[]) | null;
}

const COLUMNS: readonly Column[] = [
  {
    quantity: 'resistivity',
    unit: 'Ω·m',
    values: (result) => result.earth.resistivity,
    intervals: (result) => result.intervals.resistivity,
  },
  {
    quantity: 'thickness',
    unit: 'm',
    values: (result) => result.earth.thickness,
    intervals: (result) => result.intervals.thickness,
  },
  { quantity: 'depth', unit: 'm', values: depths, intervals: (result) => result.intervals.depth },
  {
    quantity: 'conductance',
    unit: 'S',
    values: (result) => result.darZarrouk.conductanceS,
    intervals: null,
  },
  {
    quantity: 'resistance',
    unit: 'Ω·m²',
    values: (result) => result.darZarrouk.resistanceOhmM2,
    intervals: null,
  },
];

function bedDifferences(a: FitResult, b: FitResult): BedDifference[] {
  return COLUMNS.flatMap(({ quantity, unit, values, intervals }) => {
    const first = values(a);
    const second = values(b);
    // the half-space of the shorter model has no counterpart of its own kind in a longer one
    const shared = Math.min(first.length, second.length);
    return Array.from({ length: shared }, (_, bed) => ({
      bed,
      quantity,
      unit,
      first: first[bed]!,
      second: second[bed]!,
      ratio: second[bed]! / first[bed]!,
      intervalsOverlap: intervals ? overlap(intervals(a)[bed]!, intervals(b)[bed]!) : null,
    }));
  }).sort((x, y) => x.bed - y.bed);
}

const WORDS: Record<BedQuantity, string> = {
  resistivity: 'resistivity',
  thickness: 'thickness',
  depth: 'depth of the base',
  conductance: 'conductance',
  resistance: 'transverse resistance',
};

function phrase(difference: BedDifference): string {
  const [a, b] = [difference.first, difference.second].map(threeDigits);
  return `${WORDS[difference.quantity]} of bed ${difference.bed + 1} (${a} against ${b} ${difference.unit})`;
}

function ratio(first: number, second: number): number | null {
  return first > 0 && second > 0 ? second / first : null;
}

function totalsSentence(a: FitResult, b: FitResult): string {
  const pair = ([x, y]: [number, number], unit: string) => {
    const change = ratio(x, y);
    return change === null
      ? ''
      : `${threeDigits(x)} against ${threeDigits(y)} ${unit} (× ${change.toFixed(2)})`;
  };
  const s = pair([a.darZarrouk.totalConductanceS, b.darZarrouk.totalConductanceS], 'S');
  const t = pair([a.darZarrouk.totalResistanceOhmM2, b.darZarrouk.totalResistanceOhmM2], 'Ω·m²');
  return s === '' || t === '' ? '' : ` Total conductance ${s}; total transverse resistance ${t}.`;
}

function describePair(
  a: FitResult,
  b: FitResult,
  beds: readonly BedDifference[],
  [nameA, nameB]: readonly [string, string],
): string {
  const counts = [a, b].map((result) => result.earth.resistivity.length);
  const supported = beds.filter((bed) => bed.intervalsOverlap === false);
  const head =
    counts[0] === counts[1]
      ? `Both models have ${counts[0]} ${counts[0] === 1 ? 'bed' : 'beds'}.`
      : `The models have ${counts[0]} and ${counts[1]} beds; beds are matched from the surface, so only the shallow ones compare like with like.`;
  const change = b.chi2PerReading - a.chi2PerReading;
  const fitAlike = Math.abs(change) < Math.max(0.02, 0.05 * Math.max(a.chi2PerReading, b.chi2PerReading));
  const middle =
    supported.length === 0
      ? ` No bed differs beyond the 95 % intervals${fitAlike ? ': the data do not tell these models apart' : ''}.`
      : ` The data support ${supported.length === 1 ? 'one difference' : `${supported.length} differences`} beyond the 95 % intervals: ${supported.map(phrase).join('; ')}.`;
  const tail = fitAlike
    ? ` They fit alike (χ²/N ${threeDigits(a.chi2PerReading)} and ${threeDigits(b.chi2PerReading)}).`
    : ` ${change < 0 ? nameB : nameA} fits closer (χ²/N ${threeDigits(a.chi2PerReading)} and ${threeDigits(b.chi2PerReading)}).`;
  return head + middle + tail + totalsSentence(a, b);
}

const DEFAULT_NAMES = ['The first', 'The second'] as const;

/**
 * Every pair of two or more results: bed by bed differences, misfit, S and T, and which differences the data support.
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
        totalConductanceRatio: ratio(a.darZarrouk.totalConductanceS, b.darZarrouk.totalConductanceS),
        totalResistanceRatio: ratio(a.darZarrouk.totalResistanceOhmM2, b.darZarrouk.totalResistanceOhmM2),
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
