import { exp } from '../../math/exponential';
import { log } from '../../math/logarithm';
import type { RandomStream } from '../../random';
import { copyValues } from './ground';
import type { Move } from './metropolis';

/** ln of the shortest and longest step of the moves below at β = 1: each is drawn even in ln, so that some fit every ground. */
const STEP = [log(0.01), log(1.5)] as const;
/** Steps are this much longer at most where it is hot. */
const LONGEST = 4;

type Step = (random: RandomStream) => number;

/** Steps for an inverse temperature: a Gaussian of σ is √(1/β) as wide there. */
export function stepAt(beta: number): Step {
  const stretch = Math.min(LONGEST, 1 / Math.sqrt(beta));
  return (random) => stretch * exp(STEP[0] + (STEP[1] - STEP[0]) * random.uniform()) * random.normal();
}

/** One boundary shifted in ln depth; passing a neighbour is refused by the prior. */
export function boundaryMove(step: Step, weight: number): Move {
  return {
    name: 'boundary',
    weight,
    propose: (from, to, random) => {
      if (from.layers === 1) return -Infinity;
      copyValues(from, to);
      to.values[from.layers + random.below(from.layers - 1)]! += step(random);
      return 0;
    },
  };
}

/** One lnρ shifted. */
export function resistivityMove(step: Step, weight: number): Move {
  return {
    name: 'resistivity',
    weight,
    propose: (from, to, random) => {
      copyValues(from, to);
      to.values[random.below(from.layers)]! += step(random);
      return 0;
    },
  };
}

/**
 * One bed made thicker by e^δ at its base and its ρ changed by e^±δ, so that h/ρ or hρ stays: along the equivalence of thin beds.
 * With D the depth of its base, ∂lnD′/∂lnD = e^δ D/D′.
 */
export function equivalenceMove(step: Step, weight: number): Move {
  return {
    name: 'equivalence',
    weight,
    propose: (from, to, random) => {
      const { layers, values } = from;
      if (layers === 1) return -Infinity;
      copyValues(from, to);
      const bed = random.below(layers - 1);
      const delta = step(random);
      const top = bed === 0 ? 0 : exp(values[layers + bed - 1]!);
      const base = values[layers + bed]!;
      const moved = log(top + (exp(base) - top) * exp(delta));
      to.values[layers + bed] = moved;
      to.values[bed]! += random.uniform() < 0.5 ? delta : -delta;
      return delta + base - moved;
    },
  };
}
