import { log } from '../../math/logarithm';
import type { RandomStream } from '../../random';
import { fitMixture } from './fit-mixture';
import { drawMixture, logDensity, type GaussianMixture } from './gaussian-mixture';
import type { Ground } from './ground';
import type { Move } from './metropolis';
import { membersByCount, type Population } from './population';

interface CountMixture {
  readonly layers: number;
  readonly chance: number;
  readonly mixture: GaussianMixture;
}

/** A mixture for each layer count that the population holds often enough, with the chance of the count. */
function mixturesByCount(population: Population, random: RandomStream): CountMixture[] {
  const { stride, values } = population;
  const found = membersByCount(population).flatMap((members, layers) => {
    if (members.length === 0) return [];
    const d = 2 * layers - 1;
    const points = new Float64Array(members.length * d);
    members.forEach((member, i) => points.set(values.subarray(member * stride, member * stride + d), i * d));
    const mixture = fitMixture(points, members.length, d, random);
    return mixture ? [{ layers, chance: members.length, mixture }] : [];
  });
  const total = found.reduce((sum, { chance }) => sum + chance, 0);
  return found.map((one) => ({ ...one, chance: one.chance / total }));
}

/**
 * A draw from Gaussian mixtures that were fitted to a population beforehand, whatever the present ground: it carries
 * the chain from mode to mode and from count to count at once. Null where the population is too small for any.
 */
export function mixtureMove(population: Population, weight: number, random: RandomStream): Move | null {
  const byCount = mixturesByCount(population, random);
  if (byCount.length === 0) return null;
  const logDensityOf = (ground: Ground): number => {
    const one = byCount.find(({ layers }) => layers === ground.layers);
    return one ? log(one.chance) + logDensity(one.mixture, ground.values) : -Infinity;
  };
  return {
    name: 'mixture',
    weight,
    propose: (from, to, stream) => {
      let left = stream.uniform();
      const chosen = byCount.find(({ chance }) => (left -= chance) < 0) ?? byCount.at(-1)!;
      to.layers = chosen.layers;
      drawMixture(chosen.mixture, to.values, stream);
      if (Number.isNaN(from.logMixture)) from.logMixture = logDensityOf(from);
      to.logMixture = logDensityOf(to);
      return from.logMixture - to.logMixture;
    },
  };
}
