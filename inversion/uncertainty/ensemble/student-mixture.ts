import { exp } from '../../math/exponential';
import { log } from '../../math/logarithm';
import type { RandomStream } from '../../random';
import { logGamma } from '../chi-squared';

/**
 * Degrees of freedom of every component. Odd, like the number of values of a ground, so that (ν + d)/2 is whole and a density
 * needs no exponential; few enough that the tails are never thinner than those of a posterior.
 */
export const DEGREES = 7;

/** A sum of multivariate Student-t densities over d values, d odd. */
export interface StudentMixture {
  readonly dimensions: number;
  readonly weights: Float64Array;
  /** `means[c * d + j]` */
  readonly means: Float64Array;
  /** lower Cholesky factors of the scale matrices, `[c * d * d + i * d + j]` */
  readonly factors: Float64Array;
  /** their inverses, laid out alike */
  readonly inverses: Float64Array;
  /** weight × normalisation, one a component, against `logUnit` */
  readonly heights: Float64Array;
  readonly logUnit: number;
}

/** Lower Cholesky factor of the d × d matrix at `at`, in place; a pivot that rounding brought to nothing is lifted. */
function choleskyInPlace(matrix: Float64Array, at: number, d: number): void {
  for (let i = 0; i < d; i++) {
    const floor = matrix[at + i * d + i]! * 1e-10 + 1e-14;
    for (let j = 0; j <= i; j++) {
      let sum = matrix[at + i * d + j]!;
      for (let k = 0; k < j; k++) sum -= matrix[at + i * d + k]! * matrix[at + j * d + k]!;
      matrix[at + i * d + j] = i === j ? Math.sqrt(Math.max(sum, floor)) : sum / matrix[at + j * d + j]!;
    }
    for (let j = i + 1; j < d; j++) matrix[at + i * d + j] = 0;
  }
}

function invertLower(source: Float64Array, target: Float64Array, at: number, d: number): void {
  for (let j = 0; j < d; j++) {
    target[at + j * d + j] = 1 / source[at + j * d + j]!;
    for (let i = j + 1; i < d; i++) {
      let sum = 0;
      for (let k = j; k < i; k++) sum -= source[at + i * d + k]! * target[at + k * d + j]!;
      target[at + i * d + j] = sum / source[at + i * d + i]!;
    }
  }
}

/** Components as they are fitted: weights of any sum, scale matrices laid out like `factors`. */
export interface MixtureParts {
  readonly weights: Float64Array;
  readonly means: Float64Array;
  readonly scales: Float64Array;
}

export function createMixture({ weights, means, scales }: MixtureParts): StudentMixture {
  const d = means.length / weights.length;
  const factors = Float64Array.from(scales);
  const inverses = new Float64Array(factors.length);
  let total = 0;
  for (let c = 0; c < weights.length; c++) total += weights[c]!;
  const shares = Float64Array.from(weights, (weight) => weight / total);
  const logHeights = shares.map((share, c) => {
    const at = c * d * d;
    choleskyInPlace(factors, at, d);
    invertLower(factors, inverses, at, d);
    let logHeight = log(share);
    for (let j = 0; j < d; j++) logHeight -= log(factors[at + j * d + j]!);
    return logHeight;
  });
  const top = logHeights.reduce((most, value) => Math.max(most, value), -Infinity);
  const normalisation =
    logGamma((DEGREES + d) / 2) - logGamma(DEGREES / 2) - 0.5 * d * log(DEGREES * Math.PI);
  return {
    dimensions: d,
    weights: shares,
    means: Float64Array.from(means),
    factors,
    inverses,
    heights: logHeights.map((value) => exp(value - top)),
    logUnit: top + normalisation,
  };
}

/** Squared distance of x = `values[at …]` from component `c` in its own scale. */
export function squaredDistance(
  { dimensions: d, means, inverses }: StudentMixture,
  c: number,
  values: Float64Array,
  at: number,
): number {
  const mean = c * d;
  let row = c * d * d;
  let square = 0;
  for (let i = 0; i < d; i++, row += d) {
    let y = 0;
    for (let j = 0; j <= i; j++) y += inverses[row + j]! * (values[at + j]! - means[mean + j]!);
    square += y * y;
  }
  return square;
}

/** Weight × density of component `c` in units of exp(`logUnit`): height · (1 + square/ν)^(−(ν + d)/2). */
export function componentDensity(
  { dimensions: d, heights }: StudentMixture,
  c: number,
  square: number,
): number {
  const base = 1 / (1 + square / DEGREES);
  let power = heights[c]!;
  for (let k = (DEGREES + d) / 2; k > 0; k--) power *= base;
  return power;
}

/** ln density at x = `values[0 …]`. */
export function logDensity(mixture: StudentMixture, values: Float64Array): number {
  let sum = 0;
  for (let c = 0; c < mixture.heights.length; c++)
    sum += componentDensity(mixture, c, squaredDistance(mixture, c, values, 0));
  return mixture.logUnit + log(sum);
}

/** χ² with `DEGREES` degrees of freedom: −2 ln of a product of uniforms has two for each, a squared normal one. */
function chiSquared(random: RandomStream): number {
  let product = 1;
  for (let k = 1; k < DEGREES; k += 2) product *= 1 - random.uniform();
  const z = random.normal();
  return z * z - 2 * log(product);
}

/** A draw into `values[0 …]`. */
export function drawMixture(mixture: StudentMixture, values: Float64Array, random: RandomStream): void {
  const { dimensions: d, weights, means, factors } = mixture;
  let left = random.uniform();
  let c = 0;
  while (c < weights.length - 1 && left >= weights[c]!) left -= weights[c++]!;
  const stretch = Math.sqrt(DEGREES / chiSquared(random));
  const matrix = c * d * d;
  for (let i = 0; i < d; i++) values[i] = means[c * d + i]!;
  for (let j = 0; j < d; j++) {
    const z = stretch * random.normal();
    for (let i = j; i < d; i++) values[i]! += factors[matrix + i * d + j]! * z;
  }
}
