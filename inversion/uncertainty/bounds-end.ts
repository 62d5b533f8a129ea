import type { LeastSquaresProblem } from '../fit/levenberg-marquardt';
import type { DirectedQuantity, ProfileEnd } from './profile-reach';
import type { Quantity } from './quantities';

/** An end this near to a bound, in ln, is not told from the bound … */
const BESIDE = 0.15;
/** … nor is one whose way on to the bound is no more than this share of the way to it. */
const SHARE = 0.5;
/** A parameter this near to its bound, in ln, sits on it. */
const ON = 1e-9;

/** The best model, from which an end is looked at. */
interface Best {
  readonly parameters: Float64Array;
  /** s · ln quantity there */
  readonly origin: number;
}

/**
 * True where the bounds of the fit hold one side of a quantity, and the readings do not: a value at or next to its own bound or
 * with the other value of its layer there (tied by h/ρ or hρ it would go on were that bound wider), a depth one of whose
 * thicknesses is at its upper bound or all of them at the lower one, a product under the limit of χ² with either of its two
 * values on a bound. Next to a bound means within 15 % of it and no further than half as far as the end is from the best: the
 * misfit then crosses its limit only there, or would be little above it at the bound itself.
 */
export function boundsEnd(
  { low, high }: LeastSquaresProblem,
  kind: Quantity['kind'],
  quantity: DirectedQuantity,
  /** place among the free parameters of the other value of the layer; −1 = none */
  partner: number,
  end: ProfileEnd,
  best: Best,
): boolean {
  const { parameters, reach, unfinished } = end;
  const { origin } = best;
  if (partner >= 0) {
    const other = parameters[partner]!;
    const away = Math.min(other - low[partner]!, high[partner]! - other);
    const moved = Math.abs(other - best.parameters[partner]!);
    if (moved > ON && away <= Math.max(ON, Math.min(BESIDE, SHARE * moved))) return true;
  }
  const slope = quantity.gradient(parameters);
  const beyond = reach - quantity.value(parameters);
  const beside = kind === 'product' ? ON : beyond + Math.max(ON, Math.min(BESIDE, SHARE * (reach - origin)));
  let parts = 0;
  let upper = 0;
  let lower = 0;
  slope.forEach((s, j) => {
    if (s === 0) return;
    parts++;
    if (s > 0 && high[j]! - parameters[j]! <= beside) upper++;
    if (s < 0 && parameters[j]! - low[j]! <= beside) lower++;
  });
  if (kind === 'product') return unfinished && upper + lower > 0;
  return upper > 0 || lower === parts;
}
