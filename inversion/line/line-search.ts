import { scoutFit } from '../fit/multi-start';
import type { FitProgress } from '../types';
import { logEarthOf, tiedValues } from './lateral-ties';
import { lineProblem, loneProblem, type LinePlace, type PlacedSounding } from './line-layout';
import type { LineProblem, LineState } from './line-problem';
import { repairLine } from './line-repair';
import { lineStarts, type LoneSounding } from './line-starts';
import type { LineSettings } from './line-types';
import { minimiseLine, type LineOutcome } from './minimise-line';

/** Rounds in which the models of neighbours are tried at each place of a fitted line. */
const REPAIRS = 3;

/** Quick fits of each sounding by itself, each grown from the one before: entry N − 1 has N layers. */
export type Scouts = ReadonlyMap<PlacedSounding, Float64Array[]>;

export interface SearchOptions {
  readonly scouts: Scouts;
  readonly onProgress?: ((progress: FitProgress) => void) | undefined;
}

/** The quick fit of a sounding with `layers` layers; those that are missing are made. */
function scout(
  known: Float64Array[],
  sounding: PlacedSounding,
  at: (count: number) => LoneSounding['layered'],
  layers: number,
) {
  for (let count = known.length + 1; count <= layers; count++) {
    const layered = at(count);
    const { parameters } = scoutFit(layered, sounding.curve, known.at(-1));
    known.push(layered.expand(parameters).slice(0, 2 * count - 1));
  }
  return known[layers - 1];
}

/** ln parameters at a place between two others: ln ρ and ln D as shares of the way; at an end of the line those of the one other. */
function between(
  before: Float64Array | undefined,
  after: Float64Array | undefined,
  share: number,
  layers: number,
): Float64Array {
  const [left, right] = [before ?? after!, after ?? before!].map((earth) => tiedValues(earth, layers));
  return logEarthOf(
    left!.map((value, i) => value + share * (right![i]! - value)),
    layers,
  );
}

/** Models of all places from those of the soundings: a borehole starts between its neighbours. */
function withBoreholes(
  places: readonly LinePlace[],
  problem: LineProblem,
  earths: readonly (Float64Array | undefined)[],
): LineState {
  const { nodes, layers } = problem;
  return nodes.map((node, s) => {
    const own = earths[s];
    if (own) return node.restrict(own);
    const left = earths.findLastIndex((earth, o) => o < s && earth !== undefined);
    const right = earths.findIndex((earth, o) => o > s && earth !== undefined);
    const gap = (places[right]?.x ?? 0) - (places[left]?.x ?? 0);
    const share = left >= 0 && right >= 0 && gap > 0 ? (places[s]!.x - places[left]!.x) / gap : 0;
    return node.startFrom(between(earths[left], earths[right], share, layers));
  });
}

/** Fits a line with one count: starts of the soundings, the whole line at once, and repairs until none helps. */
export function searchLine(
  places: readonly LinePlace[],
  layers: number,
  settings: LineSettings,
  { scouts, onProgress }: SearchOptions,
): { problem: LineProblem; outcome: LineOutcome; iterations: number } {
  const problem = lineProblem(places, layers, settings);
  const at = places.flatMap((place, s) => (place.sounding ? [s] : []));
  const lone = at.map((s): LoneSounding => {
    const sounding = places[s]!.sounding!;
    const free = { ...settings, fixed: [], priors: [] };
    const fewer = scout(
      scouts.get(sounding)!,
      sounding,
      (count) => loneProblem(places, s, count, free),
      layers - 1,
    );
    return { x: sounding.x, curve: sounding.curve, layered: loneProblem(places, s, layers, settings), fewer };
  });
  const report = (start: number, iteration: number, chi2: number, readings: number) =>
    onProgress?.({ layers, start, starts: at.length, iteration, chi2PerReading: chi2 / readings });
  const start = settings.start?.resistivity.length === layers ? settings.start : undefined;
  const starts = lineStarts(lone, settings.lateral, settings.seed, start, (s, chi2) =>
    report(s + 1, 0, chi2, places[at[s]!]!.sounding!.readings.length),
  );
  const earths: (Float64Array | undefined)[] = places.map(() => undefined);
  at.forEach((s, k) => (earths[s] = lone[k]!.layered.expand(starts[k]!)));
  const readings = places.reduce((sum, { sounding }) => sum + (sounding?.readings.length ?? 0), 0);
  const run = (from: LineState) =>
    minimiseLine(problem, from, (iteration, objective) => report(at.length, iteration, objective, readings));
  let outcome = run(withBoreholes(places, problem, earths));
  let iterations = outcome.iterations;
  for (let round = 0; round < REPAIRS; round++) {
    const repaired = repairLine(problem, outcome.state);
    if (!repaired) break;
    outcome = run(repaired);
    iterations += outcome.iterations;
  }
  return { problem, outcome, iterations };
}
