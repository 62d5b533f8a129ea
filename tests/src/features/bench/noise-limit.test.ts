import { expect, it } from 'vitest';
import { noiseLimit } from '../../../../src/features/bench/noise-limit';

const count = (chi2: number, parameters: number, readings: number) => ({
  chi2PerReading: chi2 / readings,
  bic: chi2 + parameters * Math.log(readings),
});

it('gives the degrees of freedom of a count and the 95 % point of χ² over N', () => {
  const limit = noiseLimit(count(18, 5, 20), 20);
  expect(limit?.degrees).toBe(15);
  // 24.996 is the 95 % point for 15 degrees of freedom in printed tables
  expect(limit?.chi2PerReading).toBeCloseTo(24.996 / 20, 4);
});

it('gives none where too few readings are left', () => {
  expect(noiseLimit(count(1, 7, 8), 8)).toBeNull();
  expect(noiseLimit(count(1, 6, 8), 8)?.degrees).toBe(2);
});
