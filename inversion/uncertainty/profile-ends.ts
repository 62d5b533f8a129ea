import type { LayeredProblem } from '../fit/layered-problem';
import { boundsEnd } from './bounds-end';
import type { Linearised } from './constrained-step';
import { createProfiler, type DirectedQuantity, type ProfileEnd } from './profile-reach';
import { pushOn } from './push-on';
import type { Quantity } from './quantities';

/** The ln ends of one quantity under a limit of χ²; null = the bounds of the fit end it, not the readings. */
export interface Ends {
  readonly low: number | null;
  readonly high: number | null;
}

/** What is asked of one quantity. */
export interface Asked {
  readonly of: Quantity;
  /** for a quantity of those asked before it: a few steps at the first limit, and at the second what was found for the others */
  readonly short: boolean;
}

/** A model under the limits: free parameters and χ². */
export interface AllowedPoint {
  readonly parameters: Float64Array;
  readonly chi2: number;
  /** true for a ground with a layer less, one of whose layers is split in two alike: from there much is free that is not elsewhere */
  readonly isSplit?: boolean;
}

/** One search: a quantity, a side, a limit, and the furthest end so far. */
interface Quest {
  readonly how: 'in full' | 'shortly' | 'among the points found';
  readonly directed: DirectedQuantity;
  readonly isOpen: (end: ProfileEnd) => boolean;
  readonly limit: number;
  /** s · ln quantity of the best model */
  readonly origin: number;
  /** the same quantity and side at the lower limit */
  readonly nearer: Quest | null;
  end: ProfileEnd | null;
  open: boolean;
}

/** A point found for one quantity starts a search for another where it lies further out by this much in ln. */
const FURTHER = 0.01;
/** Rounds in which the points found for one quantity serve the others. */
const ROUNDS = 2;

/**
 * Ends of the profile intervals of several quantities under two limits of χ² above `least`.
 *
 * A search follows the valley from its foot, but a valley may be long and bent, and a quantity that hardly changes near the
 * foot changes at its far end. So every end found for one quantity is looked at for all: where it lies further out, the
 * search goes on from there. `others` are feet of further valleys; one inside of all ends found so far is passed over, and so
 * is a quantity whose tangent there promises nothing beyond its end. A search that stops under its limit away from the bounds
 * is pushed on (`pushOn`): an end is null where the bounds hold the quantity (`boundsEnd`), and nowhere else.
 * Returns, in the order of `asked`, the ends for each limit.
 */
