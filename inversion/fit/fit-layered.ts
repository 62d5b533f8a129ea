import { createForwardOperator } from '../operator/forward-operator';
import { createRandomStream } from '../random';
import type { FitProgress, FitResult, FitSettings, LayerCountFit, Reading } from '../types';
import { MOST_LAYERS, requireFitInput } from './check-fit-input';
import { buildFitResult } from './fit-result';
import { aicc, bic, chooseLayerCount, withinNoise } from './layer-count';
import { createLayeredProblem } from './layered-problem';
import { multiStart, type MultiStartOutcome } from './multi-start';
import { createResidualSystem } from './residual-system';
import { soundingCurve } from './starting-models';

export interface FitOptions {
  /** called after each kept step */
  readonly onProgress?: (progress: FitProgress) => void;
}

interface CountFit {
  readonly layers: number;
  readonly outcome: MultiStartOutcome;
  readonly logParameters: Float64Array;
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
  const operator = createForwardOperator(readings.map((reading) => reading.spread));
  const system = createResidualSystem(operator, readings);
  const curve = soundingCurve(readings);
  const fit = (layers: number): CountFit => {
    const layered = createLayeredProblem(system, layers, settings.bounds, settings.fixed);
    const start = settings.start?.resistivity.length === layers ? settings.start : undefined;
    const outcome = multiStart(layered, curve, createRandomStream(settings.seed), {
      userStart: start,
      onProgress: options.onProgress,
    });
    return { layers, outcome, logParameters: layered.expand(outcome.parameters), held: layered.held };
  };
  const finish = (chosen: CountFit, layerCounts: LayerCountFit[] | null, all: readonly CountFit[]) =>
    buildFitResult({
      readings,
      settings,
      system,
      ...chosen,
      status: chosen.outcome.status,
      layerCounts,
      starts: all.reduce((sum, f) => sum + f.outcome.starts, 0),
      iterations: all.reduce((sum, f) => sum + f.outcome.iterations, 0),
    });
  if (settings.layers !== 'auto') {
    const only = fit(settings.layers);
    return finish(only, null, [only]);
  }
  const most = Math.min(MOST_LAYERS, Math.max(1, Math.floor((readings.length + 1) / 2)));
  const fits = Array.from({ length: most }, (_, i) => fit(i + 1));
  const rows = fits.map((one) => describeCount(one, readings.length));
  const index = chooseLayerCount(rows);
  return finish(
    fits[index]!,
    rows.map((row, i) => ({ ...row, chosen: i === index })),
    fits,
  );
}

function describeCount({ layers, outcome, logParameters }: CountFit, readings: number): LayerCountFit {
  const parameters = 2 * layers - 1;
  const values = Array.from(logParameters, Math.exp);
  return {
    layers,
    status: outcome.status,
    chi2PerReading: outcome.chi2 / readings,
    bic: bic(outcome.chi2, parameters, readings),
    aicc: aicc(outcome.chi2, parameters, readings),
    withinNoise: withinNoise(outcome.chi2, parameters, readings),
    chosen: false,
    earth: { resistivity: values.slice(0, layers), thickness: values.slice(layers) },
  };
}
