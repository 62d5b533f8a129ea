import { sin } from '../math/circular';
import { exp } from '../math/exponential';
import { log } from '../math/logarithm';

/** Lanczos coefficients, g = 7, n = 9 (Godfrey 2001): ln Γ to 1e-14. */
const LANCZOS = [
  0.99999999999980993, 676.5203681218851, -1259.1392167224028, 771.32342877765313, -176.61502916214059,
  12.507343278686905, -0.13857109526572012, 9.9843695780195716e-6, 1.5056327351493116e-7,
] as const;
const SERIES_LIMIT = 1000;

/** ln Γ(x) for x > 0. */
export function logGamma(x: number): number {
  if (x < 0.5) return log(Math.PI / sin(Math.PI * x)) - logGamma(1 - x);
  const z = x - 1;
  const t = z + 7.5;
  const sum = LANCZOS.reduce((total, c, i) => (i === 0 ? c : total + c / (z + i)), 0);
  return 0.5 * log(2 * Math.PI) + (z + 0.5) * log(t) - t + log(sum);
}

/** P(a, x) by its power series, for x < a + 1. */
function lowerSeries(a: number, x: number): number {
  let term = 1 / a;
  let sum = term;
  for (let n = 1; n < SERIES_LIMIT; n++) {
    term *= x / (a + n);
    sum += term;
    if (term < sum * 1e-16) break;
  }
  return sum * exp(-x + a * log(x) - logGamma(a));
}

/** Q(a, x) by Lentz's continued fraction, for x ≥ a + 1. */
function upperFraction(a: number, x: number): number {
  let b = x + 1 - a;
  let c = 1e300;
  let d = 1 / b;
  let h = d;
  for (let i = 1; i < SERIES_LIMIT; i++) {
    const an = -i * (i - a);
    b += 2;
    d = 1 / (an * d + b);
    c = b + an / c;
    const delta = c * d;
    h *= delta;
    if (Math.abs(delta - 1) < 1e-16) break;
  }
  return exp(-x + a * log(x) - logGamma(a)) * h;
}

/**
 * Chance that χ² with `degrees` degrees of freedom exceeds `value`: Q(degrees/2, value/2).
 * Relative accuracy about 1e-12 for degrees ≤ 1000. Source: Abramowitz & Stegun 6.5, 26.4.
 */
export function chiSquaredSurvival(value: number, degrees: number): number {
  if (!(value > 0)) return 1;
  const a = degrees / 2;
  const x = value / 2;
  return x < a + 1 ? 1 - lowerSeries(a, x) : upperFraction(a, x);
}

/** The value that χ² with `degrees` degrees of freedom exceeds with the given chance (0 < chance < 1), by bisection. */
export function chiSquaredPoint(chance: number, degrees: number): number {
  let low = 0;
  let high = degrees + 10;
  while (chiSquaredSurvival(high, degrees) > chance) high *= 2;
  for (let i = 0; i < 80; i++) {
    const middle = (low + high) / 2;
    if (chiSquaredSurvival(middle, degrees) > chance) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
