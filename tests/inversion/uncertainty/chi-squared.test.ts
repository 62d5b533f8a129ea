import { describe, expect, it } from 'vitest';
import { chiSquaredPoint, chiSquaredSurvival } from '../../../inversion';
import { logGamma } from '../../../inversion/uncertainty/chi-squared';

describe('chiSquaredPoint', () => {
  // Abramowitz & Stegun 1964, table 26.8
  it.each([
    [0.05, 1, 3.84146],
    [0.05, 2, 5.99146],
    [0.05, 10, 18.307],
    [0.05, 30, 43.773],
    [0.01, 5, 15.0863],
    [0.5, 3, 2.36597],
    [0.95, 10, 3.9403],
    [0.001, 20, 45.315],
  ])('leaves %d above it at %d degrees of freedom', (chance, degrees, expected) => {
    expect(chiSquaredPoint(chance, degrees)).toBeCloseTo(expected, expected < 10 ? 4 : 2);
  });
});

describe('chiSquaredSurvival', () => {
  it('is exp(−x/2) at two degrees of freedom', () => {
    for (const x of [0.1, 1, 5, 40, 200]) {
      expect(chiSquaredSurvival(x, 2) / Math.exp(-x / 2)).toBeCloseTo(1, 12);
    }
  });

  it('is exp(−x/2)(1 + x/2) at four, on both sides of the change of method', () => {
    for (const x of [0.5, 5.9, 6.1, 30]) {
      expect(chiSquaredSurvival(x, 4) / (Math.exp(-x / 2) * (1 + x / 2))).toBeCloseTo(1, 12);
    }
  });

  it('is 1 at zero', () => {
    expect(chiSquaredSurvival(0, 7)).toBe(1);
  });
});

describe('logGamma', () => {
  it.each([
    [0.5, 0.5 * Math.log(Math.PI)],
    [1, 0],
    [5, Math.log(24)],
    [0.25, 1.2880225246980774],
    [100, 359.1342053695754],
  ])('ln Γ(%d)', (x, expected) => {
    expect(Math.abs(logGamma(x) - expected)).toBeLessThan(1e-12 * Math.max(1, Math.abs(expected)));
  });
});
