import { LEAST_EFFECTIVE, R_HAT_LIMIT, type PosteriorDraws } from './draw-posterior';
import type { EnsembleStatus } from './ensemble-types';

type Diagnosis = Pick<PosteriorDraws, 'rHat' | 'effectiveSampleSize'>;

export function statusOf({ rHat, effectiveSampleSize }: Diagnosis): EnsembleStatus {
  return rHat < R_HAT_LIMIT && effectiveSampleSize >= LEAST_EFFECTIVE ? 'finished' : 'chain-too-short';
}

/** The status in a sentence. */
export function describeStatus(diagnosis: Diagnosis): string {
  const worth = `R-hat is ${diagnosis.rHat.toFixed(3)} and the samples are worth ${Math.floor(diagnosis.effectiveSampleSize)} independent ones`;
  return statusOf(diagnosis) === 'finished'
    ? `The chains agree: ${worth}.`
    : `The chains are too short to trust: ${worth}; below ${R_HAT_LIMIT} and at least ${LEAST_EFFECTIVE} are needed. Ask for more samples.`;
}
