import { rangeOf, type ValueRange } from '../../hydro/range-of';
import type { LayeredEarth } from '../../types';

/**
 * The range of whatever follows from a ground over the grounds of an ensemble: their doubt, carried through any formula.
 * A null of `quantity` says that a ground does not have it, as the porosity of a bed that is not there.
 */
export function ensembleRange(
  earths: readonly LayeredEarth[],
  quantity: (earth: LayeredEarth) => number | null,
): ValueRange | null {
  return rangeOf(earths.map(quantity));
}
