import { chiSquaredSurvival } from './chi-squared';

/** Standard normal point with 5 % above it. */
const Z_ONE_SIDED_95 = 1.6448536269514722;

/** Chance that a standard normal number stays below `z`. */
export function normalChance(z: number): number {
  const tail = 0.5 * chiSquaredSurvival(z * z, 1);
  return z < 0 ? tail : 1 - tail;
}

/**
 * Chance that readings which hold a difference of noncentrality δ² = `deltaChi2` show it by a test that errs in 5 % where
 * there is none: Φ(δ − 1.645), the most powerful test of one Gaussian direction (Neyman & Pearson 1933). 5 % at δ = 0.
 */
export const chanceToTell = (deltaChi2: number): number =>
  normalChance(Math.sqrt(deltaChi2) - Z_ONE_SIDED_95);
