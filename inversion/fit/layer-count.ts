import { log } from '../math/logarithm';
import { chiSquaredSurvival } from '../uncertainty/chi-squared';
import type { LayerCountFit } from '../types';

/** Fewest degrees of freedom at which a χ² can be tested. */
const TESTABLE = 2;
/** A misfit with at least this chance is within the noise. */
export const NOISE_TAIL = 0.05;

/** χ² + p ln N. */
export function bic(chi2: number, parameters: number, readings: number): number {
  return chi2 + parameters * log(readings);
}

/** χ² + 2p + 2p(p + 1)/(N − p − 1); null where N − p − 1 < 1. Source: Hurvich & Tsai 1989. */
export function aicc(chi2: number, parameters: number, readings: number): number | null {
  const spare = readings - parameters - 1;
  return spare < 1 ? null : chi2 + 2 * parameters + (2 * parameters * (parameters + 1)) / spare;
}

/** Chance of a χ² this large were model and errors right; null where N − p < 2. */
export function misfitProbability(chi2: number, parameters: number, readings: number): number | null {
  const degrees = readings - parameters;
  return degrees < TESTABLE ? null : chiSquaredSurvival(chi2, degrees);
}

/** χ² below the 95 % point for N − p degrees of freedom; null where that cannot be tested. */
export function withinNoise(chi2: number, parameters: number, readings: number): boolean | null {
  const probability = misfitProbability(chi2, parameters, readings);
  return probability === null ? null : probability > NOISE_TAIL;
}

/** The fewest layers within the noise, else the least BIC; index into the list, which ascends in layers. */
export function chooseLayerCount(counts: readonly Pick<LayerCountFit, 'bic' | 'withinNoise'>[]): number {
  const enough = counts.findIndex((count) => count.withinNoise === true);
  if (enough >= 0) return enough;
  return counts.reduce((best, count, i) => (count.bic < counts[best]!.bic ? i : best), 0);
}

/** A sentence where the least BIC asks for another count than the chosen one: then the count hangs on the stated errors. */
export function countDoubt(counts: readonly LayerCountFit[], chosen: number): string[] {
  const least = counts.reduce((best, count, i) => (count.bic < counts[best]!.bic ? i : best), 0);
  if (least === chosen || counts[chosen]!.withinNoise !== true) return [];
  const beds = (i: number): string => `${counts[i]!.layers} ${counts[i]!.layers === 1 ? 'bed' : 'beds'}`;
  return [
    `The count rests on the stated errors: ${beds(chosen)} ${counts[chosen]!.layers === 1 ? 'is' : 'are'} the fewest within them, while the least BIC is that of ${beds(least)}.`,
  ];
}
