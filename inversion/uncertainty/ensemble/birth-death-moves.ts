import { exp } from '../../math/exponential';
import { log } from '../../math/logarithm';
import type { RandomStream } from '../../random';
import type { Ground } from './ground';
import type { GroundSpace } from './ground-space';
import type { Move } from './metropolis';

/** What new layers are drawn from: ln ranges of resistivity and depth, and the counts that may be reached. */
export type MoveRange = Pick<GroundSpace, 'fewest' | 'most' | 'logResistivity' | 'logBoundary'>;

/** How lnρ of a new layer is drawn about that of the layer it is cut from: shares and standard deviations; the rest is even over the prior. */
const NEAR = [
  { share: 0.35, sigma: 0.25 },
  { share: 0.35, sigma: 1 },
] as const;
const EVEN_SHARE = 0.3;

function drawNewResistivity(
  { logResistivity: [low, high] }: MoveRange,
  beside: number,
  random: RandomStream,
): number {
  let left = random.uniform();
  for (const { share, sigma } of NEAR) {
    left -= share;
    if (left < 0) return beside + sigma * random.normal();
  }
  return low + (high - low) * random.uniform();
}

/** ln density of that draw for a value within the prior. */
function logNewResistivity(
  { logResistivity: [low, high] }: MoveRange,
  value: number,
  beside: number,
): number {
  let density = EVEN_SHARE / (high - low);
  for (const { share, sigma } of NEAR) {
    const z = (value - beside) / sigma;
    density += (share / (sigma * Math.sqrt(2 * Math.PI))) * exp(-0.5 * z * z);
  }
  return log(density);
}

/**
 * A new boundary, even in ln depth over the prior; the part of the cut layer above it or below it, by a toss, gets a ρ of its own.
 * ln q ratio = ln(1/N) − ln(1/Z) − ln q(ρ): `deathMove` chooses among N boundaries then, and tosses too.
 */
export function birthMove(space: MoveRange, weight: number): Move {
  const [low, high] = space.logBoundary;
  const logRange = log(high - low);
  return {
    name: 'birth',
    weight,
    propose: (from, to, random) => {
      const { layers, values } = from;
      if (layers >= space.most) return -Infinity;
      const depth = low + (high - low) * random.uniform();
      let cut = 0;
      while (cut < layers - 1 && values[layers + cut]! < depth) cut++;
      const beside = values[cut]!;
      const fresh = drawNewResistivity(space, beside, random);
      const upper = random.uniform() < 0.5;
      to.layers = layers + 1;
      for (let j = 0; j <= cut; j++) to.values[j] = values[j]!;
      for (let j = cut; j < layers; j++) to.values[j + 1] = values[j]!;
      to.values[upper ? cut : cut + 1] = fresh;
      for (let j = 0; j < cut; j++) to.values[layers + 1 + j] = values[layers + j]!;
      to.values[layers + 1 + cut] = depth;
      for (let j = cut; j < layers - 1; j++) to.values[layers + 2 + j] = values[layers + j]!;
      return -log(layers) + logRange - logNewResistivity(space, fresh, beside);
    },
  };
}

/** One boundary, each as likely, goes with the layer above it or below it, by a toss: `birthMove` backwards. */
export function deathMove(space: MoveRange, weight: number): Move {
  const logRange = log(space.logBoundary[1] - space.logBoundary[0]);
  return {
    name: 'death',
    weight,
    propose: (from, to, random) => {
      const { layers, values } = from;
      if (layers <= space.fewest) return -Infinity;
      const gone = random.below(layers - 1);
      const upper = random.uniform() < 0.5;
      const lost = upper ? gone : gone + 1;
      const kept = upper ? gone + 1 : gone;
      to.layers = layers - 1;
      for (let j = 0; j < lost; j++) to.values[j] = values[j]!;
      for (let j = lost + 1; j < layers; j++) to.values[j - 1] = values[j]!;
      for (let j = 0; j < gone; j++) to.values[layers - 1 + j] = values[layers + j]!;
      for (let j = gone + 1; j < layers - 1; j++) to.values[layers - 2 + j] = values[layers + j]!;
      return logNewResistivity(space, values[lost]!, values[kept]!) - logRange + log(layers - 1);
    },
  };
}

/** ln of the shortest and longest step of the moves below: each is drawn even in ln, so that some fit every ground. */
const STEP = [log(0.01), log(1.5)] as const;

function step(random: RandomStream): number {
  return exp(STEP[0] + (STEP[1] - STEP[0]) * random.uniform()) * random.normal();
}

function copyValues(from: Ground, to: Ground): void {
  to.layers = from.layers;
  for (let j = 0; j < 2 * from.layers - 1; j++) to.values[j] = from.values[j]!;
}

/** One boundary shifted in ln depth; passing a neighbour is refused by the prior. */
export function boundaryMove(weight: number): Move {
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
export function resistivityMove(weight: number): Move {
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
export function equivalenceMove(weight: number): Move {
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
