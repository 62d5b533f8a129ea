import { exp } from '../math/exponential';
import type { EarthModel, FixedParameter } from '../types';
import { logCovariance } from '../uncertainty/covariance';
import { Z95, type AllowedModel, type BestModel } from '../uncertainty/parameter-doubt';
import type { ResidualSystem } from './residual-system';

/** Parameters of a model, ln values then shifts, and Σ residual² with its penalties. */
export interface FittedModel {
  readonly parameters: Float64Array;
  readonly chi2: number;
}

/** Two models count as one when no parameter differs by more than this. */
const SAME_MODEL = 0.02;

/** The earth of the first 2N − 1 parameters; a fixed value is given back as it was stated, not through exp(ln v). */
export function earthOf(
  parameters: Float64Array,
  layers: number,
  fixed: readonly FixedParameter[] = [],
): EarthModel {
  const values = Array.from(parameters.subarray(0, 2 * layers - 1), exp);
  for (const { on, index, value } of fixed) values[on === 'resistivity' ? index : layers + index] = value;
  return { resistivity: values.slice(0, layers), thickness: values.slice(layers) };
}

function same(a: FittedModel, b: FittedModel): boolean {
  return a.parameters.every((value, j) => Math.abs(value - b.parameters[j]!) <= SAME_MODEL);
}

/**
 * The best model and, by rising χ², the others that a 95 % interval of one parameter must reach: χ² < least + 1.96².
 * One that repeats another is left out.
 */
export function allowedModels(
  best: FittedModel,
  others: readonly FittedModel[],
  system: ResidualSystem,
  layers: number,
  held: readonly boolean[],
  fixed: readonly FixedParameter[],
): [BestModel, ...AllowedModel[]] {
  const residual = new Float64Array(system.rows);
  const jacobian = new Float64Array(system.rows * held.length);
  system.linearise(best.parameters, layers, residual, jacobian);
  const describe = ({ parameters, chi2 }: FittedModel): AllowedModel => ({
    parameters,
    earth: earthOf(parameters, layers, fixed),
    excess: Math.max(0, chi2 - best.chi2),
  });
  const kept: FittedModel[] = [best];
  for (const other of others.toSorted((a, b) => a.chi2 - b.chi2))
    if (other.chi2 - best.chi2 < Z95 * Z95 && !kept.some((one) => same(one, other))) kept.push(other);
  const covariance = logCovariance(jacobian, system.rows, held);
  return [{ ...describe(best), covariance }, ...kept.slice(1).map(describe)];
}

/** The first of the others that the best model's own 95 % intervals deny: a ground that fits alike and is another. */
export function standsApart([best, ...others]: readonly [BestModel, ...AllowedModel[]]): AllowedModel | null {
  return (
    others.find((other) =>
      other.parameters.some(
        (value, j) => Math.abs(value - best.parameters[j]!) > Z95 * best.covariance.deviation[j]!,
      ),
    ) ?? null
  );
}
