import type { EarthModel } from '../../types';
import { createGround } from './ground';
import type { GroundSpace } from './ground-space';
import { getGround, type Population } from './population';

/** Samples in Ω·m and m: `parameters[i * stride …]` are ρ₁…ρ_N, h₁…h_{N−1} of sample i. */
export interface SampledEarths {
  readonly size: number;
  readonly stride: number;
  readonly layers: Int32Array;
  readonly parameters: Float64Array;
}

export function sampledEarths(space: GroundSpace, population: Population): SampledEarths {
  const { size, stride } = population;
  const ground = createGround(space.most);
  const one = new Float64Array(stride);
  const parameters = new Float64Array(size * stride);
  for (let i = 0; i < size; i++) {
    getGround(population, i, ground);
    space.toParameters(ground, one);
    parameters.set(one.subarray(0, 2 * ground.layers - 1), i * stride);
  }
  return { size, stride, layers: population.layers, parameters };
}

export function earthAt({ stride, layers, parameters }: SampledEarths, i: number): EarthModel {
  const values = Array.from(parameters.subarray(i * stride, i * stride + 2 * layers[i]! - 1));
  return { resistivity: values.slice(0, layers[i]), thickness: values.slice(layers[i]) };
}

/** Every so-manieth sample, `most` at most. */
export function thinnedEarths(earths: SampledEarths, most: number): EarthModel[] {
  const every = Math.ceil(earths.size / most);
  return Array.from({ length: Math.ceil(earths.size / every) }, (_, i) => earthAt(earths, i * every));
}
