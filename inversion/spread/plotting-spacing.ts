import type { Spread } from '../types';
import { effectiveDepth } from './effective-depth';
import { pow2 } from '../math/power';

/** z½ of the ideal Schlumberger spread over AB/2: (1 + 4z²)^(−3/2) = 1/2, so z = ½√(2^(2/3) − 1) ≈ 0.383. */
export const IDEAL_SCHLUMBERGER_DEPTH = 0.5 * Math.sqrt(pow2(2 / 3) - 1);

/**
 * Where a reading stands on the one spacing axis that all spreads share, m.
 *
 * Schlumberger AB/2; half-Schlumberger AO; Wenner 1.5 a (its AB/2); every other spread z½/0.383, the AB/2 of an ideal
 * Schlumberger spread with the same effective depth. Throws `InversionError` for a refused spread.
 */
export function plottingSpacing(spread: Spread): number {
  switch (spread.type) {
    case 'schlumberger':
    case 'half-schlumberger':
      return spread.halfAB;
    case 'wenner':
      return 1.5 * spread.spacing;
    default:
      return effectiveDepth(spread) / IDEAL_SCHLUMBERGER_DEPTH;
  }
}
