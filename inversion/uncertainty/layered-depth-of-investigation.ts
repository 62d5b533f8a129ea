import { requireEarth } from '../earth/check-earth';
import { exp } from '../math/exponential';
import { log } from '../math/logarithm';
import { pow2 } from '../math/power';
import { createForwardOperator, type ForwardOperator } from '../operator/forward-operator';
import { InversionError } from '../inversion-error';
import { effectiveDepth } from '../spread/effective-depth';
import type { LayeredEarth } from '../types';
import { largestMedianDepth } from './depth-of-investigation';
import type { PlannedReading } from './detectability';
import { createNuisance } from './nuisance';

/** How far down the readings speak of a layered ground, as a soft edge. */
export interface LayeredDepthOfInvestigation {
  /** Δχ² of the readings where all ground below a depth (m) is three times as resistive, or a third, and the ground above is refitted */
  profile: { depth: number; higher: number; lower: number }[];
  /** m: above `firm` both changes would show at 95 %, below `faint` neither; null = not even at the shallowest depth */
  edge: { firm: number | null; faint: number | null };
  /** rule of thumb beside it: the largest median depth of the spreads, m */
  medianDepth: number;
}

const CHANGE = 3;
/** 95 % point of χ² with one degree of freedom. */
const SHOWN = 3.841458820694124;
const TINY = 1e-12;
/** Depths from and to, as shares of the smallest and the largest median depth, and their number to a factor of two. */
const FROM = 0.1;
const TO = 16;
const PER_OCTAVE = 4;

/** The layers of an earth above a depth, the last of them cut there, and those below with ρ times `factor`. */
function changedBelow({ resistivity, thickness }: LayeredEarth, depth: number, factor: number) {
  let top = 0;
  let cut = 0;
  while (cut < thickness.length && top + thickness[cut]! < depth) top += thickness[cut++]!;
  const rest = cut < thickness.length ? top + thickness[cut]! - depth : 0;
  const below = resistivity.slice(rest > 0 || cut === thickness.length ? cut : cut + 1);
  return {
    earth: {
      resistivity: [...resistivity.slice(0, cut + 1), ...below.map((rho) => rho * factor)],
      thickness: [
        ...thickness.slice(0, cut),
        depth - top,
        ...(rest > 0 ? [rest] : []),
        ...thickness.slice(cut + 1),
      ],
    },
    /** layers above the depth, the cut one among them */
    above: cut + 1,
  };
}

/** Whitened Jacobian of what stands above a depth: lnρ of those layers and lnh of all but the last, which ends at the depth. */
function slopesAbove(
  operator: ForwardOperator,
  earth: LayeredEarth,
  above: number,
  errors: readonly number[],
): Float64Array {
  const { predicted, jacobian } = operator.predictWithJacobian(earth);
  const layers = earth.resistivity.length;
  const columns = 2 * above - 1;
  const slopes = new Float64Array(errors.length * columns);
  errors.forEach((error, i) => {
    for (let j = 0; j < columns; j++) {
      const from = j < above ? j : layers + j - above;
      slopes[i * columns + j] = jacobian[i * (2 * layers - 1) + from]! / (predicted[i]! * error);
    }
  });
  return slopes;
}

/** Where the Δχ² that `of` takes from the profile falls through 3.84 for the last time, straight in ln–ln; null where it is never above. */
function lastShown(
  profile: LayeredDepthOfInvestigation['profile'],
  of: (at: LayeredDepthOfInvestigation['profile'][number]) => number,
): number | null {
  const k = profile.findLastIndex((at) => of(at) >= SHOWN);
  const here = profile[k];
  const next = profile[k + 1];
  if (!here || !next) return here?.depth ?? null;
  const share = log(of(here) / SHOWN) / log(of(here) / Math.max(of(next), TINY));
  return here.depth * exp(share * log(next.depth / here.depth));
}

/**
 * How deep a change of the ground still shows in the readings of a layered earth.
 *
 * At each depth all ground below is made three times as resistive, then a third. What the readings keep of that after the
 * ground above has been refitted (linearly, each value free within about tenfold) is Δχ²; 3.84 and more shows at 95 %.
 * Unlike two reference models this asks nothing of cells that a layered fit does not have. It rests on the given earth:
 * under a strong conductor it is shallower than the spacings promise.
 */
export function layeredDepthOfInvestigation(
  readings: readonly PlannedReading[],
  earth: LayeredEarth,
): LayeredDepthOfInvestigation {
  requireEarth(earth, ['earth']);
  if (readings.length === 0)
    throw new InversionError('no-readings', 'there are no readings; it needs at least one', ['readings']);
  const operator = createForwardOperator(readings.map(({ spread }) => spread));
  const errors = readings.map(({ relativeError }) => relativeError);
  const medianDepth = largestMedianDepth(readings);
  const shallow = FROM * Math.min(...readings.map(({ spread }) => effectiveDepth(spread)));
  const count = Math.ceil((PER_OCTAVE * log((TO * medianDepth) / shallow)) / Math.LN2);
  const before = operator.predict(earth);
  const profile = Array.from({ length: count + 1 }, (_, k) => {
    const depth = shallow * pow2(k / PER_OCTAVE);
    const same = changedBelow(earth, depth, 1);
    const slopes = slopesAbove(operator, same.earth, same.above, errors);
    const nuisance = createNuisance(slopes, readings.length, 2 * same.above - 1);
    const remains = (factor: number): number => {
      const after = operator.predict(changedBelow(earth, depth, factor).earth);
      return nuisance.remains(after.map((value, i) => log(value / before[i]!) / errors[i]!));
    };
    return { depth, higher: remains(CHANGE), lower: remains(1 / CHANGE) };
  });
  return {
    profile,
    edge: {
      firm: lastShown(profile, ({ higher, lower }) => Math.min(higher, lower)),
      faint: lastShown(profile, ({ higher, lower }) => Math.max(higher, lower)),
    },
    medianDepth,
  };
}
