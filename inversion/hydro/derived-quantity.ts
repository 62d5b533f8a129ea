import { rangeOf, type ValueRange } from './range-of';

/** A number that follows from a ground (or from another number), with what a reader needs to check it. */
export interface DerivedQuantity<From> {
  readonly unit: string;
  readonly formula: string;
  readonly source: string;
  /** null = it does not exist there */
  readonly of: (from: From) => number | null;
}

/** The value at the best estimate, its range over an ensemble, and where it comes from. */
export interface DerivedValue {
  value: number | null;
  range: ValueRange | null;
  unit: string;
  formula: string;
  source: string;
}

/**
 * A quantity at the best estimate and over the members of an ensemble, be they layered earths or plain numbers.
 * The range is that of the members alone; without members there is none, and none is made up.
 */
export function deriveWithRange<From>(
  { of, unit, formula, source }: DerivedQuantity<From>,
  best: From,
  members: readonly From[] = [],
): DerivedValue {
  return { value: of(best), range: rangeOf(members.map((member) => of(member))), unit, formula, source };
}
