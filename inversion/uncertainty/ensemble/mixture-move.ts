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

/** Most components, and share of the proposal, of the mixture fitted to the posterior and of that fitted to the tempered population. */
const POSTERIOR = { components: 10, share: 0.8 };
const TEMPERED = { components: 5, share: 0.2 };

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

/** A mixture for each layer count that the populations hold often enough, with the chance of the count. */
function mixturesByCount(posterior: Population, tempered: Population, random: RandomStream): CountMixture[] {
  const temperedMembers = membersByCount(tempered);
  const found = membersByCount(posterior).flatMap((members, layers): CountMixture[] => {
    const parts = [
      { ...POSTERIOR, points: pointsOf(posterior, members, layers) },
      { ...TEMPERED, points: pointsOf(tempered, temperedMembers[layers]!, layers) },
    ].map(({ points, components, share }) => {
      const fitted = fitComponents(points, components, random);
      return { ...fitted, weights: fitted.weights.map((weight) => weight * share) };
    });
    const joined = joinParts(parts);
    if (joined.weights.length === 0) return [];
    return [{ layers, chance: members.length + 1, mixture: createMixture(joined) }];
  });
  const total = found.reduce((sum, { chance }) => sum + chance, 0);
  return found.map((one) => ({ ...one, chance: one.chance / total }));
}

/**
 * A draw from mixtures of Student-t densities that were fitted beforehand, whatever the present ground: it carries the chain from
 * mode to mode and from count to count at once. A part is fitted to a tempered population, which reaches into the tails.
 * Null where the populations are too small for any.
 */
export function mixtureMove(
  posterior: Population,
  tempered: Population,
  weight: number,
  random: RandomStream,
): Move | null {
  const byCount = mixturesByCount(posterior, tempered, random);
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
