import { DETERMINATION_WORDS, determinationOf } from './determination';
import { TOLERANCES } from '../tolerances';
import { hasCells } from '../fit/smooth/has-cells';
import { isHeldRange } from '../held-range';
import { amount, threeDigits, timesOrDivided } from '../three-digits';
import type { FitResult, Interval } from '../types';

/** One thing the data cannot tell, or can tell only in combination. */
export interface DoubtItem {
  /** bed counted from 0 at the surface; null = the whole model */
  bed: number | null;
  kind: 'held' | 'conductance' | 'resistance' | 'suppression' | 'resistivity' | 'thickness';
  text: string;
  /** the quantity that is known, or the value that is not; of several held values the first */
  value: number | null;
  unit: 'S' | 'Ω·m²' | 'Ω·m' | 'm';
  /** factor of the value, as in the result; null = not determined */
  factor: number | null;
}

/** A quantity with a factor from here on is not known by the readings (Auken & Christiansen 2004; from memory). */
const UNKNOWN_FACTOR = 2;
/** Where neither value of a bed is looser than this, nothing is left to say of their product or ratio. */
const SETTLED_FACTOR = 1.2;

const looseness = (factor: number | null): number => factor ?? Infinity;

/** "3.10 to 13.0 m", "up to 13.0 m", "3.10 m and more"; null where nothing is known. */
function rangeWords([low, high]: Interval, unit: string): string | null {
  if (low === null) return high === null ? null : `up to ${amount(high, unit)}`;
  return high === null ? `${amount(low, unit)} and more` : `${threeDigits(low)} to ${amount(high, unit)}`;
}

/** How far the two tied values of a bed can go. */
function tiedRanges({ intervals }: FitResult, bed: number): string {
  const thickness = rangeWords(intervals.thickness[bed]!, 'm');
  const resistivity = rangeWords(intervals.resistivity[bed]!, 'Ω·m');
  const words = [
    ...(thickness ? [`a thickness of ${thickness}`] : []),
    ...(resistivity ? [`a resistivity of ${resistivity}`] : []),
  ];
  if (words.length === 0) return 'The readings limit neither by itself.';
  const only =
    thickness && resistivity
      ? ''
      : `, and the readings do not limit the ${thickness ? 'resistivity' : 'thickness'}`;
  return `By themselves (95\u00a0%): ${words.join(' and ')}${only}.`;
}

function equivalenceOf(result: FitResult, bed: number): DoubtItem | null {
  const { earth, correlation, darZarrouk, factors } = result;
  const r = correlation[bed]?.[earth.resistivity.length + bed] ?? null;
  if (r === null || Math.abs(r) < TOLERANCES.equivalence) return null;
  const loosest = Math.max(looseness(factors.resistivity[bed]!), looseness(factors.thickness[bed]!));
  if (loosest < SETTLED_FACTOR) return null;
  const conductive = r > 0;
  const value = (conductive ? darZarrouk.conductanceS : darZarrouk.resistanceOhmM2)[bed]!;
  const factor = (conductive ? darZarrouk.conductanceFactor : darZarrouk.resistanceFactor)[bed]!;
  const unit = conductive ? 'S' : 'Ω·m²';
  const symbol = conductive ? 'S\u00a0=\u00a0h/ρ' : 'T\u00a0=\u00a0hρ';
  const known = factor !== null && factor < UNKNOWN_FACTOR && factor < loosest;
  return {
    bed,
    kind: conductive ? 'conductance' : 'resistance',
    text: known
      ? `Bed ${bed + 1} is better known by ${symbol}\u00a0=\u00a0${amount(value, unit)} ${timesOrDivided(factor)} (68\u00a0%) than by its thickness or its resistivity: a thicker bed goes with a ${conductive ? 'higher' : 'lower'} resistivity. ${tiedRanges(result, bed)}`
      : `Neither the thickness nor the resistivity of bed ${bed + 1} is determined, nor ${symbol}: ${amount(value, unit)} is one of many values that fit. ${tiedRanges(result, bed)}`,
    value,
    unit,
    factor,
  };
}

