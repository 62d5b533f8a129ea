import type { Move } from './metropolis';
import { membersByCount, type Population } from './population';

/** Share of jumps of a whole difference, from one mode to another. */
const WHOLE_JUMPS = 0.1;
/** The longest jump against the best one of a Gaussian target. */
const LONGEST = 1.3;
/** Standard deviation of what is added to every value, so that no direction stays closed. */
const JITTER = 1e-4;

/**
 * x + γ(a − b) + small noise, a and b two other grounds of the same count out of a population that stands still:
 * symmetric, and shaped by the correlations of the population. γ = 1.3 · uniform · 2.38/√(2d), one in ten whole.
 * Source: ter Braak 2006, Statistics and Computing 16, 239–249 (from memory).
 */
export function differenceMove(population: Population, weight: number): Move {
  const members = membersByCount(population);
  const { stride, values } = population;
  return {
    name: 'difference',
    weight,
    propose: (from, to, random) => {
      const peers = members[from.layers]!;
      if (peers.length < 2) return -Infinity;
      const a = random.below(peers.length);
      const b = (a + 1 + random.below(peers.length - 1)) % peers.length;
      const atA = peers[a]! * stride;
      const atB = peers[b]! * stride;
      const count = 2 * from.layers - 1;
      const scale =
        random.uniform() < WHOLE_JUMPS ? 1 : ((LONGEST * 2.38) / Math.sqrt(2 * count)) * random.uniform();
      to.layers = from.layers;
      for (let j = 0; j < count; j++)
        to.values[j] =
          from.values[j]! + scale * (values[atA + j]! - values[atB + j]!) + JITTER * random.normal();
      return 0;
    },
  };
}
