import { exp } from '../math/exponential';
import { log, log1p } from '../math/logarithm';
import { logGamma } from './chi-squared';

const FRACTION_LIMIT = 500;
const TINY = 1e-300;

/** Continued fraction of the incomplete beta function by Lentz's method, for x < (a + 1)/(a + b + 2). */
function betaFraction(a: number, b: number, x: number): number {
  let c = 1;
  let d = 1 / (1 - ((a + b) * x) / (a + 1) || TINY);
  let h = d;
  for (let i = 1; i < FRACTION_LIMIT; i++) {
    const even = (i * (b - i) * x) / ((a + 2 * i - 1) * (a + 2 * i));
    d = 1 / (1 + even * d || TINY);
    c = 1 + even / c || TINY;
    h *= d * c;
    const odd = (-(a + i) * (a + b + i) * x) / ((a + 2 * i) * (a + 2 * i + 1));
    d = 1 / (1 + odd * d || TINY);
    c = 1 + odd / c || TINY;
    h *= d * c;
    if (Math.abs(d * c - 1) < 1e-15) break;
  }
  return h;
}

/** I_x(a, b), 0 < x < 1. Source: Abramowitz & Stegun 26.5. */
function regularisedBeta(a: number, b: number, x: number): number {
  const front = exp(logGamma(a + b) - logGamma(a) - logGamma(b) + a * log(x) + b * log1p(-x));
  return x < (a + 1) / (a + b + 2)
    ? (front * betaFraction(a, b, x)) / a
    : 1 - (front * betaFraction(b, a, 1 - x)) / b;
}

/**
 * Chance that Student's t with `degrees` > 0 degrees of freedom stays below `value`: ½ ± ½ I_{t²/(ν+t²)}(½, ν/2), and by the
 * complement where t is large, so that neither end loses digits. Absolute accuracy 1e-12 for degrees ≤ 1000.
 * Source: Abramowitz & Stegun 26.7.
 */
export function studentChance(value: number, degrees: number): number {
  const square = value * value;
  if (square === 0) return 0.5;
  if (square < degrees)
    return 0.5 + 0.5 * Math.sign(value) * regularisedBeta(0.5, degrees / 2, square / (degrees + square));
  const x = degrees / (degrees + square);
  const tail = x === 0 ? 0 : 0.5 * regularisedBeta(degrees / 2, 0.5, x);
  return value > 0 ? 1 - tail : tail;
}

/** The value that Student's t stays below with the given chance (0 < chance < 1), by bisection. */
export function studentPoint(chance: number, degrees: number): number {
  if (chance < 0.5) return -studentPoint(1 - chance, degrees);
  let low = 0;
  let high = 2;
  while (studentChance(high, degrees) < chance) high *= 2;
  for (let i = 0; i < 80; i++) {
    const middle = (low + high) / 2;
    if (studentChance(middle, degrees) < chance) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
