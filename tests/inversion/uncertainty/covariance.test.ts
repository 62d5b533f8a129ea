import { describe, expect, it } from 'vitest';
import { logCovariance } from '../../../inversion/uncertainty/covariance';

describe('logCovariance', () => {
  it('is (JᵀJ)⁻¹', () => {
    const jacobian = Float64Array.from([3, 0, 0, 2, 1, 1]);
    const { covariance, deviation } = logCovariance(jacobian, 3, [false, false]);
    // JᵀJ = [[10, 1], [1, 5]]
    const expected = [5 / 49, -1 / 49, -1 / 49, 10 / 49];
    expected.forEach((value, i) => expect(covariance[i]).toBeCloseTo(value, 12));
    expect(deviation[1]).toBeCloseTo(Math.sqrt(10 / 49), 12);
  });

  it('leaves held parameters out: they are certain, and the others do not pay for them', () => {
    const jacobian = Float64Array.from([3, 0, 0, 2, 1, 1]);
    const { covariance, deviation } = logCovariance(jacobian, 3, [true, false]);
    expect(deviation[0]).toBe(0);
    expect(covariance[3]).toBeCloseTo(1 / 5, 12);
    expect(covariance[1]).toBe(0);
  });

  it('calls a parameter that no reading sees unresolved, not certain', () => {
    const { deviation } = logCovariance(Float64Array.from([1, 0, 2, 0]), 2, [false, false]);
    expect(deviation[0]).toBeCloseTo(1 / Math.sqrt(5), 12);
    expect(deviation[1]).toBe(Infinity);
  });

  it('calls two parameters that only their sum moves unresolved', () => {
    const { deviation } = logCovariance(Float64Array.from([1, 1, 2, 2, 3, 3]), 3, [false, false]);
    expect(Array.from(deviation)).toEqual([Infinity, Infinity]);
  });

  it('takes fewer readings than parameters', () => {
    const { deviation } = logCovariance(Float64Array.from([2, 0, 0]), 1, [false, false, false]);
    expect(Array.from(deviation)).toEqual([0.5, Infinity, Infinity]);
  });
});
