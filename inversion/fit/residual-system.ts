import { exp } from '../math/exponential';
import { log } from '../math/logarithm';
import type { ForwardOperator } from '../operator/forward-operator';
import { TOLERANCES } from '../tolerances';
import type { FitSettings, Reading } from '../types';
import { branchLayout, type BranchLayout } from './branch-shifts';
import { createPriorRows } from './prior-rows';
import { tolerantMisfit, tolerantResidual } from './tolerant-residual';

/** What stands beside the readings in a fit. */
export type ResidualOptions = Pick<FitSettings, 'branchShiftSigma'> &
  Partial<Pick<FitSettings, 'priors' | 'outlierTolerant'>>;

/** What the readings say of one set of parameters, penalties apart. */
export interface ReadingFit {
  /** ρa of the ground with the shift of its branch, Ω·m */
  readonly predicted: number[];
  /** (ln predicted − ln observed)/σ, as it is: an outlier is not made smaller here */
  readonly residuals: number[];
  /** Σ residual²; of an outlier-tolerant fit Σ min(residual², 2.5²) */
  readonly chi2: number;
}

/**
 * Whitened residuals of a set of readings under one forward operator, followed by one row for each shift and each prior.
 * `parameters` are the 2N − 1 ln values of an earth of N layers, then the ln shifts of `branches`.
 */
export interface ResidualSystem {
  readonly readings: number;
  readonly shifts: number;
  /** readings, shifts and priors */
  readonly rows: number;
  readonly branches: BranchLayout['branches'];
  /** Σ residual² over all rows; `residual` receives them. */
  readonly evaluate: (parameters: ArrayLike<number>, layers: number, residual: Float64Array) => number;
  /** The same, and ∂residual/∂parameter into `jacobian`, row-major rows × (2N − 1 + shifts). */
  readonly linearise: (
    parameters: ArrayLike<number>,
    layers: number,
    residual: Float64Array,
    jacobian: Float64Array,
  ) => number;
  readonly describe: (parameters: ArrayLike<number>, layers: number) => ReadingFit;
}

const FLOOR = TOLERANCES.logResidualFloor;
const LOG_FLOOR = log(FLOOR);

/**
 * ln(predicted/observed). Below `TOLERANCES.logResidualFloor` (a prediction near or under zero) the logarithm goes on along
 * its tangent.
 */
export function logRatio(ratio: number): number {
  return ratio >= FLOOR ? log(ratio) : LOG_FLOOR + (ratio - FLOOR) / FLOOR;
}

/** Slope of `logRatio` per unit observed. */
export const logRatioSlope = (ratio: number): number => 1 / Math.max(ratio, FLOOR);

/** residualᵢ = (ln predictedᵢ + shift of its branch − ln observedᵢ)/σᵢ over the readings, in their order; then the penalties. */
export function createResidualSystem(
  operator: ForwardOperator,
  readings: readonly Reading[],
  options: ResidualOptions = {},
): ResidualSystem {
  const m = readings.length;
  const tolerant = options.outlierTolerant === true;
  const observed = Float64Array.from(readings, (reading) => reading.apparentResistivity);
  const perSigma = Float64Array.from(readings, (reading) => 1 / reading.relativeError);
  const { branches, shiftOf, shifts } = branchLayout(readings, options.branchShiftSigma !== undefined);
  const perShiftSigma = 1 / (options.branchShiftSigma ?? 1);
  const priors = createPriorRows(options.priors ?? [], m + shifts);
  const penaltyRows = shifts + priors.rows;
  const predicted = new Float64Array(m);
  let values = new Float64Array(0);

  /** ρ and h of ln parameters; returns their number */
  const exponentiate = (parameters: ArrayLike<number>, layers: number): number => {
    const count = 2 * layers - 1;
    if (values.length < count) values = new Float64Array(count);
    for (let j = 0; j < count; j++) values[j] = exp(parameters[j]!);
    return count;
  };
  const shiftAt = (parameters: ArrayLike<number>, count: number, i: number): number =>
    shiftOf[i]! < 0 ? 0 : parameters[count + shiftOf[i]!]!;
  const penalties = (parameters: ArrayLike<number>, layers: number, residual: Float64Array): number => {
    let sum = priors.evaluate(parameters, values, layers, residual);
    for (let s = 0; s < shifts; s++) {
      const r = parameters[2 * layers - 1 + s]! * perShiftSigma;
      residual[m + s] = r;
      sum += r * r;
    }
    return sum;
  };

  return {
    readings: m,
    shifts,
    rows: m + penaltyRows,
    branches,
    evaluate: (parameters, layers, residual) => {
      const count = exponentiate(parameters, layers);
      operator.predictInto(values, layers, predicted);
      let sum = 0;
      for (let i = 0; i < m; i++) {
        const ratio = logRatio(predicted[i]! / observed[i]!) + shiftAt(parameters, count, i);
        const r = tolerant ? tolerantResidual(ratio * perSigma[i]!).value : ratio * perSigma[i]!;
        residual[i] = r;
        sum += r * r;
      }
      return sum + penalties(parameters, layers, residual);
    },
    linearise: (parameters, layers, residual, jacobian) => {
      const count = exponentiate(parameters, layers);
      const width = count + shifts;
      const rows = operator.slopeRows(values, layers);
      let sum = 0;
      for (let i = 0; i < m; i++) {
        const from = i * (count + 1);
        const to = i * width;
        const ratio = rows[from + count]! / observed[i]!;
        let r = (logRatio(ratio) + shiftAt(parameters, count, i)) * perSigma[i]!;
        let perLog = perSigma[i]!;
        if (tolerant) {
          const told = tolerantResidual(r);
          r = told.value;
          perLog *= told.slope;
        }
        residual[i] = r;
        sum += r * r;
        const scale = (logRatioSlope(ratio) * perLog) / observed[i]!;
        for (let j = 0; j < count; j++) jacobian[to + j] = rows[from + j]! * scale;
        for (let s = 0; s < shifts; s++) jacobian[to + count + s] = s === shiftOf[i] ? perLog : 0;
      }
      if (penaltyRows > 0) {
        jacobian.fill(0, m * width, (m + penaltyRows) * width);
        for (let s = 0; s < shifts; s++) jacobian[(m + s) * width + count + s] = perShiftSigma;
        priors.linearise(values, layers, jacobian, width);
      }
      return sum + penalties(parameters, layers, residual);
    },
    describe: (parameters, layers) => {
      const count = exponentiate(parameters, layers);
      operator.predictInto(values, layers, predicted);
      const shift = (i: number) => shiftAt(parameters, count, i);
      const residuals = Array.from(
        predicted,
        (value, i) => (logRatio(value / observed[i]!) + shift(i)) * perSigma[i]!,
      );
      return {
        predicted: Array.from(predicted, (value, i) => (shift(i) === 0 ? value : value * exp(shift(i)))),
        residuals,
        chi2: tolerant ? tolerantMisfit(residuals, m) : residuals.reduce((sum, r) => sum + r * r, 0),
      };
    },
  };
}
