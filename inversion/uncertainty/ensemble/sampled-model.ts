import type { ForwardOperator } from '../../operator/forward-operator';
import type { Reading } from '../../types';
import type { EnsemblePrior, SampleSettings } from './ensemble-types';
import { statedCountSpace, unknownCountSpace } from './ground-space';
import { createLogLikelihood } from './likelihood';
import type { Model } from './metropolis';

/** What is sampled: the readings, and whatever is known beforehand, under one prior. */
export function modelUnder(
  prior: EnsemblePrior,
  { layers, priors = [] }: SampleSettings,
  operator: ForwardOperator,
  readings: readonly Reading[],
): Model {
  const space = layers === 'unknown' ? unknownCountSpace(prior) : statedCountSpace(prior, layers);
  return { space, logLikelihood: createLogLikelihood(space, operator, readings, priors) };
}
