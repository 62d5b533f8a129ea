/** π/2 in four parts; n × each of the first three is exact for |n| < 2²⁰. */
const HALF_PI_1 = 1.57079632673412561417;
const HALF_PI_2 = 6.0771005063039659766e-11;
const HALF_PI_3 = 2.0222662487111664558e-21;
const HALF_PI_4 = 8.47842766036889956997e-32;
const PER_HALF_PI = 6.36619772367581382433e-1;
const LARGEST = 1.6e6;

/** sin(x + y) for |x| ≤ π/4, y its tail. */
function sineNearZero(x: number, y: number): number {
  const z = x * x;
  const w = z * z;
  const r =
    8.33333333332248946124e-3 +
    z * (-1.98412698298579493134e-4 + z * 2.75573137070700676789e-6) +
    z * w * (-2.50507602534068634195e-8 + z * 1.58969099521155010221e-10);
  const v = z * x;
  return x - (z * (0.5 * y - v * r) - y - v * -1.66666666666666324348e-1);
}

/** cos(x + y) for |x| ≤ π/4, y its tail. */
function cosineNearZero(x: number, y: number): number {
  const z = x * x;
  const w = z * z;
  const r =
    z * (4.16666666666666019037e-2 + z * (-1.38888888888741095749e-3 + z * 2.48015872894767294178e-5)) +
    w * w * (-2.75573143513906633035e-7 + z * (2.0875723212981748279e-9 + z * -1.13596475577881948265e-11));
  const half = 0.5 * z;
  const head = 1 - half;
  return head + (1 - head - half + (z * r - x * y));
}

/** sin(x + quarter × π/2), x reduced to [−π/4, π/4] by a π/2 of 150 bits. */
function sineOfQuarter(x: number, quarter: number): number {
  if (!(Math.abs(x) <= LARGEST)) return NaN;
  const n = Math.floor(x * PER_HALF_PI + 0.5);
  const r1 = x - n * HALF_PI_1;
  const r2 = r1 - n * HALF_PI_2;
  const lost2 = r1 - r2 - n * HALF_PI_2;
  const r3 = r2 - n * HALF_PI_3;
  const lost3 = r2 - r3 - n * HALF_PI_3;
  const tail = lost2 + lost3 - n * HALF_PI_4;
  const reduced = r3 + tail;
  const rest = r3 - reduced + tail;
  const turn = (n + quarter) & 3;
  const value = turn & 1 ? cosineNearZero(reduced, rest) : sineNearZero(reduced, rest);
  return turn & 2 ? -value : value;
}

/**
 * sin x for |x| ≤ 1.6e6, within 1 ulp; NaN beyond. Every machine gives the same bits.
 * Accuracy: measured in `tests/inversion/math`. Source: fdlibm (Sun 1993, k_sin.c, k_cos.c, e_rem_pio2.c), from memory.
 */
export const sin = (x: number): number => sineOfQuarter(x, 0);

/** cos x; as `sin`. */
export const cos = (x: number): number => sineOfQuarter(x, 1);
