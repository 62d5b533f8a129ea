import type { Spread } from '../types';
import { imageResponse } from './image-response';
import { pow2 } from '../math/power';

const STEPS_PER_DOUBLING = 8;
const BISECTIONS = 60;

/**
 * Effective (median) depth z½ in m: half of the response of a uniform ground comes from above it, F(2z½) = 1/2.
 * The first crossing is taken, should the electrodes stand so that there are several. Bisection, to rounding.
 * Source: Edwards 1977, Geophysics 42, 1020–1036. Throws `InversionError` for a refused spread.
 */
export function effectiveDepth(spread: Spread): number {
  const response = imageResponse(spread);
  const ratio = pow2(1 / STEPS_PER_DOUBLING);
  let low = response.nearest / 1024;
  let high = low;
  while (response.at(2 * high) > 0.5) {
    low = high;
    high *= ratio;
  }
  for (let i = 0; i < BISECTIONS; i++) {
    const middle = (low + high) / 2;
    if (response.at(2 * middle) > 0.5) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
