import { NOISE_TAIL } from '../fit/layer-count';
import { hasCells } from '../fit/smooth/has-cells';
import { amount, threeDigits } from '../three-digits';
import { TOLERANCES } from '../tolerances';
import type { FitResult } from '../types';
import { comparable, overlap, type BedDifference, type BedQuantity } from './bed-differences';
import { heldCostSentence, heldSentence } from './held-values';

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

export function ratio(first: number, second: number): number | null {
  return first > 0 && second > 0 ? second / first : null;
}

/** What begins a sentence about each of the two. */
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
  const [first, second] = [a, b].map(({ earth }) => earth.thickness.reduce((depth, h) => depth + h, 0));
  return (
    s &&
    t &&
    `Above the deepest boundary (${threeDigits(first!)} against ${amount(second!, 'm')}): conductance ${s}; transverse resistance ${t}.`
  );
}

/** What each ground is made of, where one has cells. */
function cellsSentence(a: FitResult, b: FitResult, names: Names): string {
  const [first, second] = [a, b].map((result, i) => {
    const count = bedCount(result);
    return `${names[i]!} has ${count} ${hasCells(result) ? 'cells of a fixed grid' : count === 1 ? 'bed' : 'beds'}`;
  });
  return `${first}, ${second!.replace(/^The /, 'the ')}: they are not compared bed by bed.`;
}

/** What two results have in common and what tells them apart, in sentences. */
export function describePair(
  a: FitResult,
  b: FitResult,
  beds: readonly BedDifference[],
  names: Names,
): string {
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
    heldCostSentence([a, b], names),
    narrowSentence(a, b, names),
    totalsSentence(a, b),
  ]
    .filter((sentence) => sentence !== null)
    .join(' ');
}
