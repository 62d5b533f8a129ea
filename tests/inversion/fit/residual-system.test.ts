import { describe, expect, it } from 'vitest';
import { createForwardOperator, createRandomStream, type Reading } from '../../../inversion';
import { createResidualSystem, logRatio, logRatioSlope } from '../../../inversion/fit/residual-system';
import { randomSpread } from '../../../inversion/reference/random-cases';

describe('logRatio', () => {
  it('is the logarithm of a prediction that is not tiny', () => {
    expect(logRatio(0.5)).toBeCloseTo(Math.log(0.5), 15);
    expect(logRatioSlope(0.5)).toBe(2);
  });

  it('goes on along the tangent below a thousandth, through zero, without a jump', () => {
    expect(logRatio(0.001 - 1e-12)).toBeCloseTo(Math.log(0.001), 8);
    expect(logRatio(0)).toBeCloseTo(Math.log(0.001) - 1, 12);
    expect(logRatio(-0.001)).toBeCloseTo(Math.log(0.001) - 2, 12);
    expect(logRatioSlope(-5)).toBeCloseTo(1000, 9);
  });
});

describe('createResidualSystem', () => {
  it('has a Jacobian that agrees with a ladder of steps to 1e-6, negative predictions included', () => {
    const random = createRandomStream(8);
    const readings = Array.from({ length: 18 }, (_, turn): Reading => ({
      spread: randomSpread(random, turn),
      apparentResistivity: 40,
      relativeError: 0.02 + 0.002 * turn,
    }));
    const system = createResidualSystem(createForwardOperator(readings.map((r) => r.spread)), readings);
    const p = [200, 5, 90, 2, 7].map(Math.log);
    const m = readings.length;
    const residual = new Float64Array(m);
    const jacobian = new Float64Array(m * 5);
    const chi2 = system.linearise(p, 3, residual, jacobian);
    const again = new Float64Array(m);
    expect(system.evaluate(p, 3, again)).toBe(chi2);
    expect(again).toEqual(residual);
    p.forEach((value, j) => {
      const gaps = [1e-2, 1e-3, 1e-4, 1e-5, 1e-6].map((step) => {
        const [up, down] = [new Float64Array(m), new Float64Array(m)];
        system.evaluate(p.with(j, value + step), 3, up);
        system.evaluate(p.with(j, value - step), 3, down);
        return Math.max(
          ...readings.map((_, i) => {
            const slope = (up[i]! - down[i]!) / (2 * step);
            return Math.abs(slope - jacobian[i * 5 + j]!) / Math.max(1, Math.abs(jacobian[i * 5 + j]!));
          }),
        );
      });
      expect(Math.min(...gaps)).toBeLessThan(1e-6);
    });
  });
});
