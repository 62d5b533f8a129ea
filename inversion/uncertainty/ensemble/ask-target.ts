import { createForwardOperator, type ForwardOperator } from '../../operator/forward-operator';
import type { Reading } from '../../types';
import { drawPosterior, type DrawOptions, type PosteriorDraws } from './draw-posterior';
import type { EnsemblePrior, SampleSettings, TargetAnswer, TargetBed, TargetChance } from './ensemble-types';
import { narrowPrior, widePrior } from './prior-range';
import { modelUnder } from './sampled-model';
import { chanceBefore, countBed, plainPrior, weighPriors } from './target-question';

/** Samples for the answers under the narrow and the wide prior; of a stated count their error is below 0.02. */
const SIDE_DRAWS = 6000;

/**
 * The target question under the stated prior, whose samples are there, and under the narrow and the wide one, each from samples
 * of its own. What is known of single layers beforehand counts before the readings too.
 */
export function askTarget(
  target: TargetBed,
  settings: SampleSettings,
  operator: ForwardOperator,
  readings: readonly Reading[],
  drawn: PosteriorDraws,
  report: DrawOptions['report'],
): TargetAnswer {
  const { prior, seed, draws } = settings;
  const sampled = { draws: Math.min(draws, SIDE_DRAWS), seed, report };
  const before = (under: EnsemblePrior): number => {
    const model = modelUnder(under, settings, createForwardOperator([]), []);
    return (settings.priors ?? []).length === 0
      ? chanceBefore(model.space, target, seed)
      : countBed(model.space, drawPosterior(model, sampled), target).probability;
  };
  const chance = (under: EnsemblePrior, known?: PosteriorDraws): TargetChance => {
    const model = modelUnder(under, settings, operator, readings);
    const counted = countBed(model.space, known ?? drawPosterior(model, sampled), target);
    return { ...counted, before: before(under), prior: plainPrior(under) };
  };
  return weighPriors(
    chance(prior, drawn),
    chance(settings.narrow ?? narrowPrior(prior, readings)),
    chance(settings.wide ?? widePrior(prior)),
  );
}
