import { chiSquaredPoint } from '../../../inversion';
import type { FitResult } from '../../../server/contract/fit-result';

type Count = Pick<NonNullable<FitResult['layerCounts']>[number], 'bic' | 'chi2PerReading'>;

export interface NoiseLimit {
  /** Readings less free values. */
  degrees: number;
  /** χ²/N at the 95 % point; at or below it a count is within the noise. */
  chi2PerReading: number;
}

/** A chance this small is left to a misfit beyond the limit. */
const NOISE_TAIL = 0.05;
/** Fewest degrees of freedom at which a misfit can be tested. */
const TESTABLE = 2;

/** What a count of beds is judged by; its free values p stand in BIC = χ² + p ln N. Null where nothing can be tested. */
export function noiseLimit({ bic, chi2PerReading }: Count, readings: number): NoiseLimit | null {
  const parameters = Math.round((bic - chi2PerReading * readings) / Math.log(readings));
  const degrees = readings - parameters;
  if (!(degrees >= TESTABLE)) return null;
  return { degrees, chi2PerReading: chiSquaredPoint(NOISE_TAIL, degrees) / readings };
}
