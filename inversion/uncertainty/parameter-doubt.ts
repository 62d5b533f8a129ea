import type { LayeredProblem } from '../fit/layered-problem';
import { exp } from '../math/exponential';
import { TOLERANCES } from '../tolerances';
import type { Interval, LayeredEarth } from '../types';
import type { LogCovariance } from './covariance';
import { profileEnds, type Asked, type Ends } from './profile-ends';
import { depthOf, productOf, resistivityOf, thicknessOf, type Quantity } from './quantities';

/** Standard normal point that leaves 2.5 % above it; its square is the 95 % point of χ² with one degree of freedom. */
export const Z95 = 1.959963984540054;

/** A model that the readings allow, with the doubt about it from its own Jacobian. */
export interface AllowedModel {
  /** all parameters, ln values then shifts */
  readonly parameters: Float64Array;
  readonly earth: LayeredEarth;
  readonly covariance: LogCovariance;
  /** its χ² minus the least one found, ≥ 0 */
  readonly excess: number;
}

export interface ParameterDoubt {
  readonly intervals: { resistivity: Interval[]; thickness: Interval[]; depth: Interval[] };
  readonly factors: {
    resistivity: (number | null)[];
    thickness: (number | null)[];
    depth: (number | null)[];
  };
  readonly correlation: (number | null)[][];
  /** 68 % factors of S = h/ρ and T = hρ of the bounded layers */
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

function interval({ low, high }: Ends): Interval {
  return [low === null ? null : exp(low), high === null ? null : exp(high)];
}

function factor(best: number, { low, high }: Ends): number | null {
  if (low === null || high === null) return null;
  const reach = exp(Math.max(best - low, high - best));
  return reach > TOLERANCES.factorLimit ? null : reach;
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
 * 95 % intervals and 68 % factors of ρ, h, the depth of each boundary, S and T, and the correlations of the ln parameters.
 *
 * `models` holds the best one first, then others that the readings allow. An interval is the profile-likelihood region of
 * one quantity, χ² ≤ least + 1.96² with all else refitted (+ 1 for the factors), from every model that fits so well:
 * without the others it would deny the truth where two grounds fit alike. A factor above `TOLERANCES.factorLimit` is null;
 * an end that the bounds cut off is null (unbounded); a held value gives [v, v] and factor 1. Correlations are the
 * linear ones of the best, over the 2N − 1 ln values; null for a held or unresolved one.
 */
export function parameterDoubt(
  models: readonly [AllowedModel, ...AllowedModel[]],
  layered: LayeredProblem,
  leastChi2: number,
): ParameterDoubt {
  const [best, ...others] = models;
  const { resistivity, thickness } = best.earth;
  const layers = resistivity.length;
  const quantities: Asked[] = [
    ...resistivity.map((_, i) => ({ of: resistivityOf(i), limits: 2 as const })),
    ...thickness.map((_, i) => ({ of: thicknessOf(layers, i), limits: 2 as const })),
    // the base of the first layer is its thickness
    ...thickness.slice(1).map((_, i) => ({ of: depthOf(layers, i + 1), limits: 2 as const })),
    ...thickness.map((_, i) => ({ of: productOf(layers, i, -1), limits: 1 as const })),
    ...thickness.map((_, i) => ({ of: productOf(layers, i, 1), limits: 1 as const })),
  ];
  // what is held keeps its bits
  const stated = [...resistivity, ...thickness, ...basesOf(thickness).slice(1)];
  const free = quantities.filter(({ of }) => !isHeld(of, best, layered.held));
  const point = ({ parameters, excess }: AllowedModel) => ({
    parameters: layered.restrict(parameters),
    chi2: leastChi2 + excess,
  });
  const ends = profileEnds(layered, point(best), others.map(point), free, [1, Z95 * Z95]);
  const doubts = quantities.map((quantity, i): { interval: Interval; factor: number | null } => {
    const centre = quantity.of.value(best.parameters);
    const [inner, outer] = ends[free.indexOf(quantity)] ?? [];
    return inner
      ? { interval: interval(outer ?? inner), factor: factor(centre, inner) }
      : { interval: [stated[i] ?? null, stated[i] ?? null], factor: 1 };
  });
  const bounded = thickness.length;
  const rho = doubts.splice(0, resistivity.length);
  const h = doubts.splice(0, bounded);
  const depth = [...h.slice(0, 1), ...doubts.splice(0, Math.max(0, bounded - 1))];
  const factors = (some: typeof doubts) => some.map((doubt) => doubt.factor);
  const intervals = (some: typeof doubts) => some.map((doubt) => doubt.interval);
  return {
    intervals: { resistivity: intervals(rho), thickness: intervals(h), depth: intervals(depth) },
    factors: { resistivity: factors(rho), thickness: factors(h), depth: factors(depth) },
    conductanceFactor: factors(doubts.slice(0, bounded)),
    resistanceFactor: factors(doubts.slice(bounded)),
    correlation: correlations(best.covariance, 2 * resistivity.length - 1),
  };
}
