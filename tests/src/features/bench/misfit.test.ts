import { expect, it } from 'vitest';
import { misfitOf } from '../../../../src/features/bench/misfit';

it('follows the definitions of χ² per reading and rms', () => {
  const readings = [
    { apparentResistivity: 100, relativeError: 0.05 },
    { apparentResistivity: 10, relativeError: 0.1 },
  ];
  const { residuals, chi2PerReading, rmsPercent } = misfitOf([110, 10], readings);
  expect(residuals[0]).toBeCloseTo(Math.log(1.1) / 0.05, 12);
  expect(residuals[1]).toBe(0);
  expect(chi2PerReading).toBeCloseTo((Math.log(1.1) / 0.05) ** 2 / 2, 12);
  expect(rmsPercent).toBeCloseTo(100 * Math.sqrt(0.01 / 2), 12);
});

it('is not a number where a prediction is missing, rather than good', () => {
  expect(misfitOf([], [{ apparentResistivity: 1, relativeError: 0.03 }]).chi2PerReading).toBeNaN();
});
