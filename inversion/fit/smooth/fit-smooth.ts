import { InversionError } from '../../inversion-error';
import type { FitResult, FitSettings, Reading } from '../../types';
import type { FitOptions } from '../fit-layered';
import { cellGrid, USUAL_CELLS } from './cell-grid';
import type { CellProblem } from './cell-problem';
import { requireSmoothInput } from './check-smooth-input';
import { fewestSteps } from './few-steps';
import { buildSmoothResult, type SmoothResultParts } from './smooth-result';
import { soundingCells } from './sounding-cells';
import { smoothestOrClosest, type TradeOffOptions } from './trade-off';

/**
 * χ²/N of a smooth or stepped ground unless another is asked for. At 1 the readings are met as closely as their errors
 * deserve; below it a ground of many cells begins to follow the errors themselves.
 */
export const USUAL_TARGET = 1;

/**
 * The smoothest ground of many cells that brings χ²/N down to the target (`kind: 'smooth'`), or one with few steps
 * (`kind: 'stepped'`), on a fixed grid of cells even in ln depth. First differences of lnρ are the roughness.
 *
 * Where the target is out of reach, `reachedTarget` is false, a warning says why, and the result is the smoothest ground
 * within 5 % of the least χ² of the grid. The range of a cell is linear and holds for the roughness found alone: over sharp
 * beds the 95 % range held the truth in 69 % (smooth) and 61 % (stepped) of the cells of 60 reference soundings.
 * `seed` changes nothing: there is no chance in it. Source: Constable, Parker & Constable 1987, Geophysics 52, 289–300.
 * Throws `InversionError` with a path for input that cannot be used; inputs are not changed.
 */
export function fitSmooth(
  readings: readonly Reading[],
  settings: FitSettings,
  options: FitOptions = {},
): FitResult {
  const { kind } = settings;
  if (kind === 'layered')
    throw new InversionError('layer-count', 'a layered fit has beds, not cells', ['settings', 'kind']);
  requireSmoothInput(readings, settings);
  const cells = settings.layers === 'auto' ? USUAL_CELLS[kind] : settings.layers;
  const grid = cellGrid(readings, cells);
  const { system, cell, uniform } = soundingCells(readings, settings, grid, options.operators);
  let iterations = 0;
  const target = settings.targetMisfit ?? USUAL_TARGET;
  const found = search(kind, cell, target * readings.length, uniform, {
    onBalance: (balance, steps) => {
      iterations += steps;
      const chi2PerReading = balance.chi2 / readings.length;
      options.onProgress?.({ layers: cells, start: 1, starts: 1, iteration: iterations, chi2PerReading });
    },
  });
  return buildSmoothResult({ kind, readings, settings, system, cell, target, iterations, ...found });
}

/** The smoothest ground at the target χ², or the smoothest about as close as one comes; then, if asked for, its few steps. */
function search(
  kind: 'smooth' | 'stepped',
  cell: CellProblem,
  target: number,
  uniform: Float64Array,
  { onBalance }: Pick<TradeOffOptions, 'onBalance'>,
): Pick<SmoothResultParts, 'balance' | 'problem' | 'reached' | 'uniform'> {
  const even = { boundaryWeights: new Float64Array(cell.cells - 1).fill(1) };
  const options = { cell, shape: even, onBalance };
  const { balance: smooth, reached, goal, first, range } = smoothestOrClosest(options, target, uniform);
  const { balance, shape } =
    kind === 'stepped' ? fewestSteps(cell, smooth, goal, range, onBalance) : { balance: smooth, shape: even };
  return {
    balance,
    problem: cell.problem({ ...shape, lambda: balance.lambda }),
    reached,
    uniform: reached && first.chi2 <= target,
  };
}
