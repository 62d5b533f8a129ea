import { exp } from './exponential';
import { log } from './logarithm';
import { powerOfTwo } from './power-of-two';

/** 2ˣ for −1022 ≤ x ≤ 1023, exact at whole x, else within 1 ulp: 2^x = 2^k exp((x − k) ln2), |x − k| ≤ ½. */
export function pow2(x: number): number {
  const k = Math.floor(x + 0.5);
  return x === k ? powerOfTwo(k) : exp((x - k) * Math.LN2) * powerOfTwo(k);
}

/** 10^0 … 10^22, each an exact double. */
const TENS = [
  1, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11, 1e12, 1e13, 1e14, 1e15, 1e16, 1e17, 1e18, 1e19,
  1e20, 1e21, 1e22,
];

/** 10ˣ for |x| ≤ 22, correctly rounded at whole x, else within 3 ulp. */
export function pow10(x: number): number {
  const k = Math.floor(x + 0.5);
  const part = x === k ? 1 : exp((x - k) * Math.LN10);
  return k < 0 ? part / TENS[-k]! : part * TENS[k]!;
}

/** baseˣ for base > 0, as exp(x ln base): relative error below (1 + |x ln base|) × 2⁻⁵². */
export const pow = (base: number, x: number): number => exp(x * log(base));