function suppressionOf(result: FitResult, bed: number): DoubtItem | null {
  const { resistivity, thickness } = result.earth;
  if (bed === 0 || bed >= thickness.length) return null;
  const above = resistivity[bed - 1]!;
  const below = resistivity[bed + 1]!;
  const between = (resistivity[bed]! - above) * (below - resistivity[bed]!) > 0;
  if (!between) return null;
  const loose = result.factors.thickness[bed] === null || result.factors.resistivity[bed] === null;
  const fewer = result.oneFewer?.withinNoise === true ? result.oneFewer : null;
  if (!loose && !fewer) return null;
  const reason = fewer
    ? `${fewer.layers} ${fewer.layers === 1 ? 'bed' : 'beds'} already explain the readings within their errors (χ²/N\u00a0${threeDigits(fewer.chi2PerReading)})`
    : 'the readings do not limit it';
  return {
    bed,
    kind: 'suppression',
    text: `Bed ${bed + 1} lies between its neighbours in resistivity and may be hidden or absent: ${reason}.`,
    value: thickness[bed]!,
    unit: 'm',
    factor: result.factors.thickness[bed] ?? null,
  };
}

const UNITS = { resistivity: 'Ω·m', thickness: 'm' } as const;

/** What was held in the fit: a range of no width. */
function heldItem({ earth, intervals }: FitResult): DoubtItem[] {
  const held = (['resistivity', 'thickness'] as const).flatMap((kind) =>
    earth[kind].flatMap((value, bed) => {
      return isHeldRange(intervals[kind][bed]!) ? [{ kind, bed, value, unit: UNITS[kind] }] : [];
    }),
  );
  const [first] = held;
  if (!first) return [];
  const named = held.map(({ kind, bed, value, unit }, i) => {
    return `${i === 0 ? 'The' : 'the'} ${kind} of bed ${bed + 1}${i === 0 ? ' is held' : ''} at ${amount(value, unit)}`;
  });
  const last = named.length > 1 ? ` and ${named.pop()}` : '';
  const text = `${named.join(', ')}${last}; the ranges of the others hold only if that is so.`;
  return [{ bed: first.bed, kind: 'held', text, value: first.value, unit: first.unit, factor: 1 }];
}

function undetermined(result: FitResult, bed: number): DoubtItem[] {
  return (['resistivity', 'thickness'] as const).flatMap((kind) => {
    const value = result.earth[kind][bed];
    if (value === undefined) return [];
    const factor = result.factors[kind][bed]!;
    const determination = determinationOf(factor, false);
    if (determination === 'well' || determination === 'determined') return [];
    const unit = UNITS[kind];
    const words = rangeWords(result.intervals[kind][bed]!, unit);
    const text = words
      ? `The ${kind} of bed ${bed + 1} is ${DETERMINATION_WORDS[determination]}: ${words} fit (95\u00a0%).`
      : `The readings do not limit the ${kind} of bed ${bed + 1}: ${amount(value, unit)} is one of many values that fit.`;
    return [{ bed, kind, text, value, unit, factor } satisfies DoubtItem];
  });
}

/**
 * What the data cannot tell, in plain sentences: first what was held and so was not asked of them; then bed by bed equivalence
 * where |correlation of ln h and ln ρ| passes 0.95 (S = h/ρ when it is positive, T = hρ when negative) and the bed's own values
 * are not settled, suppression where a middle bed can go, values that are poorly or not determined. Of cells nothing: they
 * are no beds, and their warnings say so.
 */
export function describeDoubt(result: FitResult): DoubtItem[] {
  if (hasCells(result)) return [];
  const beds = result.earth.resistivity.flatMap((_, bed) => {
    const equivalence = equivalenceOf(result, bed);
    const suppression = suppressionOf(result, bed);
    return [
      ...(equivalence ? [equivalence] : undetermined(result, bed)),
      ...(suppression ? [suppression] : []),
    ];
  });
  return [...heldItem(result), ...beds];
}
