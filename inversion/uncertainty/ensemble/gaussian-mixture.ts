import { exp } from '../../math/exponential';
import { log } from '../../math/logarithm';
import type { RandomStream } from '../../random';

/** A sum of Gaussians over d values. */
export interface GaussianMixture {
  readonly dimensions: number;
  readonly weights: Float64Array;
  /** `means[c * d + j]` */
  readonly means: Float64Array;
  /** lower Cholesky factors of the covariances, `[c * d * d + i * d + j]` */
  readonly factors: Float64Array;
  /** their inverses, laid out alike */
  readonly inverses: Float64Array;
  /** ln of weight and normalisation, one a component */
  readonly logScales: Float64Array;
}

/** Lower Cholesky factor of the d × d matrix at `at`, in place; a pivot below `least` of its diagonal is lifted to it. */
export function choleskyInPlace(matrix: Float64Array, at: number, d: number, least = 1e-10): void {
  for (let i = 0; i < d; i++) {
    const floor = matrix[at + i * d + i]! * least + 1e-14;
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

/** A mixture from weights (any sum), means and covariances laid out as in `GaussianMixture`. */
export function createMixture(
  dimensions: number,
  weights: ArrayLike<number>,
  means: Float64Array,
  covariances: Float64Array,
): GaussianMixture {
  const d = dimensions;
  const count = weights.length;
  const factors = Float64Array.from(covariances);
  const inverses = new Float64Array(factors.length);
  let total = 0;
  for (let c = 0; c < count; c++) total += weights[c]!;
  const shares = Float64Array.from(weights, (weight) => weight / total);
  const logScales = new Float64Array(count);
  for (let c = 0; c < count; c++) {
    const at = c * d * d;
    choleskyInPlace(factors, at, d);
    invertLower(factors, inverses, at, d);
    let logDeterminant = 0;
    for (let j = 0; j < d; j++) logDeterminant += log(factors[at + j * d + j]!);
    logScales[c] = log(shares[c]!) - 0.5 * d * log(2 * Math.PI) - logDeterminant;
  }
  return { dimensions: d, weights: shares, means, factors, inverses, logScales };
}

/** ln of weight × density of component `c` at x = `values[at …]`. */
export function logComponent(mixture: GaussianMixture, c: number, values: Float64Array, at: number): number {
  const { dimensions: d, means, inverses, logScales } = mixture;
  const mean = c * d;
  const matrix = c * d * d;
  let square = 0;
  for (let i = 0; i < d; i++) {
    let y = 0;
    for (let j = 0; j <= i; j++) y += inverses[matrix + i * d + j]! * (values[at + j]! - means[mean + j]!);
    square += y * y;
  }
  return logScales[c]! - 0.5 * square;
}

/** ln density at x = `values[0 …]`. */
export function logDensity(mixture: GaussianMixture, values: Float64Array): number {
  let top = -Infinity;
  let sum = 0;
  for (let c = 0; c < mixture.weights.length; c++) {
    const term = logComponent(mixture, c, values, 0);
    if (term <= top) sum += exp(term - top);
    else {
      sum = sum * exp(top - term) + 1;
      top = term;
    }
  }
  return top + log(sum);
}

/** A draw into `values[0 …]`. */
export function drawMixture(mixture: GaussianMixture, values: Float64Array, random: RandomStream): void {
  const { dimensions: d, weights, means, factors } = mixture;
  let left = random.uniform();
  let c = 0;
  while (c < weights.length - 1 && left >= weights[c]!) left -= weights[c++]!;
  const matrix = c * d * d;
  for (let i = 0; i < d; i++) values[i] = means[c * d + i]!;
  for (let j = 0; j < d; j++) {
    const z = random.normal();
    for (let i = j; i < d; i++) values[i]! += factors[matrix + i * d + j]! * z;
  }
}
