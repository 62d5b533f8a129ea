import { cos, sin } from '../math/circular';

/** Above this the asymptotic series is right to rounding. */
const ASYMPTOTIC_FROM = 40;
const TERMS = 12;

/**
 * J₀(x), x ≥ 0: below 40 (1/π)∫₀^π cos(x sin θ) dθ by the trapezoid rule, which converges geometrically; above, the
 * Hankel expansion. Absolute error below 1e-15. Source: Abramowitz & Stegun 9.1.18, 9.2.5.
 */
export function besselJ0(x: number): number {
  return x < ASYMPTOTIC_FROM ? trapezoid(x) : hankel(x);
}

function trapezoid(x: number): number {
  const points = Math.ceil(x / 2) + 16;
  let sum = 0;
  for (let i = 0; i < points; i++) sum += cos(x * sin((Math.PI * (i + 0.5)) / (2 * points)));
  return sum / points;
}

function hankel(x: number): number {
  let p = 1;
  let q = -1 / (8 * x);
  let term = q;
  for (let k = 2; k < TERMS; k++) {
    term *= (-(2 * k - 1) * (2 * k - 1)) / (k * 8 * x);
    // terms alternate between P and Q, each with its own alternating sign
    if (k % 2 === 0) p += (k % 4 === 0 ? 1 : -1) * Math.abs(term);
    else q += (k % 4 === 1 ? -1 : 1) * Math.abs(term);
  }
  const phase = x - Math.PI / 4;
  return Math.sqrt(2 / (Math.PI * x)) * (p * cos(phase) - q * sin(phase));
}
