import { TOLERANCES } from '../tolerances';
import { threeDigits } from '../three-digits';
import type { FitResult } from '../types';

/** One thing the data cannot tell, or can tell only in combination. */
export interface DoubtItem {
  /** bed counted from 0 at the surface; null = the whole model */
  bed: number | null;
  kind: 'conductance' | 'resistance' | 'suppression' | 'resistivity' | 'thickness';
  text: string;
  /** the quantity that is known, or the value that is not */
  value: number | null;
  unit: 'S' | 'Ω·m²' | 'Ω·m' | 'm';
  /** 68 % factor of the value; null = not determined */
  factor: number | null;
}

/** A quantity with a 68 % factor from here on is not known by the readings (Auken & Christiansen 2004; from memory). */
const UNKNOWN_FACTOR = 2;
/** Up to here a factor reads as a percentage either way. */
const NARROW_FACTOR = 1.2;

function range(factor: number): string {
  return factor <= NARROW_FACTOR
    ? ` ± ${(100 * (factor - 1)).toPrecision(2)} %`
    : `, times or divided by ${factor.toPrecision(3)}`;
}

function equivalenceOf({ earth, correlation, darZarrouk }: FitResult, bed: number): DoubtItem | null {
  const layers = earth.resistivity.length;
  const r = correlation[bed]?.[layers + bed] ?? null;
  if (r === null || Math.abs(r) < TOLERANCES.equivalence) return null;
  const conductive = r > 0;
  const value = (conductive ? darZarrouk.conductanceS : darZarrouk.resistanceOhmM2)[bed]!;
  const factor = (conductive ? darZarrouk.conductanceFactor : darZarrouk.resistanceFactor)[bed]!;
  const unit = conductive ? 'S' : 'Ω·m²';
  const symbol = conductive ? 'S = h/ρ' : 'T = hρ';
  const trade = `thicker at a proportionally ${conductive ? 'higher' : 'lower'} resistivity, it gives nearly the same curve`;
  const known = factor !== null && factor < UNKNOWN_FACTOR;
  return {
    bed,
    kind: conductive ? 'conductance' : 'resistance',
    text: known
      ? `Bed ${bed + 1} is known by ${symbol} = ${threeDigits(value)} ${unit}${range(factor)} (68 %), better than by its thickness and resistivity apart: ${trade}.`
      : `The thickness and resistivity of bed ${bed + 1} cannot be told apart: ${trade}. ${symbol} is not known within a factor of 2 either: ${threeDigits(value)} ${unit} is one of many values that fit.`,
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
  const fewer = result.layerCounts?.find((count) => count.layers === resistivity.length - 1);
  const loose = result.factors.thickness[bed] === null || result.factors.resistivity[bed] === null;
  const dispensable = fewer?.withinNoise === true;
  if (!loose && !dispensable) return null;
  const reason = dispensable
    ? `${fewer.layers} beds already explain the readings within their errors (χ²/N ${fewer.chi2PerReading.toPrecision(3)})`
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

function undetermined(result: FitResult, bed: number): DoubtItem[] {
  return (['resistivity', 'thickness'] as const).flatMap((kind) => {
    const value = result.earth[kind][bed];
    if (value === undefined || result.factors[kind][bed] !== null) return [];
    const unit = kind === 'resistivity' ? 'Ω·m' : 'm';
    return [
      {
        bed,
        kind,
        text: `The ${kind} of bed ${bed + 1} is not determined: ${threeDigits(value)} ${unit} is one of many values that fit.`,
        value,
        unit,
        factor: null,
      } satisfies DoubtItem,
    ];
  });
}

/**
 * What the data cannot tell, bed by bed, in plain sentences: equivalence where |correlation of ln h and ln ρ| passes 0.95
 * (S = h/ρ when it is positive, T = hρ when negative), suppression where a middle bed can go, values not determined.
 */
export function describeDoubt(result: FitResult): DoubtItem[] {
  return result.earth.resistivity.flatMap((_, bed) => {
    const equivalence = equivalenceOf(result, bed);
    const suppression = suppressionOf(result, bed);
    return [
      ...(equivalence ? [equivalence] : undetermined(result, bed)),
      ...(suppression ? [suppression] : []),
    ];
  });
}
