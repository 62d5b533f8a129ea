import { log } from '../../math/logarithm';
import type { RandomStream } from '../../random';
import {
  drawContrast,
  drawNewResistivity,
  logContrast,
  logNewResistivity,
  shareAbove,
  type MoveRange,
} from './cut-layer';
import type { Ground } from './ground';
import type { Move } from './metropolis';

/** What a new boundary changes: ρ of the part above it, of the part below it, or of both, by chance of a third each. */
const WAYS = 3;
const BOTH = 2;

/** A boundary at ln depth `depth` within `layer`, both parts of which keep its ρ. */
function insertBoundary({ layers, values }: Ground, to: Ground, layer: number, depth: number): void {
  to.layers = layers + 1;
  for (let j = 0; j <= layer; j++) to.values[j] = values[j]!;
  for (let j = layer; j < layers; j++) to.values[j + 1] = values[j]!;
  for (let j = 0; j < layer; j++) to.values[layers + 1 + j] = values[layers + j]!;
  to.values[layers + 1 + layer] = depth;
  for (let j = layer; j < layers - 1; j++) to.values[layers + 2 + j] = values[layers + j]!;
}

/** The layers above and below boundary `gone` become one, with the ρ of the lower one. */
function removeBoundary({ layers, values }: Ground, to: Ground, gone: number): void {
  to.layers = layers - 1;
  for (let j = 0; j < gone; j++) to.values[j] = values[j]!;
  for (let j = gone + 1; j < layers; j++) to.values[j - 1] = values[j]!;
  for (let j = 0; j < gone; j++) to.values[layers - 1 + j] = values[layers + j]!;
  for (let j = gone + 1; j < layers - 1; j++) to.values[layers - 2 + j] = values[layers + j]!;
}

/** lnρ above and below a contrast c, their mean by share s of ln depth kept: m + (1 − s)c and m − sc, of unit Jacobian. Returns ln q(c). */
function splitResistivity(to: Ground, layer: number, share: number, random: RandomStream): number {
  const contrast = drawContrast(random);
  const mean = to.values[layer]!;
  to.values[layer] = mean + (1 - share) * contrast;
  to.values[layer + 1] = mean - share * contrast;
  return logContrast(contrast);
}

/**
 * A new boundary, even in ln depth over the prior; the part of the cut layer above it or below it gets a ρ of its own, or both do and
 * keep their mean. ln q ratio = ln(1/N) − ln(1/Z) − ln q(ρ): `deathMove` chooses among N boundaries then, and the way too.
 * Source of the split: Richardson & Green 1997, J. R. Statist. Soc. B 59, 731–792 (from memory).
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
      insertBoundary(from, to, cut, depth);
      const way = random.below(WAYS);
      if (way === BOTH)
        return (
          logRange - log(layers) - splitResistivity(to, cut, shareAbove(space, from, cut, depth), random)
        );
      const beside = values[cut]!;
      const fresh = drawNewResistivity(space, beside, random);
      to.values[cut + way] = fresh;
      return logRange - log(layers) - logNewResistivity(space, fresh, beside);
    },
  };
}

/** One boundary, each as likely, goes, and what it parted becomes one in one of the three ways: `birthMove` backwards. */
export function deathMove(space: MoveRange, weight: number): Move {
  const logRange = log(space.logBoundary[1] - space.logBoundary[0]);
  return {
    name: 'death',
    weight,
    propose: (from, to, random) => {
      const { layers, values } = from;
      if (layers <= space.fewest) return -Infinity;
      const gone = random.below(layers - 1);
      const [above, below] = [values[gone]!, values[gone + 1]!];
      removeBoundary(from, to, gone);
      const way = random.below(WAYS);
      if (way === BOTH) {
        const share = shareAbove(space, to, gone, values[layers + gone]!);
        to.values[gone] = share * above + (1 - share) * below;
        return logContrast(above - below) - logRange + log(layers - 1);
      }
      const [lost, kept] = way === 0 ? [above, below] : [below, above];
      to.values[gone] = kept;
      return logNewResistivity(space, lost, kept) - logRange + log(layers - 1);
    },
  };
}
