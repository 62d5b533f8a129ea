import type { Spread } from '../types';
import { electrodeDistances, inverseDistanceBracket } from './electrode-distances';
import { requireSpread } from './require-spread';
import { hypot } from '../math/hypot';

/** What a spread sees of one image pole at depth c, and the distances that set its scale. */
export interface ImageResponse {
  /** shortest and longest finite electrode distance, m */
  readonly nearest: number;
  readonly farthest: number;
  /** true when the response falls faster than 1/c (the signs of the finite distances sum to zero) */
  readonly neutral: boolean;
  /** response at image depth c ≥ 0 in m; 1 at c = 0 */
  readonly at: (c: number) => number;
}

/** 1/√(p² + c²) − 1/√(q² + c²) without cancellation; a null distance adds nothing. */
function inverseDifference(p: number | null, q: number | null, c: number): number {
  if (p === null) return q === null ? 0 : -1 / hypot(q, c);
  if (q === null) return 1 / hypot(p, c);
  const near = Math.sqrt(p * p + c * c);
  const far = Math.sqrt(q * q + c * c);
  return ((q - p) * (q + p)) / (near * far * (near + far));
}

/**
 * F(c) = K/(2π) · [1/√(AM²+c²) − 1/√(BM²+c²) − 1/√(AN²+c²) + 1/√(BN²+c²)]: the share of ρa that an image of unit
 * strength at depth c adds. Gradient limit (no MN): F(c) = (1 + c²/L²)^(−3/2), the same for both kinds of Schlumberger.
 * Throws `InversionError` for a refused spread.
 */
export function imageResponse(spread: Spread): ImageResponse {
  requireSpread(spread);
  const d = electrodeDistances(spread);
  if (d === null) {
    const length = 'halfAB' in spread ? spread.halfAB : 1;
    return {
      nearest: length,
      farthest: length,
      neutral: true,
      at: (c) => {
        const square = 1 + (c / length) * (c / length);
        return 1 / (square * Math.sqrt(square));
      },
    };
  }
  const bracket = inverseDistanceBracket(d);
  const finite = [d.am, d.an, d.bm, d.bn].filter((r) => r !== null);
  const charge = [d.am, d.an, d.bm, d.bn].reduce<number>(
    (sum, r, i) => (r === null ? sum : sum + (i === 0 || i === 3 ? 1 : -1)),
    0,
  );
  return {
    nearest: Math.min(...finite),
    farthest: Math.max(...finite),
    neutral: charge === 0,
    at: (c) => (inverseDifference(d.am, d.an, c) - inverseDifference(d.bm, d.bn, c)) / bracket,
  };
}
