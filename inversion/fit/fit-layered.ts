import { createForwardOperator } from '../operator/forward-operator';
import type { OperatorCache } from '../operator/operator-cache';
import { createRandomStream } from '../random';
import type { FitProgress, FitResult, FitSettings, LayerCountFit, Reading } from '../types';
import { earthOf, type FittedModel } from './allowed-models';
import { MOST_LAYERS, requireFitInput } from './check-fit-input';
import { buildFitResult } from './fit-result';
import { aicc, bic, chooseLayerCount, countDoubt, withinNoise } from './layer-count';
import { createLayeredProblem } from './layered-problem';
import { multiStart, scoutFit, type MultiStartOutcome } from './multi-start';
import { createResidualSystem, type ResidualSystem } from './residual-system';
import { soundingCurve, type SoundingCurve } from './starting-models';

export interface FitOptions {
  /** called after each kept step */
  readonly onProgress?: (progress: FitProgress) => void;
  /** operators kept from one fit to the next; it changes the time, never the result */
  readonly operators?: OperatorCache;
}

interface CountFit {
  readonly layers: number;
  readonly outcome: MultiStartOutcome;
  readonly logParameters: Float64Array;
  readonly others: readonly FittedModel[];
  readonly held: readonly boolean[];
}

/**
 * Fits a layered earth to the readings of one sounding by bounded Levenberg–Marquardt from several seeded starts.
 *
 * With `layers: 'auto'` counts of 1 … 8 (as far as 2N − 1 ≤ readings) are fitted and returned, and the fewest whose χ² is
 * below its 95 % point is chosen, else the least BIC. The same readings, settings and engine give the same bits.
 * Throws `InversionError` with a path for input that cannot be used; inputs are not changed.
 */
export function fitLayered(
  readings: readonly Reading[],
  settings: FitSettings,
  options: FitOptions = {},
): FitResult {
  requireFitInput(readings, settings);
  const spreads = readings.map((reading) => reading.spread);
  const operator = options.operators?.operatorFor(spreads) ?? createForwardOperator(spreads);
  const system = createResidualSystem(operator, readings);
  const curve = soundingCurve(readings);
  const most =
    settings.layers === 'auto'
      ? Math.min(MOST_LAYERS, Math.max(1, Math.floor((readings.length + 1) / 2)))
      : settings.layers;
  const scouts = scoutModels(system, curve, settings, most - 1);
  const fits: CountFit[] = [];
  for (let layers = settings.layers === 'auto' ? 1 : most; layers <= most; layers++) {
    const layered = createLayeredProblem(system, layers, settings.bounds, settings.fixed);
    const outcome = multiStart(layered, curve, createRandomStream(settings.seed), {
      userStart: settings.start?.resistivity.length === layers ? settings.start : undefined,
      fewer: scouts[layers - 2],
      onProgress: options.onProgress,
    });
    fits.push({
      layers,
      outcome,
      logParameters: layered.expand(outcome.parameters),
      others: outcome.others.map(({ parameters, chi2 }) => ({
        logParameters: layered.expand(parameters),
        chi2,
      })),
      held: layered.held,
    });
  }
  const rows = fits.map((fit) => describeCount(fit, readings.length));
  const index = settings.layers === 'auto' ? chooseLayerCount(rows) : 0;
  const chosen = fits[index]!;
  const result = buildFitResult({
    readings,
    settings,
    system,
    ...chosen,
    status: chosen.outcome.status,
    layerCounts: settings.layers === 'auto' ? rows.map((row, i) => ({ ...row, chosen: i === index })) : null,
    starts: fits.reduce((sum, fit) => sum + fit.outcome.starts, 0),
    iterations: fits.reduce((sum, fit) => sum + fit.outcome.iterations, 0),
  });
  return settings.layers === 'auto'
    ? { ...result, warnings: [...result.warnings, ...countDoubt(rows, index)] }
    : result;
}

/** ln parameters of quick fits with 1 … `most` layers, each grown from the one before; they start the shown fits. */
function scoutModels(
  system: ResidualSystem,
  curve: SoundingCurve,
  settings: FitSettings,
  most: number,
): Float64Array[] {
  const models: Float64Array[] = [];
  for (let layers = 1; layers <= most; layers++) {
    const layered = createLayeredProblem(system, layers, settings.bounds, []);
    models.push(layered.expand(scoutFit(layered, curve, models.at(-1)).parameters));
  }
  return models;
}

function describeCount({ layers, outcome, logParameters }: CountFit, readings: number): LayerCountFit {
  const parameters = 2 * layers - 1;
  return {
    layers,
    status: outcome.status,
    chi2PerReading: outcome.chi2 / readings,
    bic: bic(outcome.chi2, parameters, readings),
    aicc: aicc(outcome.chi2, parameters, readings),
    withinNoise: withinNoise(outcome.chi2, parameters, readings),
    chosen: false,
    earth: earthOf(logParameters, []),
  };
}
