import type { RandomStream } from '../../random';
import type { Move } from './metropolis';
import { membersByCount, type Population } from './population';

/** Share of jumps of a whole difference, from one mode to another. */
const WHOLE_JUMPS = 0.1;
/** The longest jump against the best one of a Gaussian target. */
const LONGEST = 1.3;
/** Standard deviation of what is added to every value, so that no direction stays closed. */
const JITTER = 1e-4;

/** Share of jumps in some of the values only, each of which then takes part with a chance that is drawn anew. */
const PARTIAL_JUMPS = 0.5;

/**
 * x + γ(a − b) + small noise, a and b two other grounds of the same count out of a population that stands still:
 * symmetric, and shaped by the correlations of the population. γ = 1.3 · uniform · 2.38/√(2d), d the values that take part;
 * one jump in ten is whole. Source: ter Braak 2006, Statistics and Computing 16, 239–249; the partial jumps: Vrugt et al. 2009,
 * Int. J. Nonlinear Sciences and Numerical Simulation 10, 273–290 (from memory).
 */
export function differenceMove(population: Population, weight: number): Move {
  const members = membersByCount(population);
  const { stride, values } = population;
  const takesPart = new Uint8Array(stride);
  const chooseParts = (count: number, random: RandomStream): number => {
    const chance = random.uniform() < PARTIAL_JUMPS ? random.uniform() : 1;
    let parts = 0;
    for (let j = 0; j < count; j++) parts += takesPart[j] = random.uniform() < chance ? 1 : 0;
    if (parts > 0) return parts;
    takesPart[random.below(count)] = 1;
    return 1;
  };
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
      const parts = chooseParts(count, random);
      const scale =
        random.uniform() < WHOLE_JUMPS ? 1 : ((LONGEST * 2.38) / Math.sqrt(2 * parts)) * random.uniform();
      to.layers = from.layers;
      for (let j = 0; j < count; j++) {
        const jump = scale * (values[atA + j]! - values[atB + j]!) + JITTER * random.normal();
        to.values[j] = from.values[j]! + (takesPart[j] === 1 ? jump : 0);
      }
      return 0;
    },
  };
}
