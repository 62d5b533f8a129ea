import { log } from '../../math/logarithm';
import type { RandomStream } from '../../random';
import { fitComponents, type Points } from './fit-mixture';
import {
  createMixture,
  drawMixture,
  logDensity,
  type MixtureParts,
  type StudentMixture,
} from './student-mixture';
import type { Ground } from './ground';
import type { Move } from './metropolis';
import { membersByCount, type Population } from './population';

/** Points that a mixture is fitted to, its share of the proposal, and how much is spent on the fit. */
export interface MixtureSource {
  readonly population: Population;
  readonly share: number;
  /** at most so many components a value of the ground */
  readonly componentsPerValue: number;
  readonly rounds: number;
}

interface CountMixture {
  readonly layers: number;
  readonly chance: number;
  readonly mixture: StudentMixture;
}

function pointsOf({ stride, values }: Population, members: readonly number[], layers: number): Points {
  const d = 2 * layers - 1;
  const points = new Float64Array(members.length * d);
  members.forEach((member, i) => points.set(values.subarray(member * stride, member * stride + d), i * d));
  return { values: points, count: members.length, d };
}

function joinParts(parts: readonly MixtureParts[]): MixtureParts {
  const join = (key: keyof MixtureParts) => Float64Array.from(parts.flatMap((part) => [...part[key]]));
  return { weights: join('weights'), means: join('means'), scales: join('scales') };
}

/** A mixture for each layer count that the sources hold often enough; the first tells how likely each count is. */
function mixturesByCount(sources: readonly MixtureSource[], random: RandomStream): CountMixture[] {
  const members = sources.map(({ population }) => membersByCount(population));
  const found = members[0]!.flatMap((first, layers): CountMixture[] => {
    if (layers === 0) return [];
    const parts = sources.map(({ population, share, componentsPerValue, rounds }, s): MixtureParts => {
      const points = pointsOf(population, members[s]![layers]!, layers);
      const fitted = fitComponents(points, componentsPerValue * points.d, rounds, random);
      return { ...fitted, weights: fitted.weights.map((weight) => weight * share) };
    });
    const joined = joinParts(parts);
    if (joined.weights.length === 0) return [];
    return [{ layers, chance: first.length + 1, mixture: createMixture(joined) }];
  });
  const total = found.reduce((sum, { chance }) => sum + chance, 0);
  return found.map((one) => ({ ...one, chance: one.chance / total }));
}

/**
 * A draw from mixtures of Student-t densities that were fitted beforehand, whatever the present ground: it carries the chain from
 * mode to mode and from count to count at once. None where the sources hold too few grounds.
 */
export function mixtureMoves(
  sources: readonly MixtureSource[],
  weight: number,
  random: RandomStream,
): Move[] {
  const byCount = mixturesByCount(sources, random);
  if (byCount.length === 0) return [];
  const logDensityOf = (ground: Ground): number => {
    const one = byCount.find(({ layers }) => layers === ground.layers);
    return one ? log(one.chance) + logDensity(one.mixture, ground.values) : -Infinity;
  };
  const move: Move = {
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
  return [move];
}
