import { hypot } from '../math/hypot';

/** Terms of the series; 1e6 leave less than 1e-12 at |k| ≤ 0.999 and far less below. */
const MOST_TERMS = 1_000_000;
const SMALLEST_TERM = 1e-18;

/**
 * 2πV/I in Ω at distance r of a point current on two layers, by the series of images:
 * ρ₁·[1/r + 2Σ kⁿ/√(r² + (2nh)²)], k = (ρ₂ − ρ₁)/(ρ₂ + ρ₁). Slow and exact: the check of the fast operator.
 * Source: Tagg 1964; Koefoed 1979.
 */
export function twoLayerPotential(r: number, rho1: number, rho2: number, thickness: number): number {
  const k = (rho2 - rho1) / (rho2 + rho1);
  let sum = 0;
  let power = 1;
  for (let n = 1; n <= MOST_TERMS; n++) {
    power *= k;
    const term = power / hypot(r, 2 * n * thickness);
    sum += term;
    if (Math.abs(term) < SMALLEST_TERM * Math.abs(1 / r)) break;
  }
  return rho1 * (1 / r + 2 * sum);
}
