import type { LayeredProblem } from '../fit/layered-problem';
import { exp } from '../math/exponential';
import { log } from '../math/logarithm';
import { TOLERANCES } from '../tolerances';
import type { Interval, LayeredEarth } from '../types';
import { agreedEnds, around, type EarthEnds } from './agreed-ends';
import type { LogCovariance } from './covariance';
import { profileEnds, type Asked, type Ends } from './profile-ends';
import { depthOf, productOf, resistivityOf, thicknessOf, type Quantity } from './quantities';

/** Standard normal point that leaves 2.5 % above it; its square is the 95 % point of χ² with one degree of freedom. */
export const Z95 = 1.959963984540054;

/** A model that the readings allow. */
export interface AllowedModel {
  /** all parameters, ln values then shifts */
  readonly parameters: Float64Array;
  readonly earth: LayeredEarth;
  /** its χ² minus the least one found, ≥ 0 */
  readonly excess: number;
}

/** The best of them, with the linear doubt about it from its own Jacobian. */
export interface BestModel extends AllowedModel {
  readonly covariance: LogCovariance;
}

export interface ParameterDoubt {
  readonly intervals: { resistivity: Interval[]; thickness: Interval[]; depth: Interval[] };
  readonly factors: {
    resistivity: (number | null)[];
    thickness: (number | null)[];
    depth: (number | null)[];
  };
  readonly correlation: (number | null)[][];
  /** factors of S = h/ρ and T = hρ of the bounded layers */
  readonly conductanceFactor: (number | null)[];
  readonly resistanceFactor: (number | null)[];
}

/** True where no free parameter moves the quantity: it is held. */
function isHeld(quantity: Quantity, { parameters }: AllowedModel, held: readonly boolean[]): boolean {
  const slope = new Float64Array(held.length);
  quantity.gradient(parameters, slope);
  return held.every((fixed, j) => fixed || slope[j] === 0);
}

/** Depths of the bases of the bounded layers. */
export function basesOf(thickness: readonly number[]): number[] {
  let depth = 0;
  return thickness.map((h) => (depth += h));
}

/** The interval of a value, which lies inside of it whatever the rounding. */
function interval(stated: number, { low, high }: Ends): Interval {
  return [
    low === null ? null : Math.min(stated, exp(low)),
    high === null ? null : Math.max(stated, exp(high)),
  ];
}

function furthestOf(centre: number, { low, high }: Ends): number {
  return low === null || high === null ? Infinity : Math.max(centre - low, high - centre);
}

/** The larger of the 68 % reach and of the 95 % reach per 1.96, as a factor. */
function factor(centre: number, inner: Ends, outer: Ends): number | null {
  const reach = Math.max(furthestOf(centre, inner), furthestOf(centre, outer) / Z95);
  return reach > log(TOLERANCES.factorLimit) ? null : exp(reach);
}

function correlations({ deviation, covariance }: LogCovariance, count: number): (number | null)[][] {
  const n = deviation.length;
  const known = (j: number) => deviation[j]! > 0 && deviation[j]! < Infinity;
  return Array.from({ length: count }, (_, a) =>
    Array.from({ length: count }, (_unused, b) => {
      if (!known(a) || !known(b)) return null;
      if (a === b) return 1;
      const value = covariance[a * n + b]! / (deviation[a]! * deviation[b]!);
      return Math.min(1, Math.max(-1, value));
    }),
  );
}

/**
 * 95 % intervals and factors of one standard deviation of ρ, h, the depth of each boundary, S and T, and the correlations of
 * the ln parameters.
 *
 * `models` holds the best one first, then others that the readings allow. An interval is the profile-likelihood region of
 * one quantity, χ² ≤ least + 1.96² with all else refitted, from every model that fits so well: without the others it would
 * deny the truth where two grounds fit alike. A factor is the larger of what χ² ≤ least + 1 allows and the 95 % reach to the
 * power 1/1.96: a second valley between the two would else leave a value "well determined" beside a wide interval. One above
 * `TOLERANCES.factorLimit`, or of an interval with an open end, is null; an end that the bounds of the fit hold is null
 * (unbounded); a held value gives [v, v] and factor 1. Depths are no looser than the thicknesses above them allow, S and T than
 * ρ and h. Correlations are the linear ones of the best, over the 2N − 1 ln values; null for a held or unresolved one.
 */
export function parameterDoubt(
  models: readonly [BestModel, ...AllowedModel[]],
  /** grounds with one layer fewer that are allowed too, one of their layers split in two alike */
  split: readonly AllowedModel[],
  layered: LayeredProblem,
  leastChi2: number,
): ParameterDoubt {
  const [best, ...others] = models;
  const { resistivity, thickness } = best.earth;
  const layers = resistivity.length;
  const bounded = thickness.length;
  const asked: Record<keyof EarthEnds, Asked[]> = {
    resistivity: resistivity.map((_, i) => ({ of: resistivityOf(layers, i), short: false })),
    thickness: thickness.map((_, i) => ({ of: thicknessOf(layers, i), short: false })),
    depth: thickness.map((_, i) => ({ of: depthOf(layers, i), short: false })),
    conductance: thickness.map((_, i) => ({ of: productOf(layers, i, -1), short: true })),
    resistance: thickness.map((_, i) => ({ of: productOf(layers, i, 1), short: true })),
  };
  // the base of the first layer is its thickness
  if (bounded > 0) asked.depth[0] = asked.thickness[0]!;
  const moved = [...new Set(Object.values(asked).flat())].filter(({ of }) => !isHeld(of, best, layered.held));
  const point = ({ parameters, excess }: AllowedModel) => ({
    parameters: layered.restrict(parameters),
    chi2: leastChi2 + excess,
  });
  const feet = [...others.map(point), ...split.map((model) => ({ ...point(model), isSplit: true }))];
  const ends = profileEnds(layered, point(best), feet, moved, [1, Z95 * Z95]);
  const centreOf = ({ of }: Asked): number => of.value(best.parameters);
  const endsAt = (limit: 0 | 1): EarthEnds => {
    const of = (key: keyof EarthEnds) =>
      asked[key].map((one): Ends => {
        const centre = centreOf(one);
        return ends[moved.indexOf(one)]?.[limit] ?? { low: centre, high: centre };
      });
    return {
      resistivity: of('resistivity'),
      thickness: of('thickness'),
      depth: of('depth'),
      conductance: of('conductance'),
      resistance: of('resistance'),
    };
  };
  const inner = agreedEnds(endsAt(0));
  const outer = agreedEnds(around(inner, endsAt(1)));
  const intervals = (key: keyof EarthEnds, stated: readonly number[]): Interval[] =>
    asked[key].map((one, i) =>
      // what is held keeps its bits
      moved.includes(one) ? interval(stated[i]!, outer[key][i]!) : [stated[i]!, stated[i]!],
    );
  const factors = (key: keyof EarthEnds) =>
    asked[key].map((one, i) =>
      moved.includes(one) ? factor(centreOf(one), inner[key][i]!, outer[key][i]!) : 1,
    );
  return {
    intervals: {
      resistivity: intervals('resistivity', resistivity),
      thickness: intervals('thickness', thickness),
      depth: intervals('depth', basesOf(thickness)),
    },
    factors: {
      resistivity: factors('resistivity'),
      thickness: factors('thickness'),
      depth: factors('depth'),
    },
    conductanceFactor: factors('conductance'),
    resistanceFactor: factors('resistance'),
    correlation: correlations(best.covariance, 2 * layers - 1),
  };
}