export function profileEnds(
  layered: LayeredProblem,
  best: AllowedPoint,
  others: readonly AllowedPoint[],
  asked: readonly Asked[],
  limits: readonly [number, number],
): [Ends, Ends][] {
  const { problem } = layered;
  const profiler = createProfiler(problem);
  const free = layered.held.flatMap((isHeld, j) => (isHeld ? [] : [j]));
  const found: AllowedPoint[] = [...others];
  const whole = free.length === layered.held.length;
  const all = (at: ArrayLike<number>): ArrayLike<number> => (whole ? at : layered.expand(at));
  const slopeOfAll = new Float64Array(layered.held.length);
  const slope = new Float64Array(free.length);

  const questsOf = ({ of, short }: Asked, side: 1 | -1): [Quest, Quest] => {
    const directed: DirectedQuantity = {
      value: (at) => side * of.value(all(at)),
      gradient: (at) => {
        of.gradient(all(at), slopeOfAll);
        for (let k = 0; k < free.length; k++) slope[k] = side * slopeOfAll[free[k]!]!;
        return slope;
      },
    };
    const origin = directed.value(best.parameters);
    const partner = free.indexOf(of.partner ?? -1);
    const near: Quest = {
      how: short ? 'shortly' : 'in full',
      directed,
      isOpen: (end) =>
        boundsEnd(problem, of.kind, directed, partner, end, { parameters: best.parameters, origin }),
      limit: best.chi2 + limits[0],
      origin,
      nearer: null,
      end: null,
      open: false,
    };
    const how = short ? 'among the points found' : 'in full';
    return [near, { ...near, how, limit: best.chi2 + limits[1], nearer: near }];
  };
  const quests = asked.map((one) => ({ low: questsOf(one, -1), high: questsOf(one, 1) }));
  const everyQuest = quests.flatMap(({ low, high }) => [...low, ...high]);
  const searches = everyQuest.filter(({ how }) => how !== 'among the points found');

  const furthest = (quest: Quest, reach: number): AllowedPoint | null => {
    let further: AllowedPoint | null = null;
    for (const point of found) {
      if (point.chi2 > quest.limit) continue;
      const value = quest.directed.value(point.parameters);
      if (value <= reach) continue;
      further = point;
      reach = value;
    }
    return further;
  };
  const keep = (quest: Quest, end: ProfileEnd) => {
    found.push(end);
    if (quest.end && end.reach <= quest.end.reach) return;
    quest.end = end;
    quest.open ||= quest.isOpen(end);
  };
  const search = (quest: Quest, foot: Linearised, from?: AllowedPoint & { readonly damping?: number }) => {
    if (quest.open || foot.chi2 >= quest.limit) return;
    if (quest.end && !from && profiler.promise(foot, quest.directed, quest.limit) <= quest.end.reach) return;
    keep(
      quest,
      profiler.end(foot, quest.directed, quest.limit, {
        from: from?.parameters,
        damping: from?.damping,
        short: quest.how === 'shortly',
      }),
    );
  };
  const searchAllFrom = (foot: Linearised) => {
    for (const quest of searches) {
      const { nearer } = quest;
      const near = nearer?.end;
      if (near && nearer.open) [quest.end, quest.open] = [near, true];
      else if (quest.how === 'shortly' && foot === bestFoot)
        search(quest, foot, furthest(quest, quest.origin) ?? undefined);
      else search(quest, foot, near && !near.straight && foot === bestFoot ? near : undefined);
    }
  };
  const pushUnfinished = () => {
    for (const quest of searches) {
      const { end } = quest;
      if (!end?.unfinished || quest.open || quest.how !== 'in full') continue;
      quest.end = null;
      keep(quest, pushOn(problem, quest.directed, quest.limit, end, quest.origin, quest.isOpen));
    }
  };
  const covered = ({ parameters }: AllowedPoint) =>
    searches.every(
      ({ directed, end, nearer, open }) =>
        nearer === null || !end || open || directed.value(parameters) <= end.reach,
    );

  const bestFoot = profiler.foot(best.parameters);
  searchAllFrom(bestFoot);
  for (const other of others)
    if (other.isSplit || !covered(other)) searchAllFrom(profiler.foot(other.parameters));
  pushUnfinished();
  for (let round = 0; round < ROUNDS; round++) {
    let gained = false;
    for (const quest of searches) {
      if (!quest.end || quest.open) continue;
      const further = furthest(quest, quest.end.reach + FURTHER);
      if (further === null) continue;
      search(quest, bestFoot, further);
      gained = true;
    }
    if (!gained) break;
  }
  pushUnfinished();
  for (const quest of everyQuest) {
    quest.open ||= quest.nearer?.open ?? false;
    const point = quest.open ? null : furthest(quest, quest.end?.reach ?? quest.origin);
    if (point === null) continue;
    const reach = quest.directed.value(point.parameters);
    keep(quest, { ...point, reach, unfinished: false, straight: false, damping: 0 });
  }
  const value = ({ end, open, origin }: Quest, side: 1 | -1) => (open ? null : side * (end?.reach ?? origin));
  const endsAt = ({ low, high }: (typeof quests)[number], i: 0 | 1): Ends => ({
    low: value(low[i], -1),
    high: value(high[i], 1),
  });
  return quests.map((quest) => [endsAt(quest, 0), endsAt(quest, 1)]);
}
