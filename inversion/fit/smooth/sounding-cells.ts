import { log } from '../../math/logarithm';
import { createForwardOperator } from '../../operator/forward-operator';
import type { FitSettings, Reading } from '../../types';
import type { FitOptions } from '../fit-layered';
import { createResidualSystem, type ResidualSystem } from '../residual-system';
import { createCellProblem, type CellProblem } from './cell-problem';

/** The readings of one sounding over one grid of cells. */
export interface SoundingCells {
  readonly system: ResidualSystem;
  readonly cell: CellProblem;
  /** every cell at the mean ln ρa, within the bounds; shifts 0 */
  readonly uniform: Float64Array;
}

export function soundingCells(
  readings: readonly Reading[],
  settings: FitSettings,
  thickness: readonly number[],
  operators: FitOptions['operators'],
): SoundingCells {
  const spreads = readings.map((reading) => reading.spread);
  const operator = operators?.operatorFor(spreads) ?? createForwardOperator(spreads);
  const system = createResidualSystem(operator, readings, settings);
  const cell = createCellProblem(system, thickness, settings.bounds, settings.branchShiftSigma);
  const mean = readings.reduce((sum, reading) => sum + log(reading.apparentResistivity), 0) / readings.length;
  const [low, high] = settings.bounds.resistivity;
  const value = Math.min(log(high), Math.max(log(low), mean));
  return {
    system,
    cell,
    uniform: new Float64Array(cell.cells + system.shifts).fill(value, 0, cell.cells),
  };
}
