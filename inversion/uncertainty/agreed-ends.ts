import { exp } from '../math/exponential';
import { log } from '../math/logarithm';
import type { Ends } from './profile-ends';

/** ln ends of every quantity of an earth under one limit of χ², one entry a layer or a bounded layer. */
export interface EarthEnds {
  readonly resistivity: readonly Ends[];
  readonly thickness: readonly Ends[];
  /** of the base of each bounded layer */
  readonly depth: readonly Ends[];
  /** S = h/ρ and T = hρ of each bounded layer */
  readonly conductance: readonly Ends[];
  readonly resistance: readonly Ends[];
}

const lowest = (low: number | null): number => low ?? -Infinity;
const highest = (high: number | null): number => high ?? Infinity;

/** The part of the ends between `low` and `high`. */
function within(ends: Ends, low: number, high: number): Ends {
  const inner = Math.max(lowest(ends.low), low);
  const outer = Math.min(highest(ends.high), high);
  return { low: inner === -Infinity ? null : inner, high: outer === Infinity ? null : outer };
}

/** Depths between the sums of the thicknesses above them, none above the one before or below the next. */
function agreedDepths(depth: readonly Ends[], thickness: readonly Ends[]): Ends[] {
  let thin = 0;
  let thick = 0;
  const depths = depth.map((ends, k) => {
    const { low, high } = thickness[k]!;
    thin += exp(lowest(low));
    thick += high === null ? Infinity : exp(high);
    return within(ends, thin > 0 ? log(thin) : -Infinity, thick < Infinity ? log(thick) : Infinity);
  });
  for (let k = 1; k < depths.length; k++)
    depths[k] = within(depths[k]!, lowest(depths[k - 1]!.low), Infinity);
  for (let k = depths.length - 2; k >= 0; k--)
    depths[k] = within(depths[k]!, -Infinity, highest(depths[k + 1]!.high));
  return depths;
}

/**
 * The same ends, where a quantity made of others is no looser than those allow: D_k from Σ lower to Σ upper ends of h₁…h_k, not
 * above D_{k−1} nor below D_{k+1}; S and T from the ends of h and ρ. Searches for them end at somewhat different points.
 */
export function agreedEnds({ resistivity, thickness, depth, conductance, resistance }: EarthEnds): EarthEnds {
  return {
    resistivity,
    thickness,
    depth: agreedDepths(depth, thickness),
    conductance: conductance.map((ends, i) => {
      const [h, rho] = [thickness[i]!, resistivity[i]!];
      return within(ends, lowest(h.low) - highest(rho.high), highest(h.high) - lowest(rho.low));
    }),
    resistance: resistance.map((ends, i) => {
      const [h, rho] = [thickness[i]!, resistivity[i]!];
      return within(ends, lowest(h.low) + lowest(rho.low), highest(h.high) + highest(rho.high));
    }),
  };
}

const union = (inner: Ends, outer: Ends): Ends => ({
  low: inner.low === null || outer.low === null ? null : Math.min(inner.low, outer.low),
  high: inner.high === null || outer.high === null ? null : Math.max(inner.high, outer.high),
});

/** The ends under the higher limit, none inside of those under the lower one. */
export function around(inner: EarthEnds, outer: EarthEnds): EarthEnds {
  const wider = (of: keyof EarthEnds) => inner[of].map((ends, i) => union(ends, outer[of][i]!));
  return {
    resistivity: wider('resistivity'),
    thickness: wider('thickness'),
    depth: wider('depth'),
    conductance: wider('conductance'),
    resistance: wider('resistance'),
  };
}
