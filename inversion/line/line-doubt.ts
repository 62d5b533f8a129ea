import { exp } from '../math/exponential';
import { logEarth } from '../fit/starting-models';
import { log } from '../math/logarithm';
import { TOLERANCES } from '../tolerances';
import type { FitBounds, Interval, LayeredEarth } from '../types';
import { basesOf, Z95, type ParameterDoubt } from '../uncertainty/parameter-doubt';
import { depthOf, productOf, resistivityOf, thicknessOf, type Quantity } from '../uncertainty/quantities';
import { chainCovarianceRoots, factoriseChain } from './block-chain';
import type { LinearLine } from './line-problem';

/**
 * A direction that neither readings nor ties tell keeps this standard deviation, in ln, in place of none: far above
 * ln `factorLimit`, at which a value counts as not determined, and far below what rounding would blur.
 */
const UNRESOLVED = 1e4;
/** The same where the errors are so small that rounding is coarser: a share of the strongest sensitivity. */
const ROUNDING = 1e-12;

/** Covariance of all parameters of one place, those of its neighbours integrated out. */
export interface PlaceCovariance {
  /** standard deviations; 0 = held, Infinity = unresolved */
  readonly deviation: Float64Array;
  /** standard deviation along a gradient over all parameters */
  readonly along: (gradient: (j: number) => number) => number;
  readonly between: (a: number, b: number) => number;
}

/** Roots T of the covariances of the free parameters of each place, TᵀT, from the whole line. */
export function covarianceRoots({ nodes, ties, norms }: LinearLine): Float64Array[] {
  const strongest = norms.reduce((most, norm) => norm.reduce((m, value) => Math.max(m, value), most), 0);
  const floor = Math.max(1 / UNRESOLVED, ROUNDING * strongest);
  return chainCovarianceRoots(
    factoriseChain(
      nodes,
      ties,
      nodes.map(({ size }) => new Float64Array(size).fill(floor)),
    ),
  );
}

export function placeCovariance(root: Float64Array, held: readonly boolean[]): PlaceCovariance {
  const free = held.flatMap((isHeld, j) => (isHeld ? [] : [j]));
  const n = free.length;
  const between = (a: number, b: number): number => {
    const [k, l] = [free.indexOf(a), free.indexOf(b)];
    let sum = 0;
    if (k >= 0 && l >= 0) for (let r = 0; r < n; r++) sum += root[r * n + k]! * root[r * n + l]!;
    return sum;
  };
  const deviation = Float64Array.from(held, (_, j) => {
    const value = Math.sqrt(between(j, j));
    return value > UNRESOLVED / 100 ? Infinity : value;
  });
  const along = (gradient: (j: number) => number): number => {
    const slopes = free.map(gradient);
    let squares = 0;
    for (let r = 0; r < n; r++) {
      const sum = slopes.reduce((total, slope, k) => total + root[r * n + k]! * slope, 0);
      squares += sum * sum;
    }
    return Math.sqrt(squares);
  };
  return { deviation, along, between };
}

/** Standard deviation of ln quantity at one place. */
export function deviationAt(
  quantity: Quantity,
  parameters: Float64Array,
  { along }: PlaceCovariance,
): number {
  const slope = new Float64Array(parameters.length);
  quantity.gradient(parameters, slope);
  return along((j) => slope[j] ?? 0);
}

function interval(value: number, deviation: number, [low, high]: readonly [number, number]): Interval {
  if (deviation === 0) return [value, value];
  if (deviation > log(TOLERANCES.factorLimit)) return [null, null];
  const bottom = value * exp(-Z95 * deviation);
  const top = value * exp(Z95 * deviation);
  return [bottom <= low ? null : bottom, top >= high ? null : top];
}

function factor(deviation: number): number | null {
  return deviation > log(TOLERANCES.factorLimit) ? null : exp(deviation);
}

/**
 * 95 % intervals and 68 % factors of one place of a line: value × and ÷ exp(1.96 standard deviations) in ln space, from the
 * whole line linearised at its best model, so that what the neighbours and boreholes tell is counted. Null beyond a factor
 * of `TOLERANCES.factorLimit`, and at an end that the bounds cut off.
 */
export function placeDoubt(
  earth: LayeredEarth,
  covariance: PlaceCovariance,
  bounds: FitBounds,
): ParameterDoubt {
  const count = 2 * earth.resistivity.length - 1;
  const [hLow, hHigh] = bounds.thickness;
  const perLayer = <T>(of: (i: number) => T): T[] => earth.resistivity.map((_, i) => of(i));
  const perBounded = <T>(of: (i: number) => T): T[] => earth.thickness.map((_, i) => of(i));
  const parameters = logEarth(earth);
  const depths = basesOf(earth.thickness);
  const layers = earth.resistivity.length;
  const deviationOf = (quantity: Quantity) => deviationAt(quantity, parameters, covariance);
  // what is held keeps its bits, so values are those of the earth
  const intervalOf = (quantity: Quantity, value: number, range: readonly [number, number]) =>
    interval(value, deviationOf(quantity), range);
  const factorOf = (quantity: Quantity) => factor(deviationOf(quantity));
  const { deviation, between } = covariance;
  const known = (j: number) => deviation[j]! > 0 && deviation[j]! < Infinity;
  const correlation = (a: number, b: number): number | null => {
    if (!known(a) || !known(b)) return null;
    return a === b ? 1 : Math.min(1, Math.max(-1, between(a, b) / (deviation[a]! * deviation[b]!)));
  };
  const numbers = Array.from({ length: count }, (_, j) => j);
  return {
    intervals: {
      resistivity: perLayer((i) =>
        intervalOf(resistivityOf(layers, i), earth.resistivity[i]!, bounds.resistivity),
      ),
      thickness: perBounded((i) => intervalOf(thicknessOf(layers, i), earth.thickness[i]!, bounds.thickness)),
      depth: perBounded((i) => intervalOf(depthOf(layers, i), depths[i]!, [(i + 1) * hLow, (i + 1) * hHigh])),
    },
    factors: {
      resistivity: perLayer((i) => factorOf(resistivityOf(layers, i))),
      thickness: perBounded((i) => factorOf(thicknessOf(layers, i))),
      depth: perBounded((i) => factorOf(depthOf(layers, i))),
    },
    conductanceFactor: perBounded((i) => factorOf(productOf(layers, i, -1))),
    resistanceFactor: perBounded((i) => factorOf(productOf(layers, i, 1))),
    correlation: numbers.map((a) => numbers.map((b) => correlation(a, b))),
  };
}
