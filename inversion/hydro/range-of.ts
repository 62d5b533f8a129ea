import { InversionError } from '../inversion-error';

/** Quantiles of a quantity over an ensemble, in its own unit. */
export interface ValueRange {
  p5: number;
  p16: number;
  p50: number;
  p84: number;
  p95: number;
  /** members that have the quantity */
  count: number;
  /** members that do not have it, such as a bed that is absent; they are not in the quantiles */
  without: number;
}

/** Quantile of ascending values, straight lines between them (type 7 of Hyndman & Fan 1996). */
export function quantile(ascending: ArrayLike<number>, share: number): number {
  const place = share * (ascending.length - 1);
  const below = Math.floor(place);
  const low = ascending[below]!;
  return below === place ? low : low + (place - below) * (ascending[below + 1]! - low);
}

/**
 * The range of a quantity over the members of an ensemble; null where no member has it.
 * `values` holds one entry a member, null = the member does not have it. Throws `InversionError` for NaN or infinity.
 */
export function rangeOf(values: Iterable<number | null>): ValueRange | null {
  const all = [...values];
  all.forEach((value, i) => {
    if (value !== null && !Number.isFinite(value))
      throw new InversionError(
        'hydro-value',
        `value ${i + 1} of the ensemble is ${value}; it must be finite`,
        [i],
      );
  });
  const ascending = Float64Array.from(all.filter((value) => value !== null)).sort();
  if (ascending.length === 0) return null;
  const at = (share: number) => quantile(ascending, share);
  return {
    p5: at(0.05),
    p16: at(0.16),
    p50: at(0.5),
    p84: at(0.84),
    p95: at(0.95),
    count: ascending.length,
    without: all.length - ascending.length,
  };
}
