import type { Ground } from './ground';

/** Many grounds side by side, as they stand at one moment. */
export interface Population {
  readonly size: number;
  /** values of the largest ground */
  readonly stride: number;
  readonly layers: Int32Array;
  /** `values[i * stride + j]` */
  readonly values: Float64Array;
  readonly logLikelihood: Float64Array;
}

export function createPopulation(size: number, mostLayers: number): Population {
  const stride = 2 * mostLayers - 1;
  return {
    size,
    stride,
    layers: new Int32Array(size),
    values: new Float64Array(size * stride),
    logLikelihood: new Float64Array(size),
  };
}

export function putGround(population: Population, i: number, ground: Ground): void {
  const at = i * population.stride;
  const count = 2 * ground.layers - 1;
  for (let j = 0; j < count; j++) population.values[at + j] = ground.values[j]!;
  population.layers[i] = ground.layers;
  population.logLikelihood[i] = ground.logLikelihood;
}

/** Writes member `i` into `ground`; its prior is the caller's to fill in. */
export function getGround(population: Population, i: number, ground: Ground): void {
  const at = i * population.stride;
  const count = 2 * population.layers[i]! - 1;
  for (let j = 0; j < count; j++) ground.values[j] = population.values[at + j]!;
  ground.layers = population.layers[i]!;
  ground.logLikelihood = population.logLikelihood[i]!;
  ground.logMixture = NaN;
}

/** The chosen members, in that order, as a population of their own. */
export function chosenMembers(population: Population, chosen: ArrayLike<number>): Population {
  const { stride } = population;
  const picked = createPopulation(chosen.length, (stride + 1) / 2);
  for (let i = 0; i < chosen.length; i++) {
    const from = chosen[i]!;
    picked.values.set(population.values.subarray(from * stride, (from + 1) * stride), i * stride);
    picked.layers[i] = population.layers[from]!;
    picked.logLikelihood[i] = population.logLikelihood[from]!;
  }
  return picked;
}

export function joinPopulations(parts: readonly Population[]): Population {
  const size = parts.reduce((sum, part) => sum + part.size, 0);
  const joined = createPopulation(size, (parts[0]!.stride + 1) / 2);
  let at = 0;
  for (const part of parts) {
    joined.values.set(part.values, at * part.stride);
    joined.layers.set(part.layers, at);
    joined.logLikelihood.set(part.logLikelihood, at);
    at += part.size;
  }
  return joined;
}

/** All populations but number `c`, joined. */
export function otherPopulations(populations: readonly Population[], c: number): Population {
  return joinPopulations(populations.filter((_, other) => other !== c));
}

/** Members of each layer count: entry N lists those of N layers. */
export function membersByCount({ layers, stride }: Population): number[][] {
  const lists: number[][] = Array.from({ length: (stride + 1) / 2 + 1 }, () => []);
  layers.forEach((count, i) => lists[count]!.push(i));
  return lists;
}
