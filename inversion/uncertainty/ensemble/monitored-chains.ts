import type { Chains } from './diagnostics';
import type { GroundSpace } from './ground-space';
import type { Population } from './population';

/** Depths at which the resistivity of a ground of unknown count is watched. */
const WATCHED_DEPTHS = 6;

/** Layer at ln depth `z` of a ground whose boundaries are ln depths, at `at` in `values`. */
function layerAt(values: Float64Array, at: number, layers: number, z: number): number {
  let layer = 0;
  while (layer < layers - 1 && values[at + layers + layer]! < z) layer++;
  return layer;
}

/**
 * What R-hat and the effective sample size are judged by. Stated count: every coordinate. Unknown count: the count,
 * ln likelihood, and lnρ at six depths even in ln, since coordinates of different counts are not the same quantity.
 */
export function monitoredChains(space: GroundSpace, chains: readonly Population[]): Chains[] {
  const read = (value: (chain: Population, i: number) => number): Chains =>
    chains.map((chain) => Float64Array.from({ length: chain.size }, (_, i) => value(chain, i)));
  if (space.fewest === space.most)
    return Array.from({ length: 2 * space.most - 1 }, (_, j) =>
      read(({ values, stride }, i) => values[i * stride + j]!),
    );
  const [low, high] = space.logBoundary;
  const watched = Array.from({ length: WATCHED_DEPTHS }, (_, w) => {
    const z = low + ((w + 0.5) / WATCHED_DEPTHS) * (high - low);
    return read(({ values, stride, layers }, i) => {
      const at = i * stride;
      return values[at + layerAt(values, at, layers[i]!, z)]!;
    });
  });
  return [read(({ layers }, i) => layers[i]!), read(({ logLikelihood }, i) => logLikelihood[i]!), ...watched];
}
