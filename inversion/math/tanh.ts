import { expm1 } from './exponential';

/**
 * tanh x, within 2 ulp: 1 − 2/(e^{2x} + 1) for large x, from expm1 where that would cancel.
 * Accuracy: measured in `tests/inversion/math`. Source: fdlibm (Sun 1993, s_tanh.c), from memory.
 */
export function tanh(x: number): number {
  const size = Math.abs(x);
  if (size > 22) return x > 0 ? 1 : -1;
  if (size >= 1) {
    const value = 1 - 2 / (expm1(2 * size) + 2);
    return x > 0 ? value : -value;
  }
  const e = expm1(-2 * size);
  const value = -e / (e + 2);
  return x >= 0 ? value : -value;
}
