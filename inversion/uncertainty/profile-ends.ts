import type { LayeredProblem } from '../fit/layered-problem';
import { log } from '../math/logarithm';
import type { LayeredEarth } from '../types';
import { createProfiler, type DirectedQuantity, type Linearised, type ProfileEnd } from './profile-reach';
import type { QuantityOf } from './quantities';

/** A limit of χ² above the least, and the ln ends of one quantity under it; null = the bounds end it, not the readings. */
export interface Ends {
  readonly low: number | null;
  readonly high: number | null;
}

/** What is asked of one quantity: its ends at the first limit, or at both. */
export interface Asked {
  readonly of: QuantityOf;
  readonly limits: 1 | 2;
}

/** A model under the limits: free parameters and χ². */
export interface AllowedPoint {
  readonly parameters: Float64Array;
  readonly chi2: number;
}

/** One search: a quantity, a side, a limit, and the furthest end so far. */
interface Quest {
  readonly directed: DirectedQuantity;
  readonly limit: number;
  /** the same quantity and side at the lower limit */
  readonly nearer: Quest | null;
  end: ProfileEnd | null;
}

/** A point found for one quantity starts a search for another where it lies further out by this much in ln. */
const FURTHER = 0.01;
/** Rounds in which the points found for one quantity serve the others. */
const ROUNDS = 2;

/**
 * Ends of the profile intervals of several quantities under one or two limits of χ² above `least`.
 *
 * A search follows the valley from its foot, but a valley may be long and bent, and a quantity that hardly changes near the
 * foot changes at its far end. So every end found for one quantity is looked at for all: where it lies further out, the
 * search goes on from there. `others` are feet of further valleys; one inside of all ends found so far is passed over.
 * Returns, in the order of `asked`, the ends for each limit.
 */
export function profileEnds(
  layered: LayeredProblem,
  best: AllowedPoint,
  others: readonly AllowedPoint[],
  asked: readonly Asked[],
  limits: readonly [number, number],
  earthAt: (free: Float64Array) => LayeredEarth,
): Ends[][] {
  const profiler = createProfiler(layered.problem);
  const free = layered.held.flatMap((isHeld, j) => (isHeld ? [] : [j]));
  const found: AllowedPoint[] = [...others];
  // every point is asked for every quantity
  const earths = new Map<Float64Array, LayeredEarth>();
  const earthOnce = (at: Float64Array): LayeredEarth => {
    const earth = earths.get(at) ?? earthAt(at);
    earths.set(at, earth);
    return earth;
  };

  const questsOf = ({ of, limits: count }: Asked, side: 1 | -1): Quest[] => {
    const directed: DirectedQuantity = {
      value: (at) => side * log(of(earthOnce(at)).value),
      gradient: (at) => {
        const { gradient } = of(earthOnce(at));
        const slope = new Float64Array(free.length);
        for (let k = 0; k < free.length; k++) slope[k] = side * gradient(free[k]!);
        return slope;
      },
    };
    const near: Quest = { directed, limit: best.chi2 + limits[0], nearer: null, end: null };
    return count === 1 ? [near] : [near, { ...near, limit: best.chi2 + limits[1], nearer: near }];
  };
  const quests = asked.map((one) => ({ low: questsOf(one, -1), high: questsOf(one, 1) }));
  const all = quests.flatMap(({ low, high }) => [...low, ...high]);

  const search = (quest: Quest, foot: Linearised, from?: AllowedPoint) => {
    if (quest.end?.open || foot.chi2 >= quest.limit) return;
    const start = from && { ...from, reach: quest.directed.value(from.parameters) };
    const end = profiler.end(foot, quest.directed, quest.limit, start);
    found.push(end);
    if (!quest.end || end.open || end.reach > quest.end.reach) quest.end = end;
  };
  const searchAllFrom = (foot: Linearised) => {
    for (const quest of all) {
      const near = quest.nearer?.end;
      if (near?.open) quest.end = near;
      else search(quest, foot, near && !near.straight && foot === bestFoot ? near : undefined);
    }
  };
  const covered = ({ parameters }: AllowedPoint) =>
    all.every(
      ({ directed, end, nearer }) =>
        nearer === null || !end || end.open || directed.value(parameters) <= end.reach,
    );

  const bestFoot = profiler.foot(best.parameters);
  searchAllFrom(bestFoot);
  for (const other of others) if (!covered(other)) searchAllFrom(profiler.foot(other.parameters));
  for (let round = 0; round < ROUNDS; round++) {
    let gained = false;
    for (const quest of all) {
      if (!quest.end || quest.end.open) continue;
      let further: AllowedPoint | null = null;
      let reach = quest.end.reach + FURTHER;
      for (const point of found) {
        if (point.chi2 > quest.limit) continue;
        const value = quest.directed.value(point.parameters);
        if (value > reach) [further, reach] = [point, value];
      }
      if (further === null) continue;
      search(quest, bestFoot, further);
      gained = true;
    }
    if (!gained) break;
  }
  const value = ({ end }: Quest, side: 1 | -1) => (!end || end.open ? null : side * end.reach);
  return quests.map(({ low, high }) =>
    low.map((quest, i) => ({ low: value(quest, -1), high: value(high[i]!, 1) })),
  );
}
