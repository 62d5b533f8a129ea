import type { LeastSquaresProblem } from '../fit/levenberg-marquardt';
import { createLimitStepper, emptyPoint, type LimitStep, type Linearised } from './constrained-step';

/** How far a quantity goes on one side while the misfit stays within a limit. */
export interface ProfileEnd {
  /** the furthest point found, in free parameters */
  readonly parameters: Float64Array;
  /** s · ln quantity there, s = ±1 the side */
  readonly reach: number;
  readonly chi2: number;
  /** true when the search ended before the misfit did: at bounds, or with its steps used up */
  readonly unfinished: boolean;
  /** true when the first step from the foot of the valley led there */
  readonly straight: boolean;
  /** with which a search further on may begin */
  readonly damping: number;
}

/** s · ln quantity and its gradient on the free parameters, which is written over by the next call. */
export interface DirectedQuantity {
  readonly value: (parameters: ArrayLike<number>) => number;
  readonly gradient: (parameters: ArrayLike<number>) => Float64Array;
}

/** What a search knows beforehand. */
export interface SearchHint {
  /** a point under the limit to go on from, such as an end at a lower limit */
  readonly from?: Float64Array | undefined;
  /** the damping with which a search there ended */
  readonly damping?: number | undefined;
  /** true for a few steps alone, after which the tangent tells the rest */
  readonly short?: boolean | undefined;
}

const STEPS = 40;
const SHORT_STEPS = 4;
/** A point stands within the limit when its χ² is above it by no more than this share of its rise. */
const CLOSE = 0.03;
/** The end is found at a point whose χ² is within this share of its rise of the limit … */
const NEAR = 0.1;
/** … when the step from there to the limit would change the reach by less than this share; it is then added. */
const GAIN = 0.02;
/** A reach shorter than this, in ln, counts as this much in the line above. */
const SHORTEST = 0.01;
/**
 * A move of 1 in ln counts for this much χ² at first, so that a step leaves out what gains little along a flat valley. It falls
 * with every second step in a row that stays within the limit, and rises with how far one is outside.
 */
const DAMPING = 1;
const FASTER = 4;
const SLOWER = 5;
/** The damping is multiplied by this × √(χ² above the limit per rise), from `SLOWER` up to `MOST_SLOWER`. */
const PER_OVERSHOOT = 3;
const MOST_SLOWER = 50;
const STIFFEST = 1e6;
/** Steps in a row outside of the limit before the search goes back. */
const RETURNS = 2;
/** Up to this much outside, per rise, a step counts as a calm one. */
const CALM = 0.3;
/** The tangent at a foot is trusted to within this factor. */
const TRUST = 1.5;

/** Finds ends of profile intervals of one problem, each from the foot of a valley or from a point found before. */
export interface Profiler {
  /** the misfit about a model at the foot of its valley, to be shared by all quantities */
  readonly foot: (parameters: Float64Array) => Linearised;
  /** s · ln quantity that a search from this foot may come to, by its tangent and half as much again */
  readonly promise: (foot: Linearised, quantity: DirectedQuantity, limit: number) => number;
  readonly end: (
    foot: Linearised,
    quantity: DirectedQuantity,
    limit: number,
    hint?: SearchHint,
  ) => ProfileEnd;
}

/** Factor of the damping after a step that left the limit by `over` rises. */
const stiffening = (over: number): number =>
  over < Infinity ? Math.min(MOST_SLOWER, Math.max(SLOWER, PER_OVERSHOOT * Math.sqrt(over))) : MOST_SLOWER;

/**
 * The furthest value of one quantity with χ² ≤ `limit`: an end of its profile-likelihood interval.
 *
 * Each step solves the linearised problem (`LimitStepper`). One may leave the limit by as much as the whole rise, since the
 * next comes back along the valley; further out the search goes back with more damping. Near the limit, a step that would
 * change little is added along the tangent. Accuracy: the reach within 2 % where the valley is not bent further on; exact
 * where χ² is a parabola. Where the first step lands on the limit the misfit is a parabola so far, and that is the end.
 * Source: Venzon & Moolgavkar 1988, Appl. Statist. 37, 87–94 (from memory).
 */
export function createProfiler(problem: LeastSquaresProblem): Profiler {
  const { linearise, step } = createLimitStepper(problem);
  /** room for where a search stands, for its furthest point and for the next */
  const kept = Array.from({ length: 3 }, () => emptyPoint(problem.low.length));
  const lineariseBeside = (at: Float64Array, here: Linearised, best: Linearised): Linearised =>
    linearise(
      at,
      kept.find((point) => point !== here && point !== best),
    );
  return {
    foot: (parameters) => linearise(parameters),
    promise: (foot, quantity, limit) =>
      quantity.value(foot.at) + TRUST * (step(foot, quantity.gradient(foot.at), limit, 0)?.gain ?? 0),
    end: (foot, quantity, limit, { from, damping = DAMPING, short = false } = {}) => {
      const rise = limit - foot.chi2;
      const origin = quantity.value(foot.at);
      const most = short ? SHORT_STEPS : STEPS;
      let here = from ? linearise(from, kept[0]) : foot;
      let best = here;
      let reach = quantity.value(here.at);
      let outside = 0;
      let calm = true;
      let straight = false;
      let found = false;
      let next: LimitStep | null = null;
      for (let steps = 0; steps < most && damping < STIFFEST; steps++) {
        next = step(here, quantity.gradient(here.at), limit, damping);
        if (next === null) break;
        const near = here === best && here !== foot && Math.abs(here.chi2 - limit) <= NEAR * rise;
        if (near && Math.abs(next.gain) <= GAIN * Math.max(SHORTEST, reach - origin)) {
          if (!next.whole) break;
          reach += next.gain;
          found = true;
          break;
        }
        const there = lineariseBeside(next.parameters, here, best);
        const over = (there.chi2 - limit) / rise;
        if (!(over <= 1) || (over > CLOSE && ++outside > RETURNS)) {
          damping *= stiffening(over);
          outside = 0;
          here = best;
          calm = false;
          continue;
        }
        here = there;
        if (over > CLOSE) {
          calm &&= over <= CALM;
          continue;
        }
        outside = 0;
        const value = quantity.value(there.at);
        if (value <= reach) {
          here = best;
          damping *= SLOWER;
          continue;
        }
        straight = steps === 0 && !from && over >= -CLOSE;
        best = there;
        reach = value;
        if (straight) break;
        if (calm) damping /= FASTER;
        calm = true;
      }
      const stopped = next === null || !next.whole;
      const under = !found && best.chi2 < limit - (stopped ? CLOSE : NEAR) * rise;
      const unfinished = under && !(short && next !== null);
      if (under && !unfinished)
        reach += Math.max(0, step(best, quantity.gradient(best.at), limit, DAMPING)?.gain ?? 0);
      // on a parabola √(rise of χ²) grows as the reach does
      if (straight) reach = origin + Math.sqrt(rise / (best.chi2 - foot.chi2)) * (reach - origin);
      return { parameters: best.at, chi2: best.chi2, reach, unfinished, straight, damping };
    },
  };
}
