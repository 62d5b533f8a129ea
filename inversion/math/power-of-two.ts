const LOWEST = -1074;
const HIGHEST = 1023;

/** 2^−1074 … 2^1023, each an exact double, by halving and doubling 1. */
const POWERS = new Float64Array(HIGHEST - LOWEST + 1);
for (let k = 0, power = 1; k <= HIGHEST; k++, power *= 2) POWERS[k - LOWEST] = power;
for (let k = -1, power = 0.5; k >= LOWEST; k--, power /= 2) POWERS[k - LOWEST] = power;

/** 2^k, exact, for a whole −1074 ≤ k ≤ 1023. */
export const powerOfTwo = (k: number): number => POWERS[k - LOWEST]!;

/** y·2^k with one rounding, for 0.5 ≤ y < 4 and a whole −1150 ≤ k ≤ 1024. */
export function scaleByPowerOfTwo(y: number, k: number): number {
  if (k > HIGHEST) return y * 2 * powerOfTwo(k - 1);
  if (k < -1021) return y * powerOfTwo(k + 1000) * powerOfTwo(-1000);
  return y * powerOfTwo(k);
}
