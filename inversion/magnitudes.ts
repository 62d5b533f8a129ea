/**
 * What a quantity can be at all, in m, Ω·m and shares: many powers of ten beyond any ground, and far inside of what doubles
 * hold, so that products and powers of them neither overflow nor vanish.
 */
const MAGNITUDES = {
  /** between electrodes */
  length: [1e-6, 1e7],
  /** n of a dipole–dipole */
  separation: [1e-3, 1e6],
  thickness: [1e-9, 1e9],
  resistivity: [1e-9, 1e12],
  /** standard error of ln ρa, and of other logarithms; the forward operator is no better than 1e-8 */
  relativeError: [1e-6, 1e3],
} as const;

export type Magnitude = keyof typeof MAGNITUDES;

/** The longest distance of a spread over its shortest: beyond it the short one measures alone, and weights cost without end. */
export const LARGEST_DISTANCE_RATIO = 1e9;

/** What a value must be, where it is not: a clause for a sentence, or null. */
export function magnitudeFault(value: unknown, of: Magnitude): string | null {
  const [low, high] = MAGNITUDES[of];
  if (typeof value !== 'number' || !Number.isFinite(value) || value <= 0)
    return 'it must be a number above 0';
  return value < low || value > high ? `it must be from ${low} to ${high}` : null;
}
