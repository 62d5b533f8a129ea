import { LN2_HIGH, LN2_LOW } from './exponential';
import { powerOfTwo } from './power-of-two';

const view = new DataView(new ArrayBuffer(8));
/** High words of 1 and of √½ of a double; their difference centres the mantissa on 1. */
const HIGH_OF_ONE = 0x3ff00000;
const HIGH_OF_ROOT_HALF = 0x3fe6a09e;
const SMALLEST_NORMAL = 2.2250738585072014e-308;

/** k of x = 2^k m with √½ ≤ m < √2, for a normal x > 0; m is then x·2^−k, exactly. */
function exponentOf(x: number): number {
  view.setFloat64(0, x, true);
  return ((view.getInt32(4, true) + (HIGH_OF_ONE - HIGH_OF_ROOT_HALF)) >> 20) - 1023;
}

/** ln(1 + f) + k ln2 + c·, √½ − 1 ≤ f < √2 − 1: s = f/(2 + f), ln(1 + f) = 2 artanh s by its Remez polynomial. */
function combine(f: number, k: number, c: number): number {
  const half = 0.5 * f * f;
  const s = f / (2 + f);
  const z = s * s;
  const w = z * z;
  const even = w * (3.999999999940941908e-1 + w * (2.222219843214978396e-1 + w * 1.531383769920937332e-1));
  const odd =
    z *
    (6.66666666666673513e-1 +
      w * (2.857142874366239149e-1 + w * (1.818357216161805012e-1 + w * 1.479819860511658591e-1)));
  return s * (half + (odd + even)) + (k * LN2_LOW + c) - half + f + k * LN2_HIGH;
}

/**
 * ln x, within 1 ulp; NaN below 0, −Infinity at 0. Every machine gives the same bits.
 * Accuracy: measured in `tests/inversion/math`. Source: fdlibm (Sun 1993, e_log.c), from memory.
 */
export function log(x: number): number {
  if (!(x > 0)) return x === 0 ? -Infinity : NaN;
  if (x === Infinity) return Infinity;
  if (x < SMALLEST_NORMAL) return log(x * powerOfTwo(54)) - 54 * Math.LN2;
  const k = exponentOf(x);
  return combine(x * powerOfTwo(-k) - 1, k, 0);
}

/** log₂ x for a normal x > 0, exact at powers of two, else within 2 ulp. */
export function log2(x: number): number {
  const k = exponentOf(x);
  return k + combine(x * powerOfTwo(-k) - 1, 0, 0) * Math.LOG2E;
}

/**
 * ln(1 + x), within 1 ulp also where x is near 0; NaN below −1.
 * Accuracy: measured in `tests/inversion/math`. Source: fdlibm (Sun 1993, s_log1p.c), from memory.
 */
export function log1p(x: number): number {
  if (!(x > -1)) return x === -1 ? -Infinity : NaN;
  if (x === Infinity) return Infinity;
  if (Math.abs(x) < 1.2e-16) return x;
  if (x > -0.2928 && x < 0.4142) return combine(x, 0, 0);
  const u = 1 + x;
  const k = exponentOf(u);
  // what 1 + x lost
  const c = k >= 54 ? 0 : (k >= 2 ? 1 - (u - x) : x - (u - 1)) / u;
  return combine(u * powerOfTwo(-k) - 1, k, c);
}
