import type { RandomStream } from '../../random';
import {
  componentDensity,
  createMixture,
  DEGREES,
  squaredDistance,
  type MixtureParts,
  type StudentMixture,
} from './student-mixture';

/** Points that a component needs, times its dimensions. */
const POINTS_PER_DIMENSION = 10;
/** Added to each variance, against the variance of all points: well below the width of the narrowest ridge. */
const RIDGE = 1e-5;
/** Scale matrices are widened by this: a chain gets stuck where a proposal falls short. */
const WIDENING = 1.1;
/** `count` points of `d` values, row-major. */
export interface Points {
  readonly values: Float64Array;
  readonly count: number;
  readonly d: number;
}

/** Weighted mean and covariance of the points into place `c`; returns the sum of the weights. */
function fillMoments(
  { values, count, d }: Points,
  weights: Float64Array,
  c: number,
  into: Pick<MixtureParts, 'means' | 'scales'>,
): number {
  const mean = into.means.subarray(c * d, (c + 1) * d).fill(0);
  const scale = into.scales.subarray(c * d * d, (c + 1) * d * d).fill(0);
  let total = 0;
  for (let i = 0; i < count; i++) {
    total += weights[i]!;
    for (let j = 0; j < d; j++) mean[j]! += weights[i]! * values[i * d + j]!;
  }
  for (let j = 0; j < d; j++) mean[j]! /= total;
  for (let i = 0; i < count; i++) {
    const w = weights[i]! / total;
    if (w < 1e-12) continue;
    for (let j = 0; j < d; j++) {
      const off = w * (values[i * d + j]! - mean[j]!);
      for (let k = 0; k <= j; k++) scale[j * d + k]! += off * (values[i * d + k]! - mean[k]!);
    }
  }
  for (let j = 0; j < d; j++) for (let k = 0; k < j; k++) scale[k * d + j] = scale[j * d + k]!;
  return total;
}

function stretchScale(
  { scales }: Pick<MixtureParts, 'scales'>,
  c: number,
  d: number,
  factor: number,
  variance: Float64Array,
): void {
  const at = c * d * d;
  for (let j = 0; j < d * d; j++) scales[at + j]! *= factor;
  for (let j = 0; j < d; j++) scales[at + j * d + j]! += RIDGE * variance[j]!;
}

/** Points far from one another: each with chance ∝ squared distance, in standard deviations, to the nearest before (Arthur & Vassilvitskii 2007). */
function farPoints(
  { values, count, d }: Points,
  variance: Float64Array,
  most: number,
  random: RandomStream,
): number[] {
  const found = [random.below(count)];
  const nearest = new Float64Array(count).fill(Infinity);
  while (found.length < most) {
    const last = found.at(-1)! * d;
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
    found.push(next);
  }
  return found;
}

/** Shares of every component in every point, times the weight (ν + d)/(ν + square) that makes far points count for less. */
function shareOut(
  mixture: StudentMixture,
  { values, count, d }: Points,
  shares: readonly Float64Array[],
  weights: Float64Array,
): void {
  weights.fill(0);
  const squares = new Float64Array(shares.length);
  const densities = new Float64Array(shares.length);
  for (let i = 0; i < count; i++) {
    let sum = 0;
    for (let c = 0; c < shares.length; c++) {
      squares[c] = squaredDistance(mixture, c, values, i * d);
      densities[c] = componentDensity(mixture, c, squares[c]!);
      sum += densities[c]!;
    }
    for (let c = 0; c < shares.length; c++) {
      const share = densities[c]! / sum;
      weights[c]! += share;
      shares[c]![i] = (share * (DEGREES + d)) / (DEGREES + squares[c]!);
    }
  }
}

/**
 * Components of Student-t densities fitted to points by expectation–maximisation, then widened: for a proposal, not an estimate.
 * None where the points are too few.
 * Source: Peel & McLachlan 2000, Statistics and Computing 10, 339–348, with the scales of Kent, Tyler & Vardi 1994 (from memory).
 */
export function fitComponents(
  points: Points,
  most: number,
  rounds: number,
  random: RandomStream,
): MixtureParts {
  const { values, count, d } = points;
  const components = Math.min(most, Math.floor(count / (POINTS_PER_DIMENSION * d)));
  const moments = { means: new Float64Array(components * d), scales: new Float64Array(components * d * d) };
  const weights = new Float64Array(components).fill(1);
  if (components === 0) return { weights, ...moments };
  const all = { means: new Float64Array(d), scales: new Float64Array(d * d) };
  fillMoments(points, new Float64Array(count).fill(1), 0, all);
  const variance = Float64Array.from({ length: d }, (_, j) => all.scales[j * d + j]! + 1e-12);
  farPoints(points, variance, components, random).forEach((point, c) => {
    moments.means.set(values.subarray(point * d, (point + 1) * d), c * d);
    moments.scales.set(all.scales, c * d * d);
    stretchScale(moments, c, d, 1 / components, variance);
  });
  const shares = Array.from({ length: components }, () => new Float64Array(count));
  for (let round = 0; round < rounds; round++) {
    shareOut(createMixture({ weights, ...moments }), points, shares, weights);
    shares.forEach((share, c) => {
      // a component that lost its points stays where it was
      if (weights[c]! < 1) return;
      fillMoments(points, share, c, moments);
      stretchScale(moments, c, d, 1, variance);
    });
  }
  for (let c = 0; c < components; c++) stretchScale(moments, c, d, WIDENING, variance);
  return { weights: weights.map((weight) => weight / count), ...moments };
}
