import { NOISE_TAIL } from '../fit/layer-count';
import { hasCells } from '../fit/smooth/has-cells';
import { isHeldRange } from '../held-range';
import { amount, threeDigits } from '../three-digits';
import { TOLERANCES } from '../tolerances';
import type { FitResult, Interval } from '../types';
import { heldSentence } from './held-values';

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
  /** whether either result holds the value; its interval then says nothing of the readings */
  isHeld: boolean;
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

/** Cells are no beds, so nothing of theirs is set against a bed. */
const comparable = (a: FitResult, b: FitResult): boolean => !hasCells(a) && !hasCells(b);

function bedDifferences(a: FitResult, b: FitResult): BedDifference[] {
  if (!comparable(a, b)) return [];
  return COLUMNS.flatMap(({ quantity, unit, values, intervals }) => {
    const first = values(a);
    const second = values(b);
    const shared = Math.min(first.length, second.length);
    return Array.from({ length: shared }, (_, bed) => {
      const ranges = intervals ? [intervals(a)[bed]!, intervals(b)[bed]!] : [];
      return {
        bed,
        quantity,
        unit,
        first: first[bed]!,
        second: second[bed]!,
        ratio: second[bed]! / first[bed]!,
        isHeld: ranges.some(isHeldRange),
        intervalsOverlap: ranges[0] && ranges[1] ? overlap(ranges[0], ranges[1]) : null,
      };
    });
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
  const { quantity, bed, first, second, unit, isHeld } = difference;
  return `${WORDS[quantity]} of bed ${bed + 1} (${threeDigits(first)} against ${amount(second, unit)}${isHeld ? ', held' : ''})`;
}

function ratio(first: number, second: number): number | null {
  return first > 0 && second > 0 ? second / first : null;
}

type Names = readonly [string, string];

const bedCount = (result: FitResult): number => result.earth.resistivity.length;

function countsSentence(a: FitResult, b: FitResult): string {
  const [first, second] = [bedCount(a), bedCount(b)];
  const counts =
    first === second
      ? `Both models have ${first} ${first === 1 ? 'bed' : 'beds'}`
      : `The models have ${first} and ${second} beds`;
  const like = likeBeds(a, b);
  return like === Math.max(first, second)
    ? `${counts}.`
    : `${counts}; only ${like === 1 ? 'bed 1 is' : `beds 1 to ${like} are`} compared: below, the boundaries are not the same.`;
}

/** How many beds from the surface have tops that agree within their 95 % ranges in both models. */
function likeBeds(a: FitResult, b: FitResult): number {
  const boundaries = Math.min(a.earth.thickness.length, b.earth.thickness.length);
  for (let base = 0; base < boundaries; base += 1)
    if (overlap(a.intervals.depth[base]!, b.intervals.depth[base]!) === false) return base + 1;
  return boundaries + 1;
}

/**
 * Differences worth a word: intervals apart, of beds that are the same in both models; the base of bed 1 is not told twice (it
 * is its thickness), and the half-space of a shorter model is not set against a bounded bed.
 */
function told(a: FitResult, b: FitResult, beds: readonly BedDifference[]): BedDifference[] {
  const halfSpace = bedCount(a) === bedCount(b) ? Infinity : Math.min(bedCount(a), bedCount(b)) - 1;
  const like = likeBeds(a, b);
  return beds.filter(
    ({ bed, quantity, intervalsOverlap }) =>
      intervalsOverlap === false &&
      bed < like &&
      !(bed === 0 && quantity === 'depth') &&
      !(bed === halfSpace && quantity === 'resistivity'),
  );
}

function alike(a: FitResult, b: FitResult): boolean {
  const [first, second] = [a.chi2PerReading, b.chi2PerReading];
  return Math.abs(second - first) < Math.max(0.02, 0.05 * Math.max(first, second));
}

function differencesSentence(a: FitResult, b: FitResult, beds: readonly BedDifference[]): string {
  const differences = told(a, b, beds);
  if (differences.length === 0)
    return `No bed differs beyond the 95\u00a0% intervals${alike(a, b) ? ': the data do not tell these models apart' : ''}.`;
  return `${differences.length === 1 ? 'One value differs' : `${differences.length} values differ`} beyond the 95\u00a0% intervals: ${differences.map(phrase).join('; ')}.`;
}

function misfitSentence(a: FitResult, b: FitResult, beds: readonly BedDifference[], names: Names): string {
  const misfits = `(χ²/N\u00a0${threeDigits(a.chi2PerReading)} and ${threeDigits(b.chi2PerReading)})`;
  if (alike(a, b))
    return told(a, b, beds).length === 0
      ? `They fit alike ${misfits}.`
      : `They fit alike ${misfits}: the same readings do not choose between them.`;
  const closer = b.chi2PerReading < a.chi2PerReading ? names[1] : names[0];
  const bothEnough = [a, b].every(({ misfitProbability }) => (misfitProbability ?? 0) > NOISE_TAIL);
  return `${closer} fits closer ${misfits}${bothEnough ? ', but both fit within the errors' : ''}.`;
}

/** Intervals come from the stated errors, so they say too little where these do not explain the misfit. */
function narrowSentence(a: FitResult, b: FitResult, names: Names): string | null {
  const narrow = [a, b].map(
    ({ misfitProbability }) => (misfitProbability ?? 1) < TOLERANCES.misfitProbability,
  );
  if (!narrow.includes(true)) return null;
  return narrow[0] && narrow[1]
    ? 'The stated errors explain neither misfit, so the intervals are too narrow.'
    : `${narrow[0] ? names[0] : names[1]} misfits beyond its errors, so its intervals are too narrow.`;
}

function totalsSentence(a: FitResult, b: FitResult): string | null {
  const pair = (x: number, y: number, unit: string) => {
    const change = ratio(x, y);
    return change === null
      ? null
      : `${threeDigits(x)} against ${amount(y, unit)} (×\u00a0${threeDigits(change)})`;
  };
  const s = pair(a.darZarrouk.totalConductanceS, b.darZarrouk.totalConductanceS, 'S');
  const t = pair(a.darZarrouk.totalResistanceOhmM2, b.darZarrouk.totalResistanceOhmM2, 'Ω·m²');
  return s && t && `Above the deepest boundary: conductance ${s}; transverse resistance ${t}.`;
}

/** What each ground is made of, where one has cells. */
function cellsSentence(a: FitResult, b: FitResult, names: Names): string {
  const [first, second] = [a, b].map((result, i) => {
    const count = bedCount(result);
    return `${names[i]!} has ${count} ${hasCells(result) ? 'cells of a fixed grid' : count === 1 ? 'bed' : 'beds'}`;
  });
  return `${first}, ${second!.replace(/^The /, 'the ')}: they are not compared bed by bed.`;
}

function describePair(a: FitResult, b: FitResult, beds: readonly BedDifference[], names: Names): string {
  if (!comparable(a, b))
    return [
      cellsSentence(a, b, names),
      heldSentence([a, b], names),
      misfitSentence(a, b, beds, names),
      narrowSentence(a, b, names),
    ]
      .filter((sentence) => sentence !== null)
      .join(' ');
  return [
    countsSentence(a, b),
    heldSentence([a, b], names),
    differencesSentence(a, b, beds),
    misfitSentence(a, b, beds, names),
    narrowSentence(a, b, names),
    totalsSentence(a, b),
  ]
    .filter((sentence) => sentence !== null)
    .join(' ');
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
