import { createPriorRows } from '../../fit/prior-rows';
import { log } from '../../math/logarithm';
import type { ForwardOperator } from '../../operator/forward-operator';
import { TOLERANCES } from '../../tolerances';
import type { GaussianPrior, Reading } from '../../types';
import type { Ground } from './ground';
import type { GroundSpace } from './ground-space';

/** ln likelihood of a ground, constants left out. */
export type LogLikelihood = (ground: Ground) => number;

/**
 * −½ Σ ((ln predicted − ln observed)/σ)², and the same of what else is known beforehand; −Infinity where it is not a number.
 * Nothing is allocated at a call. Below `TOLERANCES.logResidualFloor` the logarithm goes on along its tangent, as in a fit.
 */
export function createLogLikelihood(
  space: GroundSpace,
  operator: ForwardOperator,
  readings: readonly Reading[],
  priors: readonly GaussianPrior[],
): LogLikelihood {
  const m = readings.length;
  const perObserved = Float64Array.from(readings, (reading) => 1 / reading.apparentResistivity);
  const perSigma = Float64Array.from(readings, (reading) => 1 / reading.relativeError);
  const predicted = new Float64Array(m);
  const parameters = new Float64Array(2 * space.most - 1);
  const rows = createPriorRows(priors, 0);
  const priorResiduals = new Float64Array(rows.rows);
  const floor = TOLERANCES.logResidualFloor;
  const logFloor = log(floor);

  return (ground) => {
    space.toParameters(ground, parameters);
    operator.predictInto(parameters, ground.layers, predicted);
    let sum = 0;
    for (let i = 0; i < m; i++) {
      const ratio = predicted[i]! * perObserved[i]!;
      const r = (ratio >= floor ? log(ratio) : logFloor + (ratio - floor) / floor) * perSigma[i]!;
      sum += r * r;
    }
    if (rows.rows > 0) sum += rows.evaluate(ground.values, parameters, ground.layers, priorResiduals);
    return sum < Infinity ? -0.5 * sum : -Infinity;
  };
}
