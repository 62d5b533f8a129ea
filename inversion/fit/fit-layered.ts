import { createForwardOperator } from '../operator/forward-operator';
import type { OperatorCache } from '../operator/operator-cache';
import { createRandomStream } from '../random';
import type { FitProgress, FitResult, FitSettings, LayerCountFit, LayeredEarth, Reading } from '../types';
import { earthOf, type FittedModel } from './allowed-models';
import { MOST_LAYERS, requireFitInput } from './check-fit-input';
import { buildFitResult } from './fit-result';
import { aicc, bic, chooseLayerCount, countDoubt, withinNoise } from './layer-count';
import { createLayeredProblem, type LayeredProblem } from './layered-problem';
import { moderateModel } from './moderate-model';
import { multiStart, scoutFit, type MultiStartOutcome } from './multi-start';
import { createResidualSystem, type ReadingFit, type ResidualSystem } from './residual-system';
import {
  logEarth,
  moderateStart,
  sameWithOneMore,
  soundingCurve,
  type SoundingCurve,
} from './starting-models';

export interface FitOptions {
  /** called after each kept step */
  readonly onProgress?: (progress: FitProgress) => void;
  /** operators kept from one fit to the next; it changes the time, never the result */
  readonly operators?: OperatorCache;
}

interface CountFit {
  readonly layered: LayeredProblem;
  readonly quick: LayeredProblem;
  readonly outcome: MultiStartOutcome;
  readonly best: FittedModel;
  readonly others: readonly FittedModel[];
  readonly readingFit: ReadingFit;
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
  const system = createResidualSystem(operator, readings, settings);
  const curve = soundingCurve(readings);
  const most =
    settings.layers === 'auto'
      ? Math.min(MOST_LAYERS, Math.max(1, Math.floor((readings.length + 1) / 2)))
      : settings.layers;
  const quickSystem = createResidualSystem(operator.quick(), readings, settings);
  // what is known beforehand speaks of the stated count alone
  const bare = settings.priors.length > 0 ? { ...settings, priors: [] } : null;
  const scouts = scoutModels(
    bare ? createResidualSystem(operator, readings, bare) : system,
    bare ? createResidualSystem(operator.quick(), readings, bare) : quickSystem,
    curve,
    settings,
    most - 1,
  );
  const fits: CountFit[] = [];
  for (let layers = settings.layers === 'auto' ? 1 : most; layers <= most; layers++) {
    const layered = createLayeredProblem(system, layers, settings, settings.branchShiftSigma);
    const quick = createLayeredProblem(quickSystem, layers, settings, settings.branchShiftSigma);
    const outcome = multiStart(layered, curve, createRandomStream(settings.seed), {
      userStart: settings.start?.resistivity.length === layers ? settings.start : undefined,
      quick,
      fewer: scouts[layers - 2]?.logEarth,
      below: fits.at(-1)?.best.parameters,
      beyondNoise: beyondNoise(fits),
      onProgress: options.onProgress,
    });
    const fitted = ({ parameters, chi2 }: FittedModel): FittedModel => ({
      parameters: layered.expand(parameters),
      chi2,
    });
    const best = fitted(outcome);
    fits.push({
      layered,
      quick,
      outcome,
      best,
      others: outcome.others.map(fitted),
      readingFit: system.describe(best.parameters, layers),
    });
  }
  const ladder = fits.map((fit) => describeCount(fit, readings.length));
  const index = settings.layers === 'auto' ? chooseLayerCount(ladder) : 0;
  const chosen = moderated(fits[index]!, system, curve, settings.start);
  const rows = ladder.with(index, describeCount(chosen, readings.length));
  const result = buildFitResult({
    readings,
    settings,
    system,
    ...chosen,
    split: splitModels(chosen, system, curve, scouts[chosen.layered.layers - 2]?.logEarth),
    status: chosen.outcome.status,
    damping: chosen.outcome.damping,
    layerCounts: settings.layers === 'auto' ? rows.map((row, i) => ({ ...row, chosen: i === index })) : null,
    oneFewer: settings.layers === 'auto' ? null : (scouts.at(-1)?.fit ?? null),
    starts: fits.reduce((sum, fit) => sum + fit.outcome.starts, 0),
    iterations: fits.reduce((sum, fit) => sum + fit.outcome.iterations, 0),
  });
  return settings.layers === 'auto'
    ? { ...result, warnings: [...result.warnings, ...countDoubt(rows, index)] }
    : result;
}

