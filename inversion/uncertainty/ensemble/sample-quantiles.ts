import { quantile } from '../../hydro/range-of';
import type { Quantiles } from './ensemble-types';

export function quantilesOfAscending(ascending: Float64Array): Quantiles {
  const at = (share: number) => quantile(ascending, share);
  return { p5: at(0.05), p16: at(0.16), p50: at(0.5), p84: at(0.84), p95: at(0.95) };
}

/** Quantiles of samples in any order. */
export function quantilesOf(samples: ArrayLike<number>): Quantiles {
  return quantilesOfAscending(Float64Array.from(samples).sort());
}
