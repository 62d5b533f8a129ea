import { exp } from '../../math/exponential';
import { log } from '../../math/logarithm';
import { plottingSpacing } from '../../spread/plotting-spacing';
import type { Reading } from '../../types';

/** Cells of a ground of many cells, the half-space counted. */
export const FEWEST_CELLS = 8;
export const MOST_CELLS = 40;
/** What 'auto' stands for: a step needs finer cells than a gradient. */
export const USUAL_CELLS = { smooth: 30, stepped: 40 } as const;

/** First and last boundary as shares of the shortest and the longest spacing on the AB/2 axis. */
const SHALLOWEST = 0.05;
const DEEPEST = 1;
/** The grid spans at least this ratio of depths, also where all readings share one spacing. */
const LEAST_SPAN = 10;

/**
 * Thicknesses in m of `cells` − 1 cells over a half-space, their boundaries even in ln depth.
 *
 * They run from 0.05 of the shortest to once the longest spacing (as AB/2). The first must be so shallow: a thin resistive or
 * conductive skin under 0.2 of the shortest spacing moves every reading, and a grid that starts there calls such soundings
 * impossible.
 * `deepest` sets another last boundary, as a share of the longest spacing.
 */
export function cellGrid(readings: readonly Reading[], cells: number, deepest = DEEPEST): number[] {
  const spacings = readings.map((reading) => plottingSpacing(reading.spread));
  const shallow = SHALLOWEST * Math.min(...spacings);
  const deep = Math.max(deepest * Math.max(...spacings), LEAST_SPAN * shallow);
  const step = log(deep / shallow) / (cells - 2);
  const depths = Array.from({ length: cells - 1 }, (_, i) => shallow * exp(i * step));
  return depths.map((depth, i) => depth - (depths[i - 1] ?? 0));
}
