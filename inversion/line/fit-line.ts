import { ENGINE_VERSION } from '../engine-version';
import { earthOf } from '../fit/allowed-models';
import { MOST_LAYERS } from '../fit/check-fit-input';
import { bic, chooseLayerCount, misfitProbability, withinNoise } from '../fit/layer-count';
import type { FitOptions } from '../fit/fit-layered';
import { requireLineInput } from './check-line-input';
import { covarianceRoots, placeCovariance } from './line-doubt';
import { placesOf, type LinePlace } from './line-layout';
import { lineariseLine } from './line-problem';
import { soundingCount, soundingResult, type SoundingFit } from './line-result';
import { searchLine, type Scouts } from './line-search';
import type { LineCountFit, LineFitResult, LineSettings, LineSounding } from './line-types';
import { lineWarnings, type BoredPlace } from './line-warnings';
import type { LineOutcome } from './minimise-line';

interface LineCount {
  readonly row: LineCountFit;
  readonly outcome: LineOutcome;
  readonly iterations: number;
  /** in the order of the line */
  readonly fits: readonly SoundingFit[];
  readonly bored: readonly BoredPlace[];
}

/** Trace of J P Jᵀ over the rows of the readings: how many parameters they settle. */
function effectiveParameters(
  fit: Omit<SoundingFit, 'effective' | 'parameters' | 'readingFit'>,
  at: Float64Array,
): number {
  const { layered, root, sounding } = fit;
  const n = at.length;
  const jacobian = new Float64Array(layered.problem.residuals * n);
  layered.problem.linearise(at, new Float64Array(layered.problem.residuals), jacobian);
  let trace = 0;
  for (let i = 0; i < sounding.readings.length; i++)
    for (let r = 0; r < n; r++) {
      let sum = 0;
      for (let j = r; j < n; j++) sum += root[r * n + j]! * jacobian[i * n + j]!;
      trace += sum * sum;
    }
  return trace;
}

function fitCount(
  places: readonly LinePlace[],
  layers: number,
  settings: LineSettings,
  scouts: Scouts,
  options: FitOptions,
): LineCount {
  const { problem, outcome, iterations } = searchLine(places, layers, settings, {
    scouts,
    onProgress: options.onProgress,
  });
  const roots = covarianceRoots(lineariseLine(problem, outcome.state));
  const fits = places.flatMap(({ sounding }, s): SoundingFit[] => {
    if (!sounding) return [];
    const layered = problem.nodes[s]!;
    const parameters = layered.expand(outcome.state[s]!);
    const fit = { sounding, layered, root: roots[s]! };
    return [
      {
        ...fit,
        parameters,
        readingFit: sounding.system.describe(parameters, layers),
        effective: effectiveParameters(fit, outcome.state[s]!),
      },
    ];
  });
  const sum = (of: (fit: SoundingFit) => number) => fits.reduce((total, fit) => total + of(fit), 0);
  const chi2 = sum(({ readingFit }) => readingFit.chi2);
  const readings = sum(({ sounding }) => sounding.readings.length);
  const effective = sum((fit) => fit.effective);
  const row = {
    layers,
    status: outcome.status,
    chi2PerReading: chi2 / readings,
    effectiveParameters: effective,
    bic: bic(chi2, effective, readings),
    withinNoise: withinNoise(chi2, effective, readings),
    chosen: false,
  };
  const bored = places.flatMap((place, s): BoredPlace[] => {
    if (place.sounding) return [];
    const { held, expand } = problem.nodes[s]!;
    const earth = earthOf(expand(outcome.state[s]!), layers, settings.fixed);
    return [{ borehole: place.borehole, earth, covariance: placeCovariance(roots[s]!, held) }];
  });
  return { row, outcome, iterations, fits, bored };
}

/** The counts to try: from the fewest that has every boundary a borehole saw to the most that some sounding could bear. */
function countsOf(soundings: readonly LineSounding[], { layers, boreholes }: LineSettings): number[] {
  if (layers !== 'auto') return [layers];
  const readings = soundings.reduce((most, sounding) => Math.max(most, sounding.readings.length), 0);
  const seen = boreholes.flatMap(({ contacts }) => contacts.map(({ boundary }) => boundary + 2));
  const fewest = seen.reduce((most, count) => Math.max(most, count), 1);
  const most = Math.max(fewest, Math.min(MOST_LAYERS, Math.max(1, Math.floor((readings + 1) / 2))));
  return Array.from({ length: most - fewest + 1 }, (_, i) => fewest + i);
}

/** Fits counts in turn; the first within the noise ends it, since fewer is preferred. */
function fitCounts(counts: readonly number[], fit: (layers: number) => LineCount): LineCount[] {
  const tried: LineCount[] = [];
  for (const layers of counts) {
    const count = fit(layers);
    tried.push(count);
    if (count.row.withinNoise === true) break;
  }
  return tried;
}

/**
 * Fits all soundings of a line at once with the same number of layers, each bed tied to the same bed at the next place by the
 * change that is expected over the distance, boreholes taken in as places whose depths are known.
 *
 * Least is Σ readings ((ln predicted − ln observed)/σ)² + Σ ties (Δ ln ρ/σ_ρ(d))² + (Δ ln D/σ_D(d))² + contacts and priors, with
 * σ(d) = scale √(d/100 m). Work and memory are linear in the number of soundings. With `layers: 'auto'` counts are tried from the
 * fewest until the whole line is within the noise; else the least BIC of all is taken. Results are in the order of `soundings`.
 * Throws `InversionError` with a path for input that cannot be used. Source: Auken & Christiansen 2004 (from memory).
 */
export function fitLine(
  soundings: readonly LineSounding[],
  settings: LineSettings,
  options: FitOptions = {},
): LineFitResult {
  requireLineInput(soundings, settings);
  const places = placesOf(soundings, settings, options.operators);
  const scouts: Scouts = new Map(places.flatMap(({ sounding }) => (sounding ? [[sounding, []]] : [])));
  const tried = fitCounts(countsOf(soundings, settings), (layers) =>
    fitCount(places, layers, settings, scouts, options),
  );
  const auto = settings.layers === 'auto';
  const index = chooseLayerCount(tried.map(({ row }) => row));
  const { row, outcome, fits } = tried[index]!;
  const marked = <T>(rows: readonly T[]): (T & { chosen: boolean })[] =>
    rows.map((one, i) => ({ ...one, chosen: i === index }));
  const readings = soundings.reduce((sum, sounding) => sum + sounding.readings.length, 0);
  const probability = misfitProbability(row.chi2PerReading * readings, row.effectiveParameters, readings);
  const iterations = tried.reduce((sum, count) => sum + count.iterations, 0);
  const results = fits.map((fit, k) =>
    soundingResult(fit, {
      settings,
      status: outcome.status,
      layerCounts: auto
        ? marked(tried.map((count) => soundingCount(count.fits[k]!, count.outcome.status)))
        : null,
      starts: soundings.length,
      iterations,
      damping: outcome.damping,
    }),
  );
  const inOrder = fits.map(({ sounding }, k) => ({ index: sounding.index, result: results[k]! }));
  return {
    status: outcome.status,
    layers: row.layers,
    chi2PerReading: row.chi2PerReading,
    effectiveParameters: row.effectiveParameters,
    misfitProbability: probability,
    soundings: inOrder.sort((a, b) => a.index - b.index).map(({ result }) => result),
    layerCounts: auto ? marked(tried.map((count) => count.row)) : null,
    warnings: lineWarnings(places, tried[index]!.bored, probability),
    iterations,
    engine: ENGINE_VERSION,
  };
}
