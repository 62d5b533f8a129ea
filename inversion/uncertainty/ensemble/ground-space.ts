import { exp } from '../../math/exponential';
import { log } from '../../math/logarithm';
import type { RandomStream } from '../../random';
import type { EnsemblePrior } from './ensemble-types';
import type { Ground } from './ground';

/** The most layers of a ground whose count is unknown. */
export const MOST_COUNT = 8;

/** Up to so many stated layers differences and mixtures move a ground well, and a short ladder of temperatures is enough. */
export const FEW_LAYERS = 3;

/** The grounds that a prior allows, and what its coordinates mean. */
export interface GroundSpace {
  readonly fewest: number;
  readonly most: number;
  /** ln of the ranges: resistivity, and thickness or depth */
  readonly logResistivity: readonly [number, number];
  readonly logBoundary: readonly [number, number];
  /** An exact draw of `layers` and `values`. */
  readonly draw: (random: RandomStream, ground: Ground) => void;
  /** ln density of the prior in the coordinates; −Infinity where it allows no such ground. */
  readonly logPrior: (ground: Ground) => number;
  /** ρ₁…ρ_N, h₁…h_{N−1} into `parameters`. */
  readonly toParameters: (ground: Ground, parameters: Float64Array) => void;
}

interface Ranges {
  readonly logResistivity: readonly [number, number];
  readonly logBoundary: readonly [number, number];
}

function rangesOf(prior: EnsemblePrior): Ranges {
  const [rhoLow, rhoHigh] = prior.resistivity;
  const [low, high] = prior.thickness;
  return { logResistivity: [log(rhoLow), log(rhoHigh)], logBoundary: [log(low), log(high)] };
}

const between = ([low, high]: readonly [number, number], random: RandomStream): number =>
  low + (high - low) * random.uniform();

function inside({ logResistivity, logBoundary }: Ranges, { values, layers }: Ground): boolean {
  for (let j = 0; j < layers; j++)
    if (!(values[j]! >= logResistivity[0] && values[j]! <= logResistivity[1])) return false;
  for (let j = layers; j < 2 * layers - 1; j++)
    if (!(values[j]! >= logBoundary[0] && values[j]! <= logBoundary[1])) return false;
  return true;
}

/** N layers; lnρ and ln h each uniform within their range. Coordinates lnρ₁…lnρ_N, lnh₁…lnh_{N−1}. */
export function statedCountSpace(prior: EnsemblePrior, layers: number): GroundSpace {
  const ranges = rangesOf(prior);
  const { logResistivity, logBoundary } = ranges;
  return {
    ...ranges,
    fewest: layers,
    most: layers,
    draw: (random, ground) => {
      ground.layers = layers;
      for (let j = 0; j < 2 * layers - 1; j++)
        ground.values[j] = between(j < layers ? logResistivity : logBoundary, random);
    },
    logPrior: (ground) => (inside(ranges, ground) ? 0 : -Infinity),
    toParameters: ({ values }, parameters) => {
      for (let j = 0; j < 2 * layers - 1; j++) parameters[j] = exp(values[j]!);
    },
  };
}

/** ln of the density of N layers: 1/8 · (N − 1)!/Z^(N−1) · 1/Δ^N, Z and Δ the lengths of the two ln ranges. */
function logDensities({ logResistivity, logBoundary }: Ranges): Float64Array {
  const perBoundary = log(logBoundary[1] - logBoundary[0]);
  const perLayer = log(logResistivity[1] - logResistivity[0]);
  const densities = new Float64Array(MOST_COUNT + 1);
  let logFactorial = 0;
  for (let n = 1; n <= MOST_COUNT; n++) {
    if (n > 2) logFactorial += log(n - 1);
    densities[n] = logFactorial - (n - 1) * perBoundary - n * perLayer - log(MOST_COUNT);
  }
  return densities;
}

/**
 * 1 … 8 layers, each count as likely; boundaries uniform in ln depth, lnρ uniform, all independent.
 * Coordinates lnρ₁…lnρ_N, ln depth of the N − 1 boundaries, ascending.
 * Source: Malinverno 2002, Geophysical Journal International 151, 675–688 (from memory), without its least thickness.
 */
export function unknownCountSpace(prior: EnsemblePrior): GroundSpace {
  const ranges = rangesOf(prior);
  const { logResistivity, logBoundary } = ranges;
  const densities = logDensities(ranges);
  return {
    ...ranges,
    fewest: 1,
    most: MOST_COUNT,
    draw: (random, ground) => {
      const layers = 1 + random.below(MOST_COUNT);
      ground.layers = layers;
      for (let j = 0; j < layers; j++) ground.values[j] = between(logResistivity, random);
      for (let j = layers; j < 2 * layers - 1; j++) ground.values[j] = between(logBoundary, random);
      ground.values.subarray(layers, 2 * layers - 1).sort();
    },
    logPrior: (ground) => {
      const { layers, values } = ground;
      if (layers < 1 || layers > MOST_COUNT || !inside(ranges, ground)) return -Infinity;
      for (let j = layers + 1; j < 2 * layers - 1; j++) if (values[j]! < values[j - 1]!) return -Infinity;
      return densities[layers]!;
    },
    toParameters: ({ values, layers }, parameters) => {
      let top = 0;
      for (let j = 0; j < layers; j++) parameters[j] = exp(values[j]!);
      for (let j = layers; j < 2 * layers - 1; j++) {
        const base = exp(values[j]!);
        parameters[j] = base - top;
        top = base;
      }
    },
  };
}
