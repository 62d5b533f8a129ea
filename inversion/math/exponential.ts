import { powerOfTwo, scaleByPowerOfTwo } from './power-of-two';

/** ln 2 in two parts: the first has 32 trailing zero bits, so that k × it is exact. */
export const LN2_HIGH = 6.9314718036912381649e-1;
export const LN2_LOW = 1.90821492927058770002e-10;
const PER_LN2 = 1.442695040888963387;
/** exp of more than this is above the largest double. */
const OVERFLOW = 709.782712893383973096;
/** exp of less than this rounds to 0. */
const UNDERFLOW = -745.13321910194110842;

/**
 * eˣ, within 1 ulp, in +, −, ×, ÷ alone, so that every machine gives the same bits.
 *
 * x = k ln2 + r with |r| ≤ ln2/2; e^r = 1 + 2r/(R − r) with R(r²) = r(e^r + 1)/(e^r − 1) by its Remez polynomial.
 * Accuracy: measured in `tests/inversion/math` against 60-digit values. Source: the method and the coefficients that
 * Sun Microsystems published as fdlibm (1993, e_exp.c), from memory.
 */
export function exp(x: number): number {
  if (!(x <= OVERFLOW)) return x > OVERFLOW ? Infinity : NaN;
  if (x < UNDERFLOW) return 0;
  const k = Math.floor(PER_LN2 * x + 0.5);
  const high = x - k * LN2_HIGH;
  const low = k * LN2_LOW;
  const r = high - low;
  const t = r * r;
  const c =
    r -
    t *
      (1.66666666666666019037e-1 +
        t *
          (-2.77777777770155933842e-3 +
            t *
              (6.61375632143793436117e-5 + t * (-1.6533902205465251539e-6 + t * 4.13813679705723846039e-8))));
  return scaleByPowerOfTwo(1 - (low - (r * c) / (2 - c) - high), k);
}

/** eˣ − 1 rounds to −1 below this. */
const EXPM1_FLOOR = -56 * 0.6931471805599453;

/**
 * eˣ − 1, within 1 ulp also where x is near 0.
 *
 * x = k ln2 + r; e^r − 1 from R₁(r²/2) = (6/r)(((e^r + 1)/(e^r − 1)) − 2/r) by its Remez polynomial, then scaled by 2^k in the
 * order that loses least. Accuracy: measured in `tests/inversion/math`. Source: fdlibm (Sun 1993, s_expm1.c), from memory.
 */
export function expm1(x: number): number {
  if (!(x <= OVERFLOW)) return x > OVERFLOW ? Infinity : NaN;
  if (x < EXPM1_FLOOR) return -1;
  const size = Math.abs(x);
  if (size < 5.5e-17) return x;
  const k = size < 0.34657359027997264 ? 0 : Math.floor(PER_LN2 * x + 0.5);
  const high = x - k * LN2_HIGH;
  const low = k * LN2_LOW;
  const r = high - low;
  const c = high - r - low;
  const half = 0.5 * r;
  const s = r * half;
  const r1 =
    1 +
    s *
      (-3.33333333333331316428e-2 +
        s *
          (1.58730158725481460165e-3 +
            s *
              (-7.93650757867487942473e-5 +
                s * (4.00821782732936239552e-6 + s * -2.01099218183624371326e-7))));
  const t = 3 - r1 * half;
  const e0 = s * ((r1 - t) / (6 - r * t));
  if (k === 0) return r - (r * e0 - s);
  return scaleExpm1(r, r * (e0 - c) - c - s, k);
}

/** 2^k(1 + r − e) − 1 for k ≠ 0. */
function scaleExpm1(r: number, e: number, k: number): number {
  if (k === -1) return 0.5 * (r - e) - 0.5;
  if (k === 1) return r < -0.25 ? -2 * (e - (r + 0.5)) : 1 + 2 * (r - e);
  if (k < 0 || k > 56) return scaleByPowerOfTwo(1 - (e - r), k) - 1;
  const tail = powerOfTwo(-k);
  return k < 20 ? (r - e + (1 - tail)) * powerOfTwo(k) : (r - (e + tail) + 1) * powerOfTwo(k);
}
