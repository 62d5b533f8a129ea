import { log1p } from '../math/logarithm';
import type { DownWeighted } from '../types';

/** Degrees of freedom of the Student-t errors of an outlier-tolerant fit. */
const DEGREES = 4;

/** From this |residual| on a reading counts for less than half and is named. */
export const SET_ASIDE = 2.5;

/**
 * Outlier-tolerant residual: s(r) = sign(r) √((ν + 1) ln(1 + r²/ν)) with ν = 4, so that Σ s² is −2 ln of a Student-t
 * likelihood. A residual of 2 σ counts as 1.9, one of 10 σ as 4.0, and the pull s·ds/dr of a far one falls as 1/r.
 * Source: Lange, Little & Taylor 1989, Robust statistical modeling using the t distribution (from memory).
 */
export function tolerantResidual(r: number): { value: number; slope: number } {
  const square = r * r;
  // near zero the quotients below lose their digits; there s = r √((ν + 1)/ν) to r²/ν
  if (square < 1e-8) {
    const slope = Math.sqrt((DEGREES + 1) / DEGREES);
    return { value: r * slope, slope };
  }
  const value = Math.sign(r) * Math.sqrt((DEGREES + 1) * log1p(square / DEGREES));
  return { value, slope: ((DEGREES + 1) * r) / ((DEGREES + square) * value) };
}

/** Weight of a reading in the pull on the model against that of one that fits, (1 + r²/ν)⁻¹. */
export function tolerantWeight(r: number): number {
  return DEGREES / (DEGREES + r * r);
}

/** Σ min(r², 2.5²): the misfit by which an outlier-tolerant fit is judged. */
export function tolerantMisfit(residuals: ArrayLike<number>, readings: number): number {
  let sum = 0;
  for (let i = 0; i < readings; i++) sum += Math.min(residuals[i]! * residuals[i]!, SET_ASIDE * SET_ASIDE);
  return sum;
}

/** The readings that are set aside, in their order. */
export function downWeighted(residuals: readonly number[]): DownWeighted[] {
  return residuals.flatMap((residual, index) =>
    Math.abs(residual) > SET_ASIDE ? [{ index, residual, weight: tolerantWeight(residual) }] : [],
  );
}
