import { log } from '../../math/logarithm';
import { normalQuantile } from './normal-quantile';

/** One monitored quantity: a row of samples for each chain, all of the same length. */
export type Chains = readonly Float64Array[];

/** Each chain cut into halves; a middle sample of an odd length is left out. */
function splitChains(chains: Chains): Float64Array[] {
  const half = Math.floor(chains[0]!.length / 2);
  return chains.flatMap((chain) => [chain.subarray(0, half), chain.subarray(chain.length - half)]);
}

/** How many of the ascending values are below `value` (or, with `equal`, not above it). */
function countBelow(sorted: Float64Array, value: number, equal: boolean): number {
  let low = 0;
  let high = sorted.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (sorted[middle]! < value || (equal && sorted[middle]! === value)) low = middle + 1;
    else high = middle;
  }
  return low;
}

function sortedOf(chains: Chains): Float64Array {
  const all = new Float64Array(chains.length * chains[0]!.length);
  chains.forEach((chain, c) => all.set(chain, c * chain.length));
  return all.sort();
}

/** Normal scores of the ranks over all chains, (r − 3/8)/(S + 1/4); ties share their mean rank. */
function rankNormalised(chains: Chains): Float64Array[] {
  const sorted = sortedOf(chains);
  const size = sorted.length;
  return chains.map((chain) =>
    chain.map((value) => {
      const rank = 0.5 * (countBelow(sorted, value, false) + countBelow(sorted, value, true) + 1);
      return normalQuantile((rank - 0.375) / (size + 0.25));
    }),
  );
}

function meanOf(values: Float64Array): number {
  let sum = 0;
  for (const value of values) sum += value;
  return sum / values.length;
}

interface Spread {
  readonly means: number[];
  /** mean variance within the chains */
  readonly within: number;
  /** (n − 1)/n · within + variance of the means of the chains */
  readonly total: number;
}

function spreadOf(chains: Chains): Spread {
  const n = chains[0]!.length;
  const means = chains.map(meanOf);
  let within = 0;
  chains.forEach((chain, c) => {
    let sum = 0;
    for (const value of chain) sum += (value - means[c]!) * (value - means[c]!);
    within += sum / (n - 1) / chains.length;
  });
  const grand = means.reduce((sum, mean) => sum + mean, 0) / means.length;
  const between = means.reduce((sum, mean) => sum + (mean - grand) * (mean - grand), 0) / (means.length - 1);
  return { means, within, total: ((n - 1) / n) * within + between };
}

/** √(total/within); 1 where nothing varies, Infinity where only the chains differ. */
function plainRHat(chains: Chains): number {
  const { within, total } = spreadOf(chains);
  if (total === 0) return 1;
  return Math.sqrt(total / within);
}

/**
 * Rank-normalised split R-hat, the larger of that of the values and that of their distances from the median.
 * Source: Vehtari, Gelman, Simpson, Carpenter & Bürkner 2021, Bayesian Analysis 16, 667–718.
 */
export function rankRHat(chains: Chains): number {
  const halves = splitChains(chains);
  const sorted = sortedOf(halves);
  const median = sorted[sorted.length >> 1]!;
  const folded = halves.map((half) => half.map((value) => Math.abs(value - median)));
  return Math.max(plainRHat(rankNormalised(halves)), plainRHat(rankNormalised(folded)));
}

/** Autocovariance at `lag` with the divisor n, mean over the chains. */
function autocovariance(chains: Chains, means: readonly number[], lag: number): number {
  const n = chains[0]!.length;
  let total = 0;
  chains.forEach((chain, c) => {
    const mean = means[c]!;
    for (let i = lag; i < n; i++) total += (chain[i]! - mean) * (chain[i - lag]! - mean);
  });
  return total / (n * chains.length);
}

/**
 * Effective sample size of split chains: S/τ, τ = −1 + 2Σ P, P the sums of neighbouring autocorrelations as long as they are
 * positive, made to fall (Geyer 1992, initial monotone sequence), autocorrelations over all chains as in Vehtari et al. 2021.
 * The number of samples where nothing varies; never more than S log₁₀ S.
 */
export function effectiveSize(chains: Chains): number {
  const halves = splitChains(chains);
  const n = halves[0]!.length;
  const size = n * halves.length;
  const { means, within, total } = spreadOf(halves);
  if (total === 0) return size;
  const correlation = (lag: number) =>
    1 - (within - (autocovariance(halves, means, lag) * n) / (n - 1)) / total;
  let tau = -1;
  let least = Infinity;
  for (let lag = 0; lag + 1 < n; lag += 2) {
    const pair = (lag === 0 ? 1 : correlation(lag)) + correlation(lag + 1);
    if (!(pair > 0)) break;
    least = Math.min(least, pair);
    tau += 2 * least;
  }
  return Math.min(size / tau, (size * log(size)) / Math.LN10);
}

/** The same of the normal scores: finite whatever the tails. */
export function bulkEffectiveSize(chains: Chains): number {
  return effectiveSize(rankNormalised(chains));
}
