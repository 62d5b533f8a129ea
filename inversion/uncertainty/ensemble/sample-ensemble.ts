import { ENGINE_VERSION } from '../../engine-version';
import { createForwardOperator } from '../../operator/forward-operator';
import type { OperatorCache } from '../../operator/operator-cache';
import type { Reading } from '../../types';
import { askTarget } from './ask-target';
import { requireSampleInput } from './check-sample-input';
import { depthProfile } from './depth-profile';
import { drawPosterior, type PosteriorDraws } from './draw-posterior';
import type { EnsembleResult, Quantiles, SampleSettings } from './ensemble-types';
import { describeStatus, statusOf } from './ensemble-status';
import { MOST_COUNT } from './ground-space';
import { joinPopulations } from './population';
import { quantilesOf } from './sample-quantiles';
import { sampledEarths, thinnedEarths, type SampledEarths } from './sampled-earths';
import { modelUnder } from './sampled-model';
import { reporter, type SampleOptions } from './stop-check';

const MOST_EARTHS = 500;

/**
 * Samples the grounds that explain the readings of one sounding, for a stated number of layers or with the number unknown.
 *
 * Posterior ∝ prior × exp(−½ Σ ((ln predicted − ln observed)/σ)²); prior uniform in lnρ and ln h (stated count) or in lnρ, ln depth of
 * the boundaries and the count 1 … 8. Accuracy: quantiles against independent population runs (`tests/inversion/uncertainty/ensemble`),
 * ranks of the truth and what target answers come true (`npm run calibrate`). The same readings, settings and engine give the
 * same bits. Throws `InversionError` with a path for input that cannot be used.
 */
export function sampleEnsemble(
  readings: readonly Reading[],
  settings: SampleSettings,
  options: SampleOptions & { readonly operators?: OperatorCache } = {},
): EnsembleResult {
  requireSampleInput(readings, settings);
  const spreads = readings.map((reading) => reading.spread);
  const operator = options.operators?.operatorFor(spreads) ?? createForwardOperator(spreads);
  const report = reporter(options);
  const model = modelUnder(settings.prior, settings, operator, readings);
  const drawn = drawPosterior(model, { draws: settings.draws, seed: settings.seed, report });
  const earths = sampledEarths(model.space, joinPopulations(drawn.chains));
  const stated = settings.layers !== 'unknown';
  return {
    status: statusOf(drawn),
    message: describeStatus(drawn),
    ...acceptanceOf(drawn),
    rHat: drawn.rHat,
    effectiveSampleSize: drawn.effectiveSampleSize,
    draws: earths.size,
    thinning: drawn.thinning,
    quantiles: stated ? layerQuantiles(earths) : null,
    layerCountProbability: stated ? null : countProbability(earths),
    ...depthProfile(model.space, earths),
    earths: thinnedEarths(earths, MOST_EARTHS),
    target: settings.target ? askTarget(settings.target, settings, operator, readings, drawn, report) : null,
    engine: ENGINE_VERSION,
  };
}

function acceptanceOf({ counts }: PosteriorDraws): Pick<EnsembleResult, 'acceptance' | 'acceptanceByMove'> {
  const sum = (key: 'tried' | 'accepted') => counts.reduce((total, count) => total + count[key], 0);
  return {
    acceptance: sum('accepted') / sum('tried'),
    acceptanceByMove: counts.map(({ move, tried, accepted }) => ({
      move,
      tried,
      acceptance: tried === 0 ? 0 : accepted / tried,
    })),
  };
}

/** Quantiles of ρ and h of each layer, and of the depths of the boundaries, of samples that all have one count. */
function layerQuantiles({ size, stride, layers, parameters }: SampledEarths): EnsembleResult['quantiles'] {
  const count = layers[0]!;
  const column = new Float64Array(size);
  const depth = new Float64Array(size);
  const read = (j: number): Quantiles => {
    for (let i = 0; i < size; i++) column[i] = parameters[i * stride + j]!;
    return quantilesOf(column);
  };
  const resistivity = Array.from({ length: count }, (_, j) => read(j));
  const bases = Array.from({ length: count - 1 }, (_, j) => {
    const thickness = read(count + j);
    for (let i = 0; i < size; i++) depth[i]! += column[i]!;
    return { thickness, depth: quantilesOf(depth) };
  });
  return {
    resistivity,
    thickness: bases.map((base) => base.thickness),
    depth: bases.map((base) => base.depth),
  };
}

function countProbability({ size, layers }: SampledEarths): number[] {
  const counts = Array.from<number>({ length: MOST_COUNT }).fill(0);
  for (const count of layers) counts[count - 1]!++;
  return counts.map((count) => count / size);
}
