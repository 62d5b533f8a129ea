import { log } from '../../math/logarithm';
import type { FitBounds } from '../../types';
import type { LeastSquaresProblem } from '../levenberg-marquardt';
import type { ReadingFit, ResidualSystem } from '../residual-system';

/** What a ground of many cells is held to beside the readings. */
export interface Regularisation {
  /** λ, weight of the roughness against χ² */
  readonly lambda: number;
  /** w of each of the cells − 1 boundaries: λ Σ w (lnρ_{i+1} − lnρ_i)² */
  readonly boundaryWeights: ArrayLike<number>;
  /** λ s Σ (lnρ_i − lnρ_ref)², a pull towards a reference half-space; absent = none */
  readonly reference?: { readonly logResistivity: number; readonly share: number } | undefined;
}

/** The least-squares problem of a ground of cells of fixed thickness; its parameters are lnρ of the cells, then ln shifts. */
export interface CellProblem {
  readonly cells: number;
  readonly thickness: readonly number[];
  readonly problem: (regularisation: Regularisation) => LeastSquaresProblem;
  /** all 2N − 1 + shifts parameters of the residual system, the thicknesses among them */
  readonly expand: (free: ArrayLike<number>) => Float64Array;
  readonly describe: (free: ArrayLike<number>) => ReadingFit;
}

/** A shift beyond this many of its standard deviations is not looked for. */
const SHIFT_REACH = 10;

/** Writes the penalty rows from row `first` on, and returns their Σ residual². */
function penaltyResiduals(
  free: ArrayLike<number>,
  cells: number,
  { lambda, boundaryWeights, reference }: Regularisation,
  residual: Float64Array,
  first: number,
): number {
  let sum = 0;
  for (let k = 0; k < cells - 1; k++) {
    const r = Math.sqrt(lambda * boundaryWeights[k]!) * (free[k + 1]! - free[k]!);
    residual[first + k] = r;
    sum += r * r;
  }
  if (!reference) return sum;
  const pull = Math.sqrt(lambda * reference.share);
  for (let i = 0; i < cells; i++) {
    const r = pull * (free[i]! - reference.logResistivity);
    residual[first + cells - 1 + i] = r;
    sum += r * r;
  }
  return sum;
}

/** ∂penalty/∂parameter into rows of `width` that hold zeros. */
function penaltySlopes(
  cells: number,
  { lambda, boundaryWeights, reference }: Regularisation,
  jacobian: Float64Array,
  first: number,
  width: number,
): void {
  for (let k = 0; k < cells - 1; k++) {
    const root = Math.sqrt(lambda * boundaryWeights[k]!);
    jacobian[(first + k) * width + k] = -root;
    jacobian[(first + k) * width + k + 1] = root;
  }
  if (!reference) return;
  const pull = Math.sqrt(lambda * reference.share);
  for (let i = 0; i < cells; i++) jacobian[(first + cells - 1 + i) * width + i] = pull;
}

/**
 * χ² + λ Σ w_k (lnρ_{k+1} − lnρ_k)² [+ λ s Σ (lnρ_i − lnρ_ref)²] as rows below those of the residual system, so that shifts
 * of branches and outlier tolerance hold as in a layered fit. Source: Constable, Parker & Constable 1987, Geophysics 52, 289–300.
 */
export function createCellProblem(
  system: ResidualSystem,
  thickness: readonly number[],
  bounds: FitBounds,
  shiftSigma = 0,
): CellProblem {
  const cells = thickness.length + 1;
  const width = cells + system.shifts;
  const fullWidth = 2 * cells - 1 + system.shifts;
  const full = new Float64Array(fullWidth);
  thickness.forEach((h, i) => (full[cells + i] = log(h)));
  const fullJacobian = new Float64Array(system.rows * fullWidth);
  const columnOf = (j: number) => (j < cells ? j : j + cells - 1);
  const place = (free: ArrayLike<number>) => {
    for (let j = 0; j < width; j++) full[columnOf(j)] = free[j]!;
  };
  const limit = (side: 0 | 1) =>
    Float64Array.from({ length: width }, (_, j) =>
      j < cells ? log(bounds.resistivity[side]) : (2 * side - 1) * SHIFT_REACH * shiftSigma,
    );
  const low = limit(0);
  const high = limit(1);
  return {
    cells,
    thickness,
    problem: (regularisation) => ({
      residuals: system.rows + cells - 1 + (regularisation.reference ? cells : 0),
      low,
      high,
      evaluate: (free, residual) => {
        place(free);
        return (
          system.evaluate(full, cells, residual) +
          penaltyResiduals(free, cells, regularisation, residual, system.rows)
        );
      },
      linearise: (free, residual, jacobian) => {
        place(free);
        const sum = system.linearise(full, cells, residual, fullJacobian);
        jacobian.fill(0);
        for (let i = 0; i < system.rows; i++)
          for (let j = 0; j < width; j++)
            jacobian[i * width + j] = fullJacobian[i * fullWidth + columnOf(j)]!;
        penaltySlopes(cells, regularisation, jacobian, system.rows, width);
        return sum + penaltyResiduals(free, cells, regularisation, residual, system.rows);
      },
    }),
    expand: (free) => {
      place(free);
      return Float64Array.from(full);
    },
    describe: (free) => {
      place(free);
      return system.describe(full, cells);
    },
  };
}
