import type { EarthModel, FixedParameter } from '../types';
import { logCovariance } from '../uncertainty/covariance';
import { Z95, type AllowedModel } from '../uncertainty/parameter-doubt';
import type { ResidualSystem } from './residual-system';

/** ln parameters of a model and its χ². */
export interface FittedModel {
  readonly logParameters: Float64Array;
  readonly chi2: number;
}

/** Two models count as one when no ln parameter differs by more than this. */
const SAME_MODEL = 0.02;

/** The earth of ln parameters; a fixed value is given back as it was stated, not through exp(ln v). */
export function earthOf(logParameters: Float64Array, fixed: readonly FixedParameter[]): EarthModel {
  const layers = (logParameters.length + 1) / 2;
  const values = Array.from(logParameters, Math.exp);
  for (const { on, index, value } of fixed) values[on === 'resistivity' ? index : layers + index] = value;
  return { resistivity: values.slice(0, layers), thickness: values.slice(layers) };
}

function same(a: FittedModel, b: FittedModel): boolean {
  return a.logParameters.every((value, j) => Math.abs(value - b.logParameters[j]!) <= SAME_MODEL);
}

/**
 * The best model and, by rising χ², the others that a 95 % interval of one parameter must reach: χ² < least + 1.96².
 * Each is linearised where it stands; one that repeats another is left out.
 */
export function allowedModels(
  best: FittedModel,
  others: readonly FittedModel[],
  system: ResidualSystem,
  held: readonly boolean[],
  fixed: readonly FixedParameter[],
): [AllowedModel, ...AllowedModel[]] {
  const m = system.readings;
  const residual = new Float64Array(m);
  const jacobian = new Float64Array(m * held.length);
  const describe = ({ logParameters, chi2 }: FittedModel): AllowedModel => {
    const earth = earthOf(logParameters, fixed);
    system.linearise(logParameters, earth.resistivity.length, residual, jacobian);
    return {
      earth,
      covariance: logCovariance(jacobian, m, held),
      excess: Math.max(0, chi2 - best.chi2),
    };
  };
  const kept: FittedModel[] = [best];
  for (const other of others.toSorted((a, b) => a.chi2 - b.chi2))
    if (other.chi2 - best.chi2 < Z95 ** 2 && !kept.some((one) => same(one, other))) kept.push(other);
  return [describe(best), ...kept.slice(1).map(describe)];
}

/** The first of the others that the best model's own 95 % intervals deny: a ground that fits alike and is another. */
export function standsApart([best, ...others]: readonly [
  AllowedModel,
  ...AllowedModel[],
]): AllowedModel | null {
  const of = ({ earth }: AllowedModel) => [...earth.resistivity, ...earth.thickness].map(Math.log);
  const centre = of(best);
  return (
    others.find((other) =>
      of(other).some((value, j) => Math.abs(value - centre[j]!) > Z95 * best.covariance.deviation[j]!),
    ) ?? null
  );
}
