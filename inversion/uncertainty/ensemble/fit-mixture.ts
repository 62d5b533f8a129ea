import { exp } from '../../math/exponential';
import type { RandomStream } from '../../random';
import { createMixture, logComponent, type GaussianMixture } from './gaussian-mixture';

const MOST_COMPONENTS = 10;
/** Points that a component needs, times its dimensions. */
const POINTS_PER_DIMENSION = 10;
const ROUNDS = 20;
/** Added to each variance, against the variance of all points. */
const RIDGE = 1e-3;
/** Covariances are widened by this: a proposal with thin tails gets stuck outside them. */
const WIDENING = 1.2;
/** One wide Gaussian over everything. */
const WIDE_SHARE = 0.1;
const WIDE_WIDENING = 3;

interface Points {
  readonly values: Float64Array;
  readonly count: number;
  readonly d: number;
}

/** Weighted mean into `means[c]` and covariance into `covariances[c]`; `shares[i * stride + c]` are the weights. Returns their sum. */
function weightedMoments(
  { values, count, d }: Points,
  share: (i: number) => number,
  c: number,
  means: Float64Array,
  covariances: Float64Array,
): number {
  const mean = c * d;
  const matrix = c * d * d;
  let total = 0;
  means.fill(0, mean, mean + d);
  covariances.fill(0, matrix, matrix + d * d);
  for (let i = 0; i < count; i++) {
    const w = share(i);
    total += w;
    for (let j = 0; j < d; j++) means[mean + j]! += w * values[i * d + j]!;
  }
  if (!(total > 0)) return 0;
  for (let j = 0; j < d; j++) means[mean + j]! /= total;
  for (let i = 0; i < count; i++) {
    const w = share(i) / total;
    if (w < 1e-12) continue;
    for (let j = 0; j < d; j++) {
      const off = w * (values[i * d + j]! - means[mean + j]!);
      for (let k = 0; k <= j; k++)
        covariances[matrix + j * d + k]! += off * (values[i * d + k]! - means[mean + k]!);
    }
  }
  for (let j = 0; j < d; j++)
    for (let k = 0; k < j; k++) covariances[matrix + k * d + j] = covariances[matrix + j * d + k]!;
  return total;
}

/** Centres far from one another: each with chance ∝ squared distance, in standard deviations, to the nearest before (Arthur & Vassilvitskii 2007). */
function spreadCentres(
  { values, count, d }: Points,
  variance: Float64Array,
  most: number,
  random: RandomStream,
): number[] {
  const centres = [random.below(count)];
  const nearest = new Float64Array(count).fill(Infinity);
  while (centres.length < most) {
    const last = centres.at(-1)! * d;
    let total = 0;
    for (let i = 0; i < count; i++) {
      let square = 0;
      for (let j = 0; j < d; j++) {
        const off = values[i * d + j]! - values[last + j]!;
        square += (off * off) / variance[j]!;
      }
      nearest[i] = Math.min(nearest[i]!, square);
      total += nearest[i]!;
    }
    let left = random.uniform() * total;
    let next = 0;
    while (next < count - 1 && (left -= nearest[next]!) >= 0) next++;
    centres.push(next);
  }
  return centres;
}

/** Share of each component in each point, `[i * components + c]`. */
function responsibilities(
  mixture: GaussianMixture,
  { values, count, d }: Points,
  shares: Float64Array,
): void {
  const components = mixture.weights.length;
  for (let i = 0; i < count; i++) {
    const at = i * components;
    let top = -Infinity;
    for (let c = 0; c < components; c++) {
      shares[at + c] = logComponent(mixture, c, values, i * d);
      top = Math.max(top, shares[at + c]!);
    }
    let sum = 0;
    for (let c = 0; c < components; c++) sum += shares[at + c] = exp(shares[at + c]! - top);
    for (let c = 0; c < components; c++) shares[at + c]! /= sum;
  }
}

/**
 * A Gaussian mixture to `count` points of `d` values (row-major) by expectation–maximisation, then widened, with one wide
 * Gaussian over all points beside it: a proposal, not an estimate of the density. Null where the points are too few.
 * Source: Dempster, Laird & Rubin 1977 (from memory).
 */
export function fitMixture(
  values: Float64Array,
  count: number,
  d: number,
  random: RandomStream,
): GaussianMixture | null {
  const components = Math.min(MOST_COMPONENTS, Math.floor(count / (POINTS_PER_DIMENSION * d)));
  if (components < 1) return null;
  const points = { values, count, d };
  const size = d * d;
  // one place more than components: the last is the Gaussian over everything
  const means = new Float64Array((components + 1) * d);
  const covariances = new Float64Array((components + 1) * size);
  weightedMoments(points, () => 1, components, means, covariances);
  const all = covariances.slice(components * size);
  const variance = Float64Array.from({ length: d }, (_, j) => all[j * d + j]! + 1e-12);
  spreadCentres(points, variance, components, random).forEach((centre, c) => {
    means.set(values.subarray(centre * d, (centre + 1) * d), c * d);
    for (let j = 0; j < size; j++) covariances[c * size + j] = all[j]! / components;
    for (let j = 0; j < d; j++) covariances[c * size + j * d + j]! += RIDGE * variance[j]!;
  });
  const weights = new Float64Array(components).fill(1);
  const shares = new Float64Array(count * components);
  for (let round = 0; round < ROUNDS; round++) {
    responsibilities(
      createMixture(
        d,
        weights,
        means.subarray(0, components * d),
        covariances.subarray(0, components * size),
      ),
      points,
      shares,
    );
    for (let c = 0; c < components; c++) {
      const total = weightedMoments(points, (i) => shares[i * components + c]!, c, means, covariances);
      weights[c] = Math.max(total, 1e-3);
      for (let j = 0; j < d; j++) covariances[c * size + j * d + j]! += RIDGE * variance[j]!;
    }
  }
  for (let j = 0; j < components * size; j++) covariances[j]! *= WIDENING;
  for (let j = 0; j < size; j++) covariances[components * size + j]! *= WIDE_WIDENING;
  for (let j = 0; j < d; j++) covariances[components * size + j * d + j]! += RIDGE * variance[j]!;
  const sum = weights.reduce((total, weight) => total + weight, 0);
  return createMixture(d, [...weights, (sum * WIDE_SHARE) / (1 - WIDE_SHARE)], means, covariances);
}