/** True where a count before the last is within the noise already. */
function beyondNoise(fits: readonly CountFit[]): boolean {
  return fits.slice(0, -1).some((fit) => describeCount(fit, fit.readingFit.residuals.length).withinNoise);
}

/** The same fit with a moderate model for its best, which then stands among the others. */
function moderated(
  fit: CountFit,
  system: ResidualSystem,
  curve: SoundingCurve,
  start: LayeredEarth | undefined,
): CountFit {
  const { layered, quick, outcome, best, others } = fit;
  const { layers } = layered;
  const centre = start?.resistivity.length === layers ? logEarth(start) : moderateStart(curve, layers);
  const found = moderateModel(layered, quick, outcome, centre);
  if (found.parameters === outcome.parameters) return fit;
  const parameters = layered.expand(found.parameters);
  return {
    ...fit,
    best: { parameters, chi2: found.chi2 },
    others: [best, ...others],
    readingFit: system.describe(parameters, layers),
  };
}

/** The ground with one layer fewer, each of its layers split in two alike: grounds of this count too, where it fits as well. */
function splitModels(
  { layered }: CountFit,
  system: ResidualSystem,
  curve: SoundingCurve,
  fewer: Float64Array | undefined,
): FittedModel[] {
  if (!fewer) return [];
  const residual = new Float64Array(system.rows);
  return sameWithOneMore(fewer, curve).map((model) => {
    const parameters = layered.expand(layered.startFrom(model));
    return { parameters, chi2: system.evaluate(parameters, layered.layers, residual) };
  });
}

/** A quick fit that starts the next count, and how well it does: as it is short, the best of its count can only be better. */
interface Scout {
  readonly logEarth: Float64Array;
  readonly fit: NonNullable<FitResult['oneFewer']>;
}

/** Quick fits with 1 … `most` layers, each grown from the one before; they start the shown fits. */
function scoutModels(
  system: ResidualSystem,
  quick: ResidualSystem,
  curve: SoundingCurve,
  settings: FitSettings,
  most: number,
): Scout[] {
  const scouts: Scout[] = [];
  for (let layers = 1; layers <= most; layers++) {
    const layered = createLayeredProblem(
      quick,
      layers,
      { ...settings, fixed: [], priors: [] },
      settings.branchShiftSigma,
    );
    const { parameters } = scoutFit(layered, curve, scouts.at(-1)?.logEarth);
    const all = layered.expand(parameters);
    const { chi2 } = system.describe(all, layers);
    scouts.push({
      logEarth: all.subarray(0, 2 * layers - 1),
      fit: {
        layers,
        chi2PerReading: chi2 / system.readings,
        withinNoise: withinNoise(chi2, all.length, system.readings),
      },
    });
  }
  return scouts;
}

function describeCount({ layered, outcome, best, readingFit }: CountFit, readings: number): LayerCountFit {
  const { layers, held } = layered;
  const { chi2 } = readingFit;
  const parameters = held.filter((isHeld) => !isHeld).length;
  return {
    layers,
    status: outcome.status,
    chi2PerReading: chi2 / readings,
    bic: bic(chi2, parameters, readings),
    aicc: aicc(chi2, parameters, readings),
    withinNoise: withinNoise(chi2, parameters, readings),
    chosen: false,
    earth: earthOf(best.parameters, layers),
  };
}
