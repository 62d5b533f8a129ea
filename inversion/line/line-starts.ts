import type { LayeredProblem } from '../fit/layered-problem';
import { minimise } from '../fit/levenberg-marquardt';
import { multiStart, scoutFit } from '../fit/multi-start';
import type { SoundingCurve } from '../fit/starting-models';
import { createRandomStream } from '../random';
import type { LayeredEarth } from '../types';
import { lateralTie, tiedValues, tieResiduals } from './lateral-ties';
import type { LateralScales } from './line-types';

/** A sounding by itself, with what boreholes nearby say of it. */
export interface LoneSounding {
  readonly x: number;
  readonly curve: SoundingCurve;
  readonly layered: LayeredProblem;
  /** ln parameters of a quick fit with one layer fewer */
  readonly fewer: Float64Array | undefined;
}

export interface Candidate {
  readonly free: Float64Array;
  readonly chi2: number;
  /** tied values of the model */
  readonly tied: Float64Array;
}

/** Soundings spread over the line that are searched as thoroughly as a sounding alone. */
const PILOTS = 4;
/** Own models kept of a sounding. */
const OWN = 3;
/** Steps by which a model of another sounding is brought to the readings of this one. */
const ADAPTED = 12;

function describe(
  layered: LayeredProblem,
  { parameters, chi2 }: { parameters: Float64Array; chi2: number },
): Candidate {
  return { free: parameters, chi2, tied: tiedValues(layered.expand(parameters), layered.layers) };
}

function isPilot(s: number, count: number): boolean {
  return Math.floor((s * PILOTS) / count) !== Math.floor(((s - 1) * PILOTS) / count);
}

/** The models that a sounding by itself may have, best first. */
function ownCandidates(
  sounding: LoneSounding,
  pilot: boolean,
  seed: number,
  start?: LayeredEarth,
): Candidate[] {
  const { layered, curve, fewer } = sounding;
  const outcome = pilot
    ? multiStart(layered, curve, createRandomStream(seed), { fewer, userStart: start })
    : scoutFit(layered, curve, fewer);
  return [outcome, ...outcome.others]
    .toSorted((a, b) => a.chi2 - b.chi2)
    .slice(0, OWN)
    .map((end) => describe(layered, end));
}

/** A model of another sounding, fitted to this one from there. */
function adapted({ layered }: LoneSounding, from: LoneSounding, model: Candidate): Candidate {
  const start = layered.startFrom(from.layered.expand(model.free).subarray(0, 2 * layered.layers - 1));
  return describe(layered, minimise(layered.problem, start, { iterations: ADAPTED }));
}

/** One model a sounding, chosen so that Σ own misfit + Σ ties is least over all ways through the candidates (Viterbi 1967). */
export function bestPath(
  soundings: readonly Pick<LoneSounding, 'x'>[],
  choices: readonly Candidate[][],
  layers: number,
  lateral: LateralScales,
): Candidate[] {
  const residual = new Float64Array(2 * layers - 1);
  let costs = choices[0]!.map(({ chi2 }) => chi2);
  const from = choices.slice(1).map((candidates, s) => {
    const tie = lateralTie(soundings[s + 1]!.x - soundings[s]!.x, lateral);
    const ways = candidates.map(({ tied, chi2 }) => {
      const through = choices[s]!.map(
        (before, k) => costs[k]! + tieResiduals(before.tied, tied, layers, tie, residual),
      );
      const best = through.reduce((least, cost, k) => (cost < through[least]! ? k : least), 0);
      return { best, cost: through[best]! + chi2 };
    });
    costs = ways.map(({ cost }) => cost);
    return ways.map(({ best }) => best);
  });
  let k = costs.reduce((least, cost, i) => (cost < costs[least]! ? i : least), 0);
  const path = [k];
  for (const ways of from.toReversed()) path.push((k = ways[k]!));
  return path.reverse().map((choice, s) => choices[s]![choice]!);
}

/**
 * A model for each sounding, as free parameters, in the order of the line: each sounding is fitted by itself, then also from
 * the models of its neighbours and of a few pilots, and among all these the ways along the line compete. A sounding whose
 * own search ended in a wrong valley, or that fits several grounds alike, so takes the one that its neighbours bear out.
 */
export function lineStarts(
  soundings: readonly LoneSounding[],
  lateral: LateralScales,
  seed: number,
  start: LayeredEarth | undefined,
  onSounding: (s: number, chi2: number) => void,
): Float64Array[] {
  const own = soundings.map((sounding, s) => {
    const candidates = ownCandidates(sounding, isPilot(s, soundings.length), seed, start);
    onSounding(s, candidates[0]!.chi2);
    return candidates;
  });
  const pilots = soundings.flatMap((_, s) => (isPilot(s, soundings.length) ? [s] : []));
  const choices = own.map((candidates, s) => {
    const others = new Set([s - 1, s + 1, ...pilots].filter((o) => o !== s && own[o] !== undefined));
    return [...candidates, ...Array.from(others, (o) => adapted(soundings[s]!, soundings[o]!, own[o]![0]!))];
  });
  return bestPath(soundings, choices, soundings[0]!.layered.layers, lateral).map(({ free }) => free);
}
