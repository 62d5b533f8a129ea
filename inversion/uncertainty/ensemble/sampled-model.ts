import type { ForwardOperator } from '../../operator/forward-operator';
import type { Reading } from '../../types';
import type { EnsemblePrior, SampleSettings } from './ensemble-types';
import { statedCountSpace, unknownCountSpace } from './ground-space';
import { createLogLikelihood } from './likelihood';
import type { Model } from './metropolis';

/** Readings with smaller errors than this are no work for the quick operator, which is within 1e-5 at the median. */
const LEAST_QUICK_ERROR = 0.003;

/** What is sampled: the readings, and whatever is known beforehand, under one prior. */
export function modelUnder(
  prior: EnsemblePrior,
  { layers, priors = [] }: SampleSettings,
  operator: ForwardOperator,
  readings: readonly Reading[],
): Model {
  const space = layers === 'unknown' ? unknownCountSpace(prior) : statedCountSpace(prior, layers);
  const exact = createLogLikelihood(space, operator, readings, priors);
  if (!readings.every(({ relativeError }) => relativeError >= LEAST_QUICK_ERROR))
    return { space, logLikelihood: exact };
  return {
    space,
    logLikelihood: createLogLikelihood(space, operator.quick(), readings, priors),
    logExact: exact,
  };
}
