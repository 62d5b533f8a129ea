import type { LayeredProblem } from '../fit/layered-problem';
import type { Linearised } from './constrained-step';
import { createProfiler, type DirectedQuantity, type ProfileEnd } from './profile-reach';
import type { Quantity } from './quantities';

/** A limit of χ² above the least, and the ln ends of one quantity under it; null = the bounds end it, not the readings. */
export interface Ends {
  readonly low: number | null;
  readonly high: number | null;
}

/** What is asked of one quantity: its ends at the first limit, or at both. */
export interface Asked {
  readonly of: Quantity;
  /** one for a quantity of those asked before it: it is searched for shortly */
  readonly limits: 1 | 2;
}

/** A model under the limits: free parameters and χ². */
export interface AllowedPoint {
  readonly parameters: Float64Array;
  readonly chi2: number;
}

/** One search: a quantity, a side, a limit, and the furthest end so far. */
interface Quest {
  /** searched for shortly, from the furthest point that the searches before it found */
  readonly short: boolean;
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
 * search goes on from there. `others` are feet of further valleys; one inside of all ends found so far is passed over, and so
 * is a quantity whose tangent there promises nothing beyond its end.
 * Returns, in the order of `asked`, the ends for each limit.
 */
export function profileEnds(
  layered: LayeredProblem,
  best: AllowedPoint,
  others: readonly AllowedPoint[],
  asked: readonly Asked[],
  limits: readonly [number, number],
): Ends[][] {
  const profiler = createProfiler(layered.problem);
  const free = layered.held.flatMap((isHeld, j) => (isHeld ? [] : [j]));
  const found: AllowedPoint[] = [...others];
  const whole = free.length === layered.held.length;
  const all = (at: Float64Array): Float64Array => (whole ? at : layered.expand(at));
  const slopeOfAll = new Float64Array(layered.held.length);
  const slope = new Float64Array(free.length);

  const questsOf = ({ of, limits: count }: Asked, side: 1 | -1): Quest[] => {
    const directed: DirectedQuantity = {
      value: (at) => side * of.value(all(at)),
      gradient: (at) => {
        of.gradient(all(at), slopeOfAll);
        for (let k = 0; k < free.length; k++) slope[k] = side * slopeOfAll[free[k]!]!;
        return slope;
      },
    };
    const near: Quest = {
      short: count === 1,
      directed,
      limit: best.chi2 + limits[0],
      nearer: null,
      end: null,
    };
    return count === 1 ? [near] : [near, { ...near, limit: best.chi2 + limits[1], nearer: near }];
  };
  const quests = asked.map((one) => ({ low: questsOf(one, -1), high: questsOf(one, 1) }));
  const searches = quests.flatMap(({ low, high }) => [...low, ...high]);

  const furthest = (quest: Quest, reach: number): AllowedPoint | null => {
    let further: AllowedPoint | null = null;
    for (const point of found) {
      if (point.chi2 > quest.limit) continue;
      const value = quest.directed.value(point.parameters);
      if (value > reach) [further, reach] = [point, value];
    }
    return further;
  };
  const search = (quest: Quest, foot: Linearised, from?: AllowedPoint & { readonly damping?: number }) => {
    if (quest.end?.open || foot.chi2 >= quest.limit) return;
    if (quest.end && !from && profiler.promise(foot, quest.directed, quest.limit) <= quest.end.reach) return;
    const end = profiler.end(foot, quest.directed, quest.limit, {
      from: from?.parameters,
      damping: from?.damping,
      short: quest.short,
    });
    found.push(end);
    if (!quest.end || end.open || end.reach > quest.end.reach) quest.end = end;
  };
  const searchAllFrom = (foot: Linearised) => {
    for (const quest of searches) {
      const near = quest.nearer?.end;
      if (near?.open) quest.end = near;
      else if (quest.short && foot === bestFoot)
        search(quest, foot, furthest(quest, quest.directed.value(foot.at)) ?? undefined);
      else search(quest, foot, near && !near.straight && foot === bestFoot ? near : undefined);
    }
  };
  const covered = ({ parameters }: AllowedPoint) =>
    searches.every(
      ({ directed, end, nearer }) =>
        nearer === null || !end || end.open || directed.value(parameters) <= end.reach,
    );

  const bestFoot = profiler.foot(best.parameters);
  searchAllFrom(bestFoot);
  for (const other of others) if (!covered(other)) searchAllFrom(profiler.foot(other.parameters));
  for (let round = 0; round < ROUNDS; round++) {
    let gained = false;
    for (const quest of searches) {
      if (!quest.end || quest.end.open) continue;
      const further = furthest(quest, quest.end.reach + FURTHER);
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
