import { powerOfTwo } from './power-of-two';

/** √(a² + b²), within 1 ulp, for sizes whose squares neither overflow nor vanish (1e-150 … 1e150). */
export const hypot = (a: number, b: number): number => Math.sqrt(a * a + b * b);

/** √Σx² of any finite values, in their order, scaled by a power of two so that no square overflows or vanishes. */
export function norm(values: ArrayLike<number>): number {
  let largest = 0;
  for (let i = 0; i < values.length; i++) largest = Math.max(largest, Math.abs(values[i]!));
  const scale = largest > 1e150 ? powerOfTwo(-600) : largest < 1e-140 ? powerOfTwo(600) : 1;
  let sum = 0;
  for (let i = 0; i < values.length; i++) sum += values[i]! * scale * (values[i]! * scale);
  return Math.sqrt(sum) / scale;
}
