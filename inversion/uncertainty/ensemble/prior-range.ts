import { effectiveDepth } from '../../spread/effective-depth';
import type { Reading } from '../../types';
import type { EnsemblePrior } from './ensemble-types';

type Range = readonly [number, number];

/** The part of `range` within `outer`; `outer` where they do not meet. */
function within([low, high]: Range, outer: Range): Range {
  const part: Range = [Math.max(low, outer[0]), Math.min(high, outer[1])];
  return part[0] < part[1] ? part : outer;
}

/**
 * What a careful reader of the curve would expect, within the stated prior: resistivities from a fifth of the least to five times
 * the largest apparent one, thicknesses from a third of the least to the largest effective depth of the spreads.
 */
export function narrowPrior(prior: EnsemblePrior, readings: readonly Reading[]): EnsemblePrior {
  const values = readings.map((reading) => reading.apparentResistivity);
  const depths = readings.map(({ spread }) => effectiveDepth(spread));
  return {
    resistivity: within([Math.min(...values) / 5, Math.max(...values) * 5], prior.resistivity),
    thickness: within([Math.min(...depths) / 3, Math.max(...depths)], prior.thickness),
  };
}

/** The stated prior and a decade of resistivity more on either side, and a factor of three of thickness. */
export function widePrior({ resistivity, thickness }: EnsemblePrior): EnsemblePrior {
  return {
    resistivity: [resistivity[0] / 10, resistivity[1] * 10],
    thickness: [thickness[0] / 3, thickness[1] * 3],
  };
}
