export interface Misfit {
  chi2PerReading: number;
  rmsPercent: number;
  /** (ln predicted − ln observed)/σ, one a reading; not finite where the prediction is not positive */
  residuals: number[];
}

/**
 * Misfit of a curve by the definitions of the engine: χ²/N of (ln f − ln d)/σ, rms 100·√mean((f/d − 1)²).
 * All arrays hold one entry a kept reading; Ω·m and relative errors.
 */
export function misfitOf(
  predicted: readonly number[],
  readings: readonly { apparentResistivity: number; relativeError: number }[],
): Misfit {
  const residuals = readings.map(
    ({ apparentResistivity, relativeError }, i) =>
      Math.log((predicted[i] ?? Number.NaN) / apparentResistivity) / relativeError,
  );
  const count = Math.max(1, readings.length);
  const chi2 = residuals.reduce((sum, residual) => sum + residual ** 2, 0);
  const squares = readings.reduce(
    (sum, reading, i) => sum + ((predicted[i] ?? Number.NaN) / reading.apparentResistivity - 1) ** 2,
    0,
  );
  return { chi2PerReading: chi2 / count, rmsPercent: 100 * Math.sqrt(squares / count), residuals };
}
